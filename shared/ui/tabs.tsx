import { useRef, type ReactNode } from 'react';
import { View } from 'react-native';
import { CurveUnderline } from './curve-underline';
import { Pressable } from './pressable';
import { rovingTo } from './roving';
import { Text } from './text';
import { size } from './tokens';
import { useIsWide } from './use-breakpoint';

export interface Tab<Key extends string> {
  readonly key: Key;
  readonly label: string;
  readonly count?: number | undefined;
}

interface TabsProps<Key extends string> {
  /** Names the group, and ties the tabs to their panel. */
  readonly id: string;
  readonly label: string;
  readonly tabs: readonly Tab<Key>[];
  readonly chosen: Key;
  readonly onChoose: (key: Key) => void;
  /** In a narrow sheet. */
  readonly isSmall?: boolean | undefined;
}

const tabId = (id: string, key: string) => `${id}-tab-${key}`;
const panelId = (id: string) => `${id}-panel`;

/** A few views of the same thing; the chosen one has the curve under it. Arrow keys go along. */
export function Tabs<Key extends string>({ id, label, tabs, chosen, onChoose, isSmall = false }: TabsProps<Key>) {
  const isWide = useIsWide();
  const hosts = useRef(new Map<Key, View | null>());
  const goTo = (at: number) => {
    const tab = tabs[at];
    if (!tab) return;
    onChoose(tab.key);
    hosts.current.get(tab.key)?.focus();
  };
  return (
    <View role="tablist" aria-label={label} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: isSmall ? 20 : 24 }}>
      {tabs.map((tab, index) => {
        const isChosen = tab.key === chosen;
        return (
          <Pressable
            key={tab.key}
            id={tabId(id, tab.key)}
            hostRef={(host: View | null) => void hosts.current.set(tab.key, host)}
            role="tab"
            isSelected={isChosen}
            controls={panelId(id)}
            tabIndex={isChosen ? 0 : -1}
            onPress={() => onChoose(tab.key)}
            onKeyDown={(key, event) => {
              const at = rovingTo(key, index, tabs.length);
              if (at === null) return;
              event.preventDefault();
              goTo(at);
            }}
            style={() => ({ minHeight: isWide ? size.touchWide : size.touch, justifyContent: 'center', paddingTop: 6 })}
          >
            {({ isHovered }) => (
              <>
                <Text variant={isSmall ? 'small' : 'body'} weight={isChosen ? 600 : 400} tone={isChosen || isHovered ? 'ink' : 'ink2'} lines={1}>
                  {tab.label}
                  {tab.count === undefined ? '' : `\u2002${tab.count.toLocaleString('en-GB')}`}
                </Text>
                <CurveUnderline isShown={isChosen} />
              </>
            )}
          </Pressable>
        );
      })}
    </View>
  );
}

/** What the chosen tab shows. */
export function TabPanel({ id, chosen, children }: { id: string; chosen: string; children: ReactNode }) {
  return (
    <View role="tabpanel" nativeID={panelId(id)} aria-labelledby={tabId(id, chosen)}>
      {children}
    </View>
  );
}
