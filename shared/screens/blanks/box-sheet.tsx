import { useEffect, useRef, useState } from 'react';
import { ScrollView, View } from 'react-native';
import type { DeskLease } from '../../contracts/desk';
import { useIsWide } from '../../ui/use-breakpoint';
import { BoxTile } from './box-tile';
import { movedTo } from './sheet-moves';
import { words } from './words';

interface BoxSheetProps {
  readonly leases: readonly DeskLease[];
  /** Answers with something in the box. */
  readonly unticked: ReadonlySet<string>;
  readonly onToggle: (answerId: string) => void;
  readonly onRecord: () => void;
}

const gap = 10;

/** The boxes side by side; arrows walk them, space unticks, Enter records. */
export function BoxSheet({ leases, unticked, onToggle, onRecord }: BoxSheetProps) {
  const isWide = useIsWide();
  const [width, setWidth] = useState(0);
  const [current, setCurrent] = useState(0);
  const tiles = useRef(new Map<number, View>());
  const padding = isWide ? 24 : 12;
  const room = Math.max(0, width - 2 * padding);
  const columns = Math.max(1, Math.floor((room + gap) / ((isWide ? 200 : 160) + gap)));
  const tileWidth = Math.floor((room - gap * (columns - 1)) / columns);
  const isLaidOut = width > 0;
  const focusOn = (index: number) => (tiles.current.get(index) as unknown as HTMLElement | undefined)?.focus();
  useEffect(() => {
    if (isLaidOut) focusOn(0);
  }, [isLaidOut]);
  const hear = (index: number, answerId: string, press: { readonly key: string; preventDefault(): void }) => {
    const to = movedTo(press.key, index, { count: leases.length, columns });
    if (to === null && press.key !== ' ' && press.key !== 'Enter') return;
    press.preventDefault();
    if (press.key === ' ') onToggle(answerId);
    else if (press.key === 'Enter') onRecord();
    else if (to !== null) focusOn(to);
  };
  return (
    <ScrollView onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ flex: 1 }} contentContainerStyle={{ padding }}>
      <View role="group" aria-label={words.sheet} style={{ flexDirection: 'row', flexWrap: 'wrap', gap }}>
        {isLaidOut
          ? leases.map((lease, index) => (
              <BoxTile
                key={lease.answerId}
                lease={lease}
                width={tileWidth}
                isBlank={!unticked.has(lease.answerId)}
                isCurrent={index === current}
                host={(view) => {
                  if (view) tiles.current.set(index, view);
                  else tiles.current.delete(index);
                }}
                onToggle={() => onToggle(lease.answerId)}
                onKey={(press) => hear(index, lease.answerId, press)}
                onFocus={() => setCurrent(index)}
              />
            ))
          : null}
      </View>
    </ScrollView>
  );
}
