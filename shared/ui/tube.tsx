import { useId } from 'react';
import Svg, { ClipPath, Defs, G, Path, Rect } from 'react-native-svg';
import { useColors } from './theme';
import { size as sizes } from './tokens';
import { tubeShape } from './tube-geometry';

export type TubeState = 'given' | 'ruled' | 'held' | 'unread';

export interface TubeProps {
  readonly state: TubeState;
  /** Marks given and marks available. */
  readonly got?: number;
  readonly of: number;
  readonly height?: number;
  /** Held only, for someone who has typed: the marks either reading would give. */
  readonly levels?: readonly number[];
}

/** A small vial: liquid is marks given over marks available, the lowest point of the curve on the graduation. */
export function Tube({ state, got = 0, of, height = sizes.tubeS, levels = [] }: TubeProps) {
  const colors = useColors();
  const clip = useId();
  const shape = tubeShape(height, of);
  const isEmpty = state === 'held' || state === 'unread';
  const wall = state === 'held' ? colors.iodine : state === 'unread' ? colors.ink3 : colors.ink2;
  const [fluid, edge] = state === 'ruled' ? [colors.manganateFluid, colors.manganate] : [colors.copperFluid, colors.copper];
  const share = of > 0 ? got / of : 0;
  const surface = shape.surface(share);
  const extra = state === 'ruled' ? Math.round(height * 0.2) : 0;
  const tip = height * 0.16;
  return (
    <Svg width={shape.width + extra} height={height} viewBox={`0 0 ${shape.width + extra} ${height}`} fill="none" aria-hidden>
      <Defs>
        <ClipPath id={clip}>
          <Path d={shape.inner} />
        </ClipPath>
      </Defs>
      <Path d={shape.inner} fill={colors.paper} />
      {!isEmpty && (
        <G clipPath={`url(#${clip})`}>
          {got > 0 ? (
            <>
              <Path d={surface.body} fill={fluid} />
              <Path d={surface.line} stroke={edge} strokeWidth={shape.stroke} />
            </>
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
          strokeWidth={height > 60 && mark.isLong ? 1.6 : 1.1}
          opacity={isEmpty ? 0.7 : 1}
        />
      ))}
      {state === 'held' &&
        levels.map((level, index) => {
          const { y } = shape.surface(of > 0 ? level / of : 0);
          const from = index === 0 ? shape.left + 1.2 : shape.width / 2 + 0.6;
          const to = index === 0 ? shape.width / 2 - 0.6 : shape.right - 1.2;
          return <Path key={index} d={`M${from},${y - 1} Q${(from + to) / 2},${y + 1.4} ${to},${y - 1}`} stroke={colors.iodine} strokeWidth={shape.stroke * 1.5} />;
        })}
      <Path d={shape.walls} stroke={wall} strokeWidth={shape.stroke} strokeLinecap="round" {...(isEmpty ? { strokeDasharray: height > 60 ? '4 4' : '2.4 2.6' } : {})} />
      {state === 'ruled' && <Path d={`M${shape.right + shape.stroke + 1},${surface.y} l${tip},${-tip * 0.7} v${tip * 1.4}z`} fill={colors.manganate} />}
    </Svg>
  );
}
