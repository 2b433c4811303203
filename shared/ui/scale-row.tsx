import Svg, { Path, Rect } from 'react-native-svg';
import { outlineOf, stepsOf, type ScaleBand } from './scale-geometry';
import { useColors } from './theme';

interface ScaleRowProps {
  readonly keyAt: number;
  /** From the key, which stands in the middle of every row, to either end. */
  readonly reach: number;
  readonly bands?: readonly ScaleBand[] | undefined;
  /** Marks of the whole. */
  readonly of: number;
  /** Up to two readings; none where they are kept back. */
  readonly readings?: readonly number[] | undefined;
  readonly ruled?: number | undefined;
  readonly width?: number | undefined;
  readonly height?: number | undefined;
}

const inset = 8;

/** A scale as a hairline, the key at the centre, so that a page of rows reads as one chart. What it shows stands in the row's other cells. */
export function ScaleRow({ keyAt, reach, bands = [], of, readings = [], ruled, width = 140, height = 28 }: ScaleRowProps) {
  const colors = useColors();
  const base = height - 9;
  const place = (value: number) => width / 2 + Math.min(1, Math.max(-1, (value - keyAt) / reach)) * (width / 2 - inset);
  const steps = stepsOf(bands, place, base, (base - 4) / Math.max(of, 1));
  const isOff = (value: number) => Math.abs(value - keyAt) > reach * (1 + 1e-9);
  const middle = place(keyAt);
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} fill="none" aria-hidden>
      {steps.map(({ band, left, right, top }, index) => (
        <Rect key={band.name} x={left} y={top} width={right - left} height={base - top} fill={index === steps.length - 1 ? colors.copperFluid : colors.copperFaint} />
      ))}
      {steps.length > 0 ? (
        <Path d={outlineOf(steps, base)} stroke={colors.copper} strokeWidth={1.1} strokeLinejoin="round" />
      ) : (
        <Path d={`M${middle},5 V${base}`} stroke={colors.copper} strokeWidth={2} />
      )}
      <Path d={`M${middle - 4},1 h8 l-4,5.2z`} fill={colors.copper} />
      <Path d={`M2,${base} H${width - 2}`} stroke={colors.ink2} strokeWidth={1.25} />
      {readings.map((value, index) => {
        if (isOff(value)) {
          const isHigh = value > keyAt;
          return <Path key={index} d={`M${isHigh ? width - 1 : 1},${base} l${isHigh ? -6 : 6},-4 v8z`} fill={colors.manganate} />;
        }
        const x = place(value);
        return <Path key={index} d={`M${x - 4.5},${base + 2.2} Q${x},${base + 7.6} ${x + 4.5},${base + 2.2}`} stroke={colors.manganate} strokeWidth={2} strokeLinecap="round" />;
      })}
      {ruled === undefined ? null : <Path d={`M${place(ruled)},${base - 1} l4.5,-7 h-9z`} fill={colors.manganate} />}
    </Svg>
  );
}
