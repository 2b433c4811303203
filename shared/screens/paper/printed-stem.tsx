import { useState } from 'react';
import { View } from 'react-native';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { stemWarnings } from './stem-warnings';
import { words } from './words';

interface PrintedStemProps {
  readonly number: number;
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly error: string | undefined;
  readonly canChange: boolean;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

/** The question as it will be printed: proposed from the item until the lead words it. */
export function PrintedStem({ number, draft, worked, error, canChange, onChange }: PrintedStemProps) {
  const colors = useColors();
  const [isOpen, setOpen] = useState(false);
  const prompt = draft.prompt ?? worked.proposedPrompt;
  const isOwn = draft.prompt !== null;
  // Only the lead knows what a typed key answers: there is nothing to propose.
  const isUnproposed = worked.proposedPrompt === '' && draft.asked.convention === 'typed' && draft.kind === 'numeric';
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center', flexWrap: 'wrap', columnGap: 12, minHeight: 36 }}>
        <Text variant="head" level={2}>
          {words.printed.title}
          <Text variant="small" tone="ink2">{`  ${isUnproposed ? words.printed.unproposed : isOwn ? words.printed.own : words.printed.proposed}`}</Text>
        </Text>
        {canChange && !isUnproposed ? (
          isOwn ? (
            <Button
              kind="text"
              isSmall
              icon="takeBack"
              onPress={() => {
                setOpen(false);
                onChange({ ...draft, prompt: null }, 'prompt-reset');
              }}
            >
              {words.printed.reset}
            </Button>
          ) : isOpen ? null : (
            <Button kind="text" isSmall icon="note" onPress={() => setOpen(true)} testID="word-it">
              {words.printed.change}
            </Button>
          )
        ) : null}
      </View>
      <View style={{ borderWidth: 1, borderColor: colors.hair, borderRadius: radius.control, backgroundColor: colors.glass, paddingHorizontal: 12, paddingVertical: 10 }}>
        <Text>
          <Text weight={600}>{number}</Text>
          {'  '}
          <ChemText>{prompt}</ChemText>
          <Text tone="ink2">{` [${draft.marks}]`}</Text>
        </Text>
      </View>
      {canChange && (isOpen || isOwn || isUnproposed) ? (
        <Vessel
          label={words.printed.label}
          value={prompt}
          lines={3}
          height={96}
          maxLength={600}
          onChange={(text) => onChange({ ...draft, prompt: text === worked.proposedPrompt || (isUnproposed && text === '') ? null : text }, 'prompt')}
          error={error}
          testID="prompt"
        />
      ) : null}
      {isOwn
        ? stemWarnings(prompt, draft).map((warning) => (
            <Text key={warning} variant="small" weight={500} tone="iodine" live="polite">
              {words.printed.missing[warning]}
            </Text>
          ))
        : null}
    </View>
  );
}
