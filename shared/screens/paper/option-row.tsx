import { View } from 'react-native';
import type { ElectronDraft } from '../../contracts/items';
import { electronLabel } from '../../marking/item-label';
import { plainChem } from '../chem-text-parts';
import { Button } from '../../ui/button';
import { Icon } from '../../ui/icon';
import { IconButton } from '../../ui/icon-button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { ConfigurationField, ElectronRow, groundText } from './electron-fields';
import { words } from './words';

interface OptionRowProps {
  readonly option: ElectronDraft;
  readonly index: number;
  readonly count: number;
  /** What it comes to; null while it has no value. */
  readonly value: string | null;
  readonly isAnswer: boolean;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (changes: Partial<ElectronDraft>, field: string) => void;
  readonly onMove: (by: number) => void;
  /** Null where no fewer can be printed. */
  readonly onRemove: (() => void) | null;
}

const w = words.options;

/** One printed option: its number, its electron, and the value it has. */
export function OptionRow({ option, index, count, value, isAnswer, problemAt, onChange, onMove, onRemove }: OptionRowProps) {
  const colors = useColors();
  const number = index + 1;
  const label = plainChem(electronLabel(option));
  const isOwn = option.configuration !== undefined;
  const fields = { electron: option, path: `printed.options.${index}`, problemAt, onChange, testPrefix: `option-${index}-` };
  return (
    <View role="listitem" aria-label={w.option(number)} style={{ flexDirection: 'row', gap: 10, paddingVertical: 10, borderBottomWidth: 1, borderColor: colors.hair }} testID={`option-${index}`}>
      <View style={{ width: 26, alignItems: 'center', paddingTop: 28 }}>
        <Text variant="readingM">{number}</Text>
      </View>
      <View style={{ flex: 1, minWidth: 0, gap: 4 }}>
        <ElectronRow {...fields} spokenBefore={`${w.option(number)}, `} />
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center' }}>
          <View style={{ flexGrow: 1, flexDirection: 'row', alignItems: 'center', gap: 6 }}>
            <Text variant="reading" tone={isAnswer ? 'copper' : 'ink'} weight={isAnswer ? 600 : 500} testID={`option-value-${index}`}>
              {value ?? w.noValue}
            </Text>
            {isAnswer ? (
              <View role="img" aria-label={w.answer}>
                <Icon name="check" size={16} tone="copper" />
              </View>
            ) : null}
          </View>
          <Button kind="text" isSmall isExpanded={isOwn} label={`${w.option(number)}: ${isOwn ? w.ground : w.configuration}`} onPress={() => onChange({ configuration: isOwn ? undefined : groundText(option) }, 'configuration')}>
            {isOwn ? w.ground : w.configuration}
          </Button>
          <IconButton icon="up" label={w.up(number, label)} isDisabled={index === 0} onPress={() => onMove(-1)} testID={`option-up-${index}`} />
          <IconButton icon="down" label={w.down(number, label)} isDisabled={index === count - 1} onPress={() => onMove(1)} testID={`option-down-${index}`} />
          {onRemove ? <IconButton icon="close" label={w.remove(number, label)} onPress={onRemove} testID={`option-remove-${index}`} /> : null}
        </View>
        <ConfigurationField {...fields} />
      </View>
    </View>
  );
}
