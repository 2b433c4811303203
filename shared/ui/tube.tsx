import { useId } from 'react';
import Svg, { ClipPath, Defs, G, Path, Rect } from 'react-native-svg';
import { settling } from './settling';
import { useColors } from './theme';
import { size as sizes } from './tokens';
import { tubeShape } from './tube-geometry';

export type TubeState = 'given' | 'ruled' | 'held' | 'unread';

/** In: released. Out, and tilted: disputed. */
export type Stopper = 'in' | 'out';

export interface TubeProps {
  readonly state: TubeState;
  /** Marks given and marks available. */
  readonly got?: number | undefined;
  readonly of: number;
  readonly height?: number | undefined;
  /** Held only, for someone who has typed: the marks either reading would give. */
  readonly levels?: readonly number[] | undefined;
  readonly stopper?: Stopper | undefined;
}

/** A small vial: liquid is marks given over marks available, the lowest point of the curve on the graduation. */
export function Tube({ state, got = 0, of, height = sizes.tubeS, levels = [], stopper }: TubeProps) {
  const colors = useColors();
  const clip = useId();
  const shape = tubeShape(height, of, stopper !== undefined);
  const isEmpty = state === 'held' || state === 'unread';
  const wall = state === 'held' ? colors.iodine : state === 'unread' ? colors.ink3 : colors.ink2;
  const [fluid, edge] = state === 'ruled' ? [colors.manganateFluid, colors.manganate] : [colors.copperFluid, colors.copper];
  const share = of > 0 ? Math.min(1, Math.max(0, got / of)) : 0;
  const y = shape.level(share);
  const extra = state === 'ruled' ? Math.round(height * 0.2) : 0;
  const tip = height * 0.16;
  const broken = isEmpty ? { strokeDasharray: height > 60 ? '4 4' : '2.4 2.6' } : {};
  return (
    <Svg width={shape.width + extra} height={height} viewBox={`0 0 ${shape.width + extra} ${height}`} fill="none" strokeLinejoin="round" aria-hidden>
      <Defs>
        <ClipPath id={clip}>
          <Path d={shape.inner} />
        </ClipPath>
      </Defs>
      <Path d={shape.inner} fill={colors.paper} />
      {!isEmpty && (
        <G clipPath={`url(#${clip})`}>
          {got > 0 ? (
            <G style={settling(0, y)}>
              <Path d={shape.liquid} fill={fluid} />
              <Path d={shape.surface} stroke={edge} strokeWidth={shape.stroke} />
            </G>
          ) : (
            <Rect x={0} y={height - shape.stroke * 2.6} width={shape.width} height={shape.stroke * 3} fill={edge} />
          )}
        </G>
      )}
      {shape.graduations.map((mark) => (
        <Path
          key={mark.share}
          d={`M${shape.left + shape.stroke * 0.6},${mark.y} h${mark.length.toFixed(2)}`}
          stroke={!isEmpty && mark.share < share - 0.001 ? colors.paper : colors.ink2}
          strokeWidth={mark.weight}
          opacity={isEmpty ? 0.7 : 1}
        />
      ))}
      {state === 'held' &&
        levels.map((level, index) => {
          const at = shape.level(of > 0 ? level / of : 0);
          const from = index === 0 ? shape.left + 1.2 : shape.width / 2 + 0.6;
          const to = index === 0 ? shape.width / 2 - 0.6 : shape.right - 1.2;
          const sag = shape.sag / 2;
          return <Path key={index} d={`M${from},${at - sag} Q${(from + to) / 2},${at + sag} ${to},${at - sag}`} stroke={colors.iodine} strokeWidth={shape.stroke * 1.5} strokeLinecap="round" />;
        })}
      <Path d={shape.walls} stroke={wall} strokeWidth={shape.stroke} strokeLinecap="round" {...broken} />
      {state === 'ruled' && (
        <G style={settling(0, y)}>
          <Path d={`M${shape.right + shape.stroke + 1},0 l${tip},${-tip * 0.7} v${tip * 1.4}z`} fill={colors.manganate} />
        </G>
      )}
      {stopper === 'in' && <Path d={shape.stopper} fill={colors.ink} />}
      {stopper === 'out' && <Path d={shape.stopper} fill={colors.iodine} transform={`translate(${height * 0.06}, ${-height * 0.02}) rotate(16, ${shape.width / 2}, 3)`} />}
    </Svg>
  );
}
