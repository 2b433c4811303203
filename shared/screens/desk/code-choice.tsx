import { View } from 'react-native';
import type { Code } from '../../marking/scheme';
import { Button } from '../../ui/button';
import { KeyCap } from '../../ui/key-cap';
import { Pressable } from '../../ui/pressable';
import { SheetOver } from '../../ui/sheet-over';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { codeWords, words } from './words';

/** The rare codes, in the order of their keys 1 to 4. */
export const rareCodes = ['crossed-out', 'two-answers', 'elsewhere', 'wrong-page'] as const satisfies readonly Code[];

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

interface CodeChoiceProps {
  readonly chosen: Code | null;
  readonly onChoose: (code: Code) => void;
  readonly onRecord: () => void;
  readonly onCancel: () => void;
  /** What this item wants of such an answer instead of a code; empty where it wants nothing else. */
  readonly hint: string;
}

/** On wide, in place of the words under the scan: one of four, by its number or a press, then recorded. */
export function CodeChoice({ chosen, onChoose, onRecord, onCancel, hint }: CodeChoiceProps) {
  const colors = useColors();
  return (
    <View style={{ gap: 8 }} testID="code-choice">
      <Text weight={600}>{words.otherTitle}</Text>
      <CodeHint>{hint}</CodeHint>
      <View role="radiogroup" aria-label={words.otherTitle} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
        {rareCodes.map((code, index) => (
          <Pressable
            key={code}
            role="radio"
            isChecked={chosen === code}
            onPress={() => onChoose(code)}
            style={({ isHovered }) => ({ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 40, paddingHorizontal: 12, borderRadius: radius.control, borderWidth: chosen === code ? 2 : 1.5, borderColor: chosen === code ? colors.manganate : colors.rule, backgroundColor: chosen === code ? colors.manganateFaint : isHovered ? colors.well : colors.paper })}
          >
            <KeyCap>{String(index + 1)}</KeyCap>
            <Text variant="small" weight={600}>
              {capital(codeWords[code])}
            </Text>
          </Pressable>
        ))}
      </View>
      <View style={{ flexDirection: 'row', gap: 8 }}>
        <Button kind="primary" isSmall keyCap="Enter" onPress={onRecord} closed={chosen === null ? '' : undefined}>
          {chosen === null ? words.recordShort : words.recordCode(chosen)}
        </Button>
        <Button isSmall kind="text" onPress={onCancel}>
          {words.cancel}
        </Button>
      </View>
    </View>
  );
}

function CodeHint({ children }: { children: string }) {
  if (children === '') return null;
  return (
    <Text variant="small" tone="ink2" testID="code-hint">
      {children}
    </Text>
  );
}

interface CodeSheetProps {
  readonly onCode: (code: Code) => void;
  readonly onNote: () => void;
  readonly onTakeBack: (() => void) | null;
  readonly takeBackLabel: string;
  readonly onClose: () => void;
  readonly hint: string;
}

const onSheet: readonly Code[] = ['cannot-read', ...rareCodes, 'ask-the-lead'];

/** On a phone, over the pad: the six codes beside blank; a press records. Note and taking back are here too. */
export function CodeSheet({ onCode, onNote, onTakeBack, takeBackLabel, onClose, hint }: CodeSheetProps) {
  return (
    <SheetOver title={words.other} onClose={onClose} testID="code-sheet">
      <View style={{ gap: 8 }}>
        <CodeHint>{hint}</CodeHint>
        {onSheet.map((code) => (
          <Button key={code} isWide onPress={() => onCode(code)} testID={`code-${code}`}>
            {capital(codeWords[code])}
          </Button>
        ))}
        <Button isWide kind="text" icon="note" onPress={onNote}>
          {words.note}
        </Button>
        {onTakeBack ? (
          <Button isWide kind="text" icon="takeBack" onPress={onTakeBack} testID="take-back">
            {takeBackLabel}
          </Button>
        ) : null}
      </View>
    </SheetOver>
  );
}
