import { useRef, type ReactNode } from 'react';
import { View } from 'react-native';
import { Pressable } from './pressable';
import { rovingTo } from './roving';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size } from './tokens';
import { useIsWide } from './use-breakpoint';

export interface Choice<Value extends string> {
  readonly value: Value;
  readonly label: ReactNode;
  /** In words, where the label is more than text. */
  readonly spoken?: string | undefined;
  readonly note?: string | undefined;
  readonly glyph?: ReactNode;
  /** At the right, such as a mark or a key cap. */
  readonly aside?: ReactNode;
  readonly isClosed?: boolean | undefined;
}

interface ChoiceRowsProps<Value extends string> {
  readonly label: string;
  readonly isLabelHidden?: boolean | undefined;
  readonly choices: readonly Choice<Value>[];
  readonly chosen: Value | null;
  readonly onChoose: (value: Value) => void;
  readonly error?: string | undefined;
}

/** Options as whole rows, one of them chosen: a violet line and ground. Arrow keys go along and choose. */
export function ChoiceRows<Value extends string>({ label, isLabelHidden = false, choices, chosen, onChoose, error }: ChoiceRowsProps<Value>) {
  const hosts = useRef(new Map<Value, View | null>());
  const open = choices.filter(({ isClosed }) => !isClosed);
  const stop = open.some(({ value }) => value === chosen) ? chosen : open[0]?.value;
  return (
    <View style={{ gap: 4 }}>
      {isLabelHidden ? null : <Text variant="label">{label}</Text>}
      <View role="radiogroup" aria-label={label}>
        {choices.map((choice, index) => (
          <ChoiceRow
            key={choice.value}
            choice={choice}
            isFirst={index === 0}
            isChosen={choice.value === chosen}
            isStop={choice.value === stop}
            hostRef={(host) => void hosts.current.set(choice.value, host)}
            onChoose={() => onChoose(choice.value)}
            onKey={(key) => {
              const at = rovingTo(key, open.indexOf(choice), open.length);
              const next = at === null ? undefined : open[at];
              if (!next) return false;
              onChoose(next.value);
              hosts.current.get(next.value)?.focus();
              return true;
            }}
          />
        ))}
      </View>
      {error ? (
        <Text variant="small" tone="methyl" live="polite">
          {error}
        </Text>
      ) : null}
    </View>
  );
}

interface ChoiceRowProps<Value extends string> {
  readonly choice: Choice<Value>;
  readonly isFirst: boolean;
  readonly isChosen: boolean;
  readonly isStop: boolean;
  readonly hostRef: (host: View | null) => void;
  readonly onChoose: () => void;
  readonly onKey: (key: string) => boolean;
}

function ChoiceRow<Value extends string>({ choice, isFirst, isChosen, isStop, hostRef, onChoose, onKey }: ChoiceRowProps<Value>) {
  const colors = useColors();
  const isWide = useIsWide();
  const { label, spoken, note, glyph, aside, isClosed = false } = choice;
  return (
    <Pressable
      role="radio"
      hostRef={hostRef}
      isChecked={isChosen}
      isDisabled={isClosed}
      tabIndex={isStop ? 0 : -1}
      label={spoken}
      isFocusInside
      onPress={onChoose}
      onKeyDown={(key, event) => {
        if (key === ' ' || onKey(key)) event.preventDefault();
        if (key === ' ') onChoose();
      }}
      style={({ isHovered }) => ({
        minHeight: isWide ? size.touchWide + 4 : size.touch + 4,
        flexDirection: 'row',
        alignItems: 'center',
        gap: 12,
        paddingVertical: 8,
        paddingHorizontal: isChosen ? 11 : 12,
        marginTop: isChosen && !isFirst ? -1 : 0,
        borderTopWidth: isChosen ? 2 : isFirst ? 0 : 1,
        borderBottomWidth: isChosen ? 2 : 0,
        borderLeftWidth: isChosen ? 2 : 1,
        borderRightWidth: isChosen ? 2 : 1,
        borderColor: isChosen ? colors.manganate : colors.hair,
        borderLeftColor: isChosen ? colors.manganate : 'transparent',
        borderRightColor: isChosen ? colors.manganate : 'transparent',
        borderRadius: isChosen ? radius.scan : 0,
        backgroundColor: isChosen ? colors.manganateFaint : isHovered ? colors.well : 'transparent',
      })}
    >
      <Ring isChosen={isChosen} isClosed={isClosed} />
      {glyph}
      <View style={{ flex: 1, minWidth: 0 }}>
        <Text weight={isChosen ? 600 : 500} tone={isClosed ? 'ink3' : 'ink'}>
          {label}
        </Text>
        {note === undefined ? null : (
          <Text variant="small" tone={isClosed ? 'ink3' : 'ink2'}>
            {note}
          </Text>
        )}
      </View>
      {aside}
    </Pressable>
  );
}

function Ring({ isChosen, isClosed }: { isChosen: boolean; isClosed: boolean }) {
  const colors = useColors();
  return (
    <View aria-hidden style={{ width: 20, height: 20, borderRadius: 10, borderWidth: isChosen ? 2 : 1.5, borderStyle: isClosed ? 'dashed' : 'solid', borderColor: isChosen ? colors.manganate : colors.rule, backgroundColor: colors.paper, alignItems: 'center', justifyContent: 'center' }}>
      {isChosen ? <View style={{ width: 10, height: 10, borderRadius: 5, backgroundColor: colors.manganate }} /> : null}
    </View>
  );
}
