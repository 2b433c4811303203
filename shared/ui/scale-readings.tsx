import { Circle, G, Path, Rect } from 'react-native-svg';
import type { ScaleFrame } from './scale-frame';
import { beyond, hangColumns } from './scale-geometry';
import type { ScaleProps } from './scale-props';
import { settling } from './settling';
import { SvgWords } from './svg-words';
import { useColors } from './theme';

interface PartProps {
  readonly scale: ScaleProps;
  readonly frame: ScaleFrame;
}

/** A triangle at an end, for what lies beyond it, with the count or the value. */
function OffScale({ isHigh, frame: { width, pad, base }, text }: { isHigh: boolean; frame: ScaleFrame; text: string }) {
  const colors = useColors();
  const x = isHigh ? width - pad + 7 : pad - 7;
  return (
    <>
      <Path d={`M${x},${base + 22} l${isHigh ? -7 : 7},-4.5 v9z`} fill={colors.manganate} />
      <SvgWords x={x + (isHigh ? -12 : 12)} y={base + 26.5} anchor={isHigh ? 'end' : 'start'} face="Mono500" size={12} tone="manganate" halo="paper">
        {text}
      </SvgWords>
    </>
  );
}

/** Readings below the line: beads for a few, columns that lengthen with the count for many. */
export function Hanging({ scale, frame }: PartProps) {
  const colors = useColors();
  const { columns = [] } = scale;
  const { place, base, depth } = frame;
  const { low, high, within } = beyond(columns, scale);
  const isFew = columns.every(({ count }) => count <= 3);
  const top = base + 2;
  return (
    <>
      {isFew
        ? within.flatMap(({ at, count }) =>
            Array.from({ length: count }, (_, index) => (
              <Circle key={`${at} ${index}`} cx={place(at)} cy={top + 5 + index * 9} r={3.6} fill={colors.manganateFluid} stroke={colors.manganate} />
            )),
          )
        : hangColumns(within, place, depth - 6).map(({ at, x, length, count, isCountShown }) => (
            <G key={at}>
              <Path d={`M${x - 3.5},${top} V${top + length - 3.5} a3.5,3.5 0 0 0 7,0 V${top}z`} fill={colors.manganateFluid} stroke={colors.manganate} />
              {isCountShown ? (
                <SvgWords x={x + 7} y={Math.max(top + length, top + 19)} face="Next500" size={12} tone="manganate" halo="paper">
                  {String(count)}
                </SvgWords>
              ) : null}
            </G>
          ))}
      {low > 0 ? <OffScale isHigh={false} frame={frame} text={String(low)} /> : null}
      {high > 0 ? <OffScale isHigh frame={frame} text={String(high)} /> : null}
    </>
  );
}

/** The two readings of a pair as arcs, and the gap between them in amber. */
export function PairReadings({ pair, frame }: { pair: NonNullable<ScaleProps['pair']>; frame: ScaleFrame }) {
  const colors = useColors();
  const { place, base, full, pad, width } = frame;
  const inside = (value: number) => Math.min(Math.max(place(value), pad), width - pad);
  const [a, b] = [inside(pair.first), inside(pair.second)];
  const y = base + 9;
  const gapY = base + 22;
  const half = pair.gap.length * 3.4 + 5;
  const middle = Math.min(Math.max((a + b) / 2, half), width - half);
  const isNarrow = Math.abs(b - a) < 2 * half + 12;
  return (
    <>
      {[a, b].map((x, index) => (
        <G key={index}>
          <Path d={`M${x - 6},${y - 3.2} Q${x},${y + 3.6} ${x + 6},${y - 3.2}`} stroke={colors.manganate} strokeWidth={2.6} strokeLinecap="round" />
          <Path d={`M${x},${full + 2} V${base + 6}`} stroke={colors.manganate} strokeWidth={1.5} />
        </G>
      ))}
      <Path d={`M${a},${gapY - 6} V${gapY} H${b} V${gapY - 6}`} stroke={colors.iodine} strokeWidth={1.75} />
      {isNarrow ? null : <Rect x={middle - half} y={gapY - 8} width={2 * half} height={16} fill={colors.paper} />}
      <SvgWords x={middle} y={isNarrow ? gapY + 14 : gapY + 4.5} anchor="middle" face="Next600" size={12} tone="iodine" halo="paper">
        {pair.gap}
      </SvgWords>
    </>
  );
}

/** The drop of the value in hand. */
export function Drop({ scale, frame }: PartProps) {
  const colors = useColors();
  const { drop, dropText, lo, hi } = scale;
  if (drop === null || drop === undefined) return null;
  if (drop < lo || drop > hi) return <OffScale isHigh={drop > hi} frame={frame} text={dropText || String(drop)} />;
  const { place, full, base } = frame;
  return (
    <G style={settling(place(drop), 0)}>
      <Path d={`M0,${full - 2} V${base + 7}`} stroke={colors.manganate} strokeWidth={1.75} />
      <Path d={`M0,${base + 1} c5,7 6.5,9.5 6.5,12.5 a6.5,6.5 0 0 1 -13,0 c0,-3 1.5,-5.5 6.5,-12.5z`} fill={colors.manganateFluid} stroke={colors.manganate} strokeWidth={1.5} />
    </G>
  );
}
