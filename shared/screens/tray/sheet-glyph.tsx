import Svg, { Path, Rect } from 'react-native-svg';
import { useColors } from '../../ui/theme';

export type SheetState = 'in' | 'loose' | 'broken' | 'waiting' | 'twice';

const sheet = 'M4,2 H24 L34,12 V46 H4 Z';
const fold = 'M24,2 V12 H34';

/** A sheet of paper that says by its outline how it stands: with a script, loose, broken, on its way, there twice. Its words stand beside it. */
export function SheetGlyph({ state }: { state: SheetState }) {
  const colors = useColors();
  const line = state === 'broken' ? colors.methyl : state === 'loose' || state === 'twice' ? colors.iodine : colors.ink2;
  return (
    <Svg width={38} height={48} viewBox="0 0 38 48" fill="none" strokeWidth={1.6} strokeLinejoin="round" strokeLinecap="round" aria-hidden>
      <Path d={sheet} fill={colors.glass} stroke={line} {...(state === 'waiting' ? { strokeDasharray: '3 3.5' } : {})} />
      <Path d={fold} stroke={line} {...(state === 'waiting' ? { strokeDasharray: '3 3.5' } : {})} />
      {state === 'in' ? (
        <>
          <Rect x={10} y={18} width={6} height={6} stroke={line} />
          <Path d="M20,21 H28 M10,31 H28 M10,37 H24" stroke={line} />
        </>
      ) : null}
      {state === 'loose' ? <Path d="M14.5,23 a4.5,4.5 0 1 1 6.6,4 c-1.6,0.9 -2,1.6 -2,3.2 M19,36 v0.1" stroke={line} strokeWidth={2} /> : null}
      {state === 'broken' ? <Path d="M13,23 L25,35 M25,23 L13,35" stroke={line} strokeWidth={2} /> : null}
      {state === 'twice' ? <Path d="M10,24 H28 M10,32 H28" stroke={line} strokeWidth={2} /> : null}
    </Svg>
  );
}
