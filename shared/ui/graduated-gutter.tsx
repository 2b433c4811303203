import { useMemo, useState } from 'react';
import { View } from 'react-native';
import Svg, { Path, Rect } from 'react-native-svg';
import { gutterTicks, gutterWindow } from './gutter-geometry';
import { useColors } from './theme';

interface GraduatedGutterProps {
  readonly total: number;
  /** Rows that wait for someone, counted from 0. */
  readonly marked: readonly number[];
  /** Rows on view. */
  readonly from: number;
  readonly to: number;
  /** The gutter was pressed at this row. */
  readonly onGo: (row: number) => void;
}

const wide = 16;

/** At the right edge of a long list: amber ticks where rows wait, and the part on view. By keyboard the list itself leads from one to the next. */
export function GraduatedGutter({ total, marked, from, to, onGo }: GraduatedGutterProps) {
  const colors = useColors();
  const [height, setHeight] = useState(0);
  const ticks = useMemo(() => gutterTicks(marked, total, height), [marked, total, height]);
  const view = gutterWindow(from, to, total, height);
  const press = {
    onClick: (event: MouseEvent) => {
      const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
      onGo(Math.min(total - 1, Math.max(0, Math.floor(((event.clientY - box.top) / box.height) * total))));
    },
  };
  return (
    <View aria-hidden {...(press as object)} onLayout={({ nativeEvent }) => setHeight(nativeEvent.layout.height)} style={{ width: wide, alignSelf: 'stretch', backgroundColor: colors.well, cursor: 'pointer' }}>
      {height > 0 ? (
        <Svg width={wide} height={height} viewBox={`0 0 ${wide} ${height}`} fill="none">
          <Rect x={1.5} y={view.top + 1} width={wide - 3} height={Math.max(0, view.height - 2)} rx={6} fill={colors.paper} stroke={colors.ink2} strokeWidth={1.5} />
          {ticks.map((y) => (
            <Path key={y} d={`M3,${y} H${wide - 3}`} stroke={colors.iodine} strokeWidth={2} />
          ))}
        </Svg>
      ) : null}
    </View>
  );
}
