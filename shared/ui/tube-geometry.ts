export interface TubeShape {
  readonly width: number;
  readonly walls: string;
  readonly inner: string;
  /** The curve of the surface at a share of the marks, its lowest point on the graduation. */
  surface(share: number): { line: string; body: string; y: number };
  readonly graduations: readonly { readonly y: number; readonly share: number; readonly length: number; readonly isLong: boolean }[];
  readonly stroke: number;
  readonly left: number;
  readonly right: number;
  readonly mouth: number;
  readonly floor: number;
}

const cut = (value: number): string => value.toFixed(2);

/** Walls, inside, surface and graduations of a tube of some height that is worth `marks`; up to five a mark each, beyond that half and full. */
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
  const shown = marks <= 5 ? Math.max(1, Math.round(marks)) : isLarge ? Math.round(marks) : 2;
  const graduations = Array.from({ length: shown }, (_, index) => {
    const isLong = marks <= 5 || !isLarge || (index + 1) % 5 === 0;
    const share = (index + 1) / shown;
    return { y: level(share), share, isLong, length: radius * (isLarge ? (isLong ? 0.74 : 0.4) : 0.72) };
  });
  return {
    width,
    stroke,
    left,
    right,
    mouth,
    floor,
    walls: `M${cut(left - lip)},${mouth} Q${left},${mouth} ${left},${cut(mouth + lip)} V${cut(bottom - radius)} A${radius},${radius} 0 0 0 ${right},${cut(bottom - radius)} V${cut(mouth + lip)} Q${right},${mouth} ${cut(right + lip)},${mouth}`,
    inner: `M${left},${mouth} V${bottom - radius} A${radius},${radius} 0 0 0 ${right},${bottom - radius} V${mouth} Z`,
    surface: (share) => {
      const y = level(share);
      const line = `M${left - 1},${y - sag} Q${width / 2},${y + sag} ${right + 1},${y - sag}`;
      return { line, body: `${line} V${height} H${left - 1}Z`, y };
    },
    graduations,
  };
}
