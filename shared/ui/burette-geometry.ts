/**
 * How far down the meniscus stands, counted in stages: the finished stages, plus the finished part of the first unfinished one.
 * `parts` is the finished share of each stage, 0 to 1.
 */
export function buretteLevel(parts: readonly number[]): number {
  const open = parts.findIndex((part) => part < 1);
  if (open === -1) return parts.length;
  return open + Math.min(1, Math.max(0, parts[open] ?? 0));
}

export interface BuretteMeasure {
  readonly stages: number;
  /** Pixels from stage to stage. */
  readonly step: number;
  readonly tubeWidth: number;
  /** Small graduations a stage. */
  readonly perStage?: number;
  /** From the left edge to the tube. */
  readonly left?: number;
}

export interface BuretteShape {
  readonly width: number;
  readonly height: number;
  readonly top: number;
  readonly bottom: number;
  readonly left: number;
  readonly right: number;
  readonly walls: string;
  readonly outlet: string;
  readonly tap: { readonly x: number; readonly y: number; readonly radius: number };
  readonly graduations: readonly { readonly y: number; readonly length: number; readonly isStage: boolean }[];
  /** What is left in it, and its curve, for a level in stages; empty when nothing is left. */
  liquid(level: number): { readonly body: string; readonly curve: string; readonly y: number };
}

const lip = 24;
const below = 64;

/** Walls, tap, graduations and liquid of an upright burette. */
export function buretteShape({ stages, step, tubeWidth, perStage = 8, left = 20 }: BuretteMeasure): BuretteShape {
  const top = lip + 2;
  const bottom = top + stages * step;
  const right = left + tubeWidth;
  const middle = left + tubeWidth / 2;
  const yOf = (level: number) => top + Math.min(stages, Math.max(0, level)) * step;
  const sag = tubeWidth * 0.19;
  return {
    width: right + left,
    height: bottom + below,
    top,
    bottom,
    left,
    right,
    walls: `M${left - 4},${top - lip} q4,1 4,6 V${bottom} q0,9 8,12 v14 M${right + 4},${top - lip} q-4,1 -4,6 V${bottom} q0,9 -8,12 v14`,
    outlet: `M${left + 2},${bottom + 31} H${right - 2} M${middle - 2.5},${bottom + 26} v18 l2.5,6 2.5,-6 v-18`,
    tap: { x: middle, y: bottom + 31, radius: 4.5 },
    graduations: Array.from({ length: stages * perStage + 1 }, (_, index) => {
      const isStage = index % perStage === 0;
      const share = isStage ? 0.62 : index % (perStage / 2) === 0 ? 0.4 : 0.26;
      return { y: top + (index * step) / perStage, length: tubeWidth * share, isStage };
    }),
    liquid: (level) => {
      const y = yOf(level);
      if (level >= stages) return { body: '', curve: '', y };
      const curve = `M${left + 1},${y - sag} Q${middle},${y + sag} ${right - 1},${y - sag}`;
      return { curve, body: `${curve} V${bottom} q0,8 -8,11 H${left + 9} q-8,-3 -8,-11z`, y };
    },
  };
}
