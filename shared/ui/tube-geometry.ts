export interface TubeGraduation {
  readonly y: number;
  readonly share: number;
  readonly length: number;
  readonly weight: number;
}

export interface TubeShape {
  readonly width: number;
  readonly walls: string;
  readonly inner: string;
  /** How high the lowest point of the surface stands at a share of the marks: exactly on the graduation. */
  level(share: number): number;
  /** The curve of the surface and the liquid under it, for a level of 0. */
  readonly surface: string;
  readonly liquid: string;
  readonly sag: number;
  readonly graduations: readonly TubeGraduation[];
  readonly stopper: string;
  readonly stroke: number;
  readonly left: number;
  readonly right: number;
  readonly mouth: number;
  readonly floor: number;
}

const cut = (value: number): string => value.toFixed(2);

/** Walls, inside, surface and graduations of a tube of some height that is worth `marks`. */
export function tubeShape(height: number, marks: number, hasStopper = false): TubeShape {
  const isLarge = height > 60;
  const width = Math.round(height * (isLarge ? 0.46 : 0.56));
  const stroke = isLarge ? 2 : 1.5;
  const left = stroke / 2 + height * 0.085 + 0.5;
  const right = width - left;
  const lip = height * 0.085;
  const mouth = hasStopper ? height * 0.17 : stroke / 2 + 0.25;
  const radius = (right - left) / 2;
  const bottom = height - stroke / 2 - 0.25;
  const full = mouth + height * 0.17;
  const floor = bottom - stroke * 0.5;
  const level = (share: number): number => floor - (floor - full) * share;
  const sag = Math.max(1.1, radius * 0.34);
  return {
    width,
    stroke,
    left,
    right,
    mouth,
    floor,
    sag,
    level,
    walls: `M${cut(left - lip)},${mouth} Q${left},${mouth} ${left},${cut(mouth + lip)} V${cut(bottom - radius)} A${radius},${radius} 0 0 0 ${right},${cut(bottom - radius)} V${cut(mouth + lip)} Q${right},${mouth} ${cut(right + lip)},${mouth}`,
    inner: `M${left},${mouth} V${bottom - radius} A${radius},${radius} 0 0 0 ${right},${bottom - radius} V${mouth} Z`,
    surface: `M${left - 1},${-sag} Q${width / 2},${sag} ${right + 1},${-sag}`,
    liquid: `M${left - 1},${-sag} Q${width / 2},${sag} ${right + 1},${-sag} V${height} H${left - 1}Z`,
    graduations: graduationsOf(marks, isLarge, radius, level),
    stopper: `M${left - 0.5},${mouth + 1.2} L${left - 1.2},0.9 H${right + 1.2} L${right + 0.5},${mouth + 1.2}z`,
  };
}

/** Up to five marks one graduation each, and on a large tube short ones between; beyond that half and full on a small tube, on a large one each mark as long as there is room, every fifth long. */
function graduationsOf(marks: number, isLarge: boolean, radius: number, level: (share: number) => number): TubeGraduation[] {
  if (!(marks > 0)) return [];
  if (!isLarge) {
    const shown = marks <= 5 ? Math.max(1, Math.round(marks)) : 2;
    return sharesOf(shown).map((share) => ({ share, y: level(share), length: radius * 0.72, weight: 1.1 }));
  }
  const shown = Math.max(1, Math.round(marks));
  const gap = (level(0) - level(1)) / shown;
  if (marks <= 5) {
    const whole = sharesOf(shown).map((share) => ({ share, y: level(share), length: radius * 0.74, weight: 1.6 }));
    const halves = whole.map(({ share }) => share - 0.5 / shown).map((share) => ({ share, y: level(share), length: radius * 0.36, weight: 1.2 }));
    return [...whole, ...halves];
  }
  return sharesOf(shown)
    .map((share, index) => ({ share, y: level(share), isFifth: (index + 1) % 5 === 0 }))
    .filter(({ isFifth }) => isFifth || gap >= 3.4)
    .map(({ share, y, isFifth }) => ({ share, y, length: radius * (isFifth ? 0.74 : 0.4), weight: isFifth ? 1.6 : 1 }));
}

const sharesOf = (count: number): number[] => Array.from({ length: count }, (_, index) => (index + 1) / count);
