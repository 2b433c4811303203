import { View } from 'react-native';
import type { ListPreview } from '../../contracts/class-list';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { BrokenSign } from '../../ui/vessel';
import { words } from './words';

interface ImportPreviewProps {
  readonly preview: ListPreview;
  readonly isLocked: boolean;
  readonly isBusy: boolean;
  readonly onConfirm: () => void;
}

const mostShown = 200;

/** What a list would do: its errors by line, or its rows and the button that imports them. */
export function ImportPreview({ preview, isLocked, isBusy, onConfirm }: ImportPreviewProps) {
  const { counts, errors, notInText } = preview;
  if (errors.length > 0) return <Errors errors={errors} />;
  const changes = counts.new + counts.changed;
  return (
    <View style={{ gap: 14 }} testID="list-preview">
      <Text variant="head" level={2} live="polite">
        {words.import.counts(counts.new, counts.changed, counts.unchanged)}
      </Text>
      {notInText > 0 ? <Text>{words.import.kept(notInText)}</Text> : null}
      {isLocked && counts.new > 0 ? <Text>{words.import.scripts}</Text> : null}
      <View style={{ alignSelf: 'flex-start' }}>
        <Button kind="primary" isBusy={isBusy} closed={changes === 0 ? words.import.nothingNew : undefined} onPress={onConfirm} testID="confirm-list">
          {words.import.confirm(changes)}
        </Button>
      </View>
      <Rows preview={preview} />
    </View>
  );
}

function Errors({ errors }: Pick<ListPreview, 'errors'>) {
  const lines = new Set(errors.map(({ line }) => line)).size;
  return (
    <View style={{ gap: 12 }} testID="list-errors">
      <View style={{ flexDirection: 'row', gap: 10, alignItems: 'center' }}>
        <BrokenSign />
        <Text variant="head" level={2} live="assertive" style={{ flex: 1 }}>
          {words.import.errors(lines)}
        </Text>
      </View>
      <View role="list" style={{ gap: 8 }}>
        {errors.slice(0, mostShown).map(({ line, column, message }) => (
          <View key={`${line} ${column} ${message}`} role="listitem" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 16 }}>
            <Text variant="readingS" tone="methyl" style={{ minWidth: 190 }}>
              {words.import.where(line, column)}
            </Text>
            <Text style={{ flexShrink: 1 }}>{message}</Text>
          </View>
        ))}
        {errors.length > mostShown ? <Text tone="ink2">{words.import.more(errors.length - mostShown)}</Text> : null}
      </View>
    </View>
  );
}

function Rows({ preview: { rows } }: { preview: ListPreview }) {
  const colors = useColors();
  const isWide = useIsWide();
  const hasNames = rows.some(({ name }) => name !== null);
  const hasEmails = isWide && rows.some(({ email }) => email !== null);
  return (
    <View role="table" aria-label={words.import.title}>
      <View role="row" style={{ flexDirection: 'row', gap: 12, height: 36, alignItems: 'center', borderBottomWidth: 1.5, borderColor: colors.ink2 }}>
        <Cell isHead width={48} text={words.import.head.line} />
        <Cell isHead width={130} text={words.import.head.number} />
        {hasNames ? <Cell isHead text={words.import.head.name} /> : null}
        {hasEmails ? <Cell isHead text={words.import.head.email} /> : null}
        <Cell isHead width={96} text={words.import.head.outcome} />
      </View>
      {rows.slice(0, mostShown).map(({ line, number, name, email, outcome }) => (
        <View key={line} role="row" style={{ flexDirection: 'row', gap: 12, minHeight: 36, alignItems: 'center', borderBottomWidth: 1, borderColor: colors.hair }}>
          <Cell width={48} text={String(line)} isQuiet />
          <Cell width={130} text={number} isMono />
          {hasNames ? <Cell text={name ?? ''} /> : null}
          {hasEmails ? <Cell text={email ?? ''} /> : null}
          <Cell width={96} text={words.import.outcome[outcome]} isQuiet={outcome === 'unchanged'} />
        </View>
      ))}
      {rows.length > mostShown ? (
        <Text variant="small" tone="ink2" style={{ paddingTop: 8 }}>
          {words.import.more(rows.length - mostShown)}
        </Text>
      ) : null}
    </View>
  );
}

interface CellProps {
  readonly text: string;
  readonly width?: number;
  readonly isHead?: boolean;
  readonly isMono?: boolean;
  readonly isQuiet?: boolean;
}

function Cell({ text, width, isHead = false, isMono = false, isQuiet = false }: CellProps) {
  return (
    <View role={isHead ? 'columnheader' : 'cell'} style={width === undefined ? { flex: 1, minWidth: 0 } : { width }}>
      <Text variant={isHead ? 'label' : isMono ? 'readingS' : 'small'} tone={isHead || isQuiet ? 'ink2' : 'ink'} lines={1}>
        {text}
      </Text>
    </View>
  );
}
