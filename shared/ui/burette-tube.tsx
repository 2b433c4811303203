import Svg, { Circle, Path } from 'react-native-svg';
import { buretteShape } from './burette-geometry';
import { useColors } from './theme';

export interface BuretteTubeProps {
  readonly stages: number;
  /** In stages: what is above it is done. */
  readonly level: number;
  readonly step: number;
  readonly tubeWidth?: number | undefined;
  readonly left?: number | undefined;
  /** A violet triangle at the level. */
  readonly isPointed?: boolean | undefined;
  /** The tap is filled when nothing more can come. */
  readonly isClosed?: boolean | undefined;
}

/** A burette: what is left in it is what is left to do. */
export function BuretteTube({ stages, level, step, tubeWidth = 24, left = 20, isPointed = false, isClosed = false }: BuretteTubeProps) {
  const colors = useColors();
  const shape = buretteShape({ stages, step, tubeWidth, left });
  const liquid = shape.liquid(level);
  return (
    <Svg width={shape.width} height={shape.height} viewBox={`0 0 ${shape.width} ${shape.height}`} fill="none" aria-hidden>
      {liquid.body === '' ? null : (
        <>
          <Path d={liquid.body} fill={colors.copperMid} />
          <Path d={liquid.curve} stroke={colors.copper} strokeWidth={2} />
        </>
      )}
      {shape.graduations.map(({ y, length, isStage }) => (
        <Path key={y} d={`M${shape.left},${y} h${length}`} stroke={colors.ink2} strokeWidth={isStage ? 1.5 : 1} opacity={isStage ? 1 : 0.75} />
      ))}
      <Path d={shape.walls} stroke={colors.ink2} strokeWidth={1.75} strokeLinecap="round" />
      <Path d={shape.outlet} stroke={colors.ink2} strokeWidth={1.75} strokeLinecap="round" strokeLinejoin="round" />
      <Circle cx={shape.tap.x} cy={shape.tap.y} r={shape.tap.radius} fill={isClosed ? colors.ink2 : colors.paper} stroke={colors.ink2} strokeWidth={1.75} />
      {isPointed ? <Path d={`M${shape.right + 5},${liquid.y} l11,-6.5 v13z`} fill={colors.manganate} /> : null}
    </Svg>
  );
}
