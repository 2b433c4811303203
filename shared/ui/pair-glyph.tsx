import { View } from 'react-native';
import Svg, { Path, Rect } from 'react-native-svg';
import { Text } from './text';
import { useColors } from './theme';
import type { ColorRole, Colors } from './tokens';

export type PairState = 'unread' | 'single' | 'concordant' | 'discordant' | 'ruled' | 'illegible' | 'blank' | 'aside' | 'disputed';

const arc = (x: number, y: number) => `M${x},${y - 2.2} Q${x + 4.5},${y + 2.6} ${x + 9},${y - 2.2}`;

function Strokes({ state, colors }: { state: PairState; colors: Colors }) {
  const dotted = { stroke: colors.ink3, strokeWidth: 2.2, strokeDasharray: '1 3.4' };
  const read = { stroke: colors.manganate, strokeWidth: 2.2 };
  const undecided = { stroke: colors.iodine, strokeWidth: 1.8 };
  switch (state) {
    case 'unread':
      return <><Path d={arc(2.5, 9)} {...dotted} /><Path d={arc(14.5, 9)} {...dotted} /></>;
    case 'single':
      return <><Path d={arc(2.5, 9)} {...read} /><Path d={arc(14.5, 9)} {...dotted} /></>;
    case 'concordant':
      return <><Path d={arc(2.5, 9)} {...read} /><Path d={arc(14.5, 9)} {...read} /><Path d="M2.5,14.2 H23.5" stroke={colors.copper} strokeWidth={1.8} /></>;
    case 'discordant':
      return <><Path d={arc(2.5, 5)} {...read} /><Path d={arc(14.5, 14)} {...read} /><Path d="M13,2 V16.5" {...undecided} strokeDasharray="2.2 2.6" /></>;
    case 'ruled':
      return <><Path d="M2,9 l5,-3.6 v7.2z" fill={colors.manganate} /><Path d="M9,6.8 Q16.5,13 24,6.8" {...read} /></>;
    case 'illegible':
      return <Path d="M3,10 q2,-7 4,0 t4,0 t4,0 t4,0 q1.4,-4 3,-2" {...undecided} />;
    case 'blank':
      return <Rect x={5} y={3.5} width={16} height={11} rx={1.5} stroke={colors.ink2} strokeWidth={1.6} />;
    case 'aside':
      return <Path d="M6,16.5 V2.5 H20 L16.5,6.2 20,10 H6" {...undecided} />;
    case 'disputed':
      return <><Path d="M4,3.5 H22 V12 H14 L10,16 V12 H4Z" {...undecided} /><Path d="M9,7.8 H17" {...undecided} /></>;
  }
}

/** How the readings of one answer stand to each other. Always with its word beside it. */
export function PairGlyph({ state, scale = 1 }: { state: PairState; scale?: number }) {
  const colors = useColors();
  return (
    <Svg width={26 * scale} height={18 * scale} viewBox="0 0 26 18" fill="none" strokeLinecap="round" strokeLinejoin="round" aria-hidden>
      <Strokes state={state} colors={colors} />
    </Svg>
  );
}

export const pairWords: Readonly<Record<PairState, string>> = {
  unread: 'not read',
  single: 'one reading',
  concordant: 'concordant',
  discordant: 'discordant',
  ruled: 'ruled',
  illegible: 'can’t read',
  blank: 'blank',
  aside: 'set aside',
  disputed: 'disputed',
};

const tones: Partial<Record<PairState, Extract<ColorRole, 'iodine' | 'manganate'>>> = { discordant: 'iodine', illegible: 'iodine', aside: 'iodine', disputed: 'iodine', ruled: 'manganate' };

/** The glyph with its word, or with a longer one. */
export function PairLabel({ state, children, scale }: { state: PairState; children?: string | undefined; scale?: number | undefined }) {
  const tone = tones[state];
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, flexShrink: 1, minWidth: 0 }}>
      <PairGlyph state={state} {...(scale === undefined ? {} : { scale })} />
      <Text variant="small" weight={tone ? 600 : 400} tone={tone ?? 'ink2'} lines={1} style={{ flexShrink: 1 }}>
        {children ?? pairWords[state]}
      </Text>
    </View>
  );
}

/** Two nested arcs: this is read as you read it. */
export function SameGlyph() {
  const colors = useColors();
  return (
    <Svg width={20} height={18} viewBox="0 0 20 18" fill="none" strokeLinecap="round" aria-hidden>
      <Path d="M3,5 Q10,12 17,5" stroke={colors.manganate} strokeWidth={2.2} />
      <Path d="M3,10 Q10,17 17,10" stroke={colors.manganate} strokeWidth={2.2} />
    </Svg>
  );
}
