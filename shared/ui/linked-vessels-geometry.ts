export interface VesselLink {
  /** Places in the row, the source before what follows it. */
  readonly from: number;
  readonly to: number;
}

export interface LinkedVesselsShape {
  readonly width: number;
  /** Of the drawing; what is written under it comes on top. */
  readonly height: number;
  /** The left upper corner of each vessel. */
  readonly places: readonly { readonly x: number; readonly y: number }[];
  /** A siphon a link: out of the liquid of one vessel, over the rim, and into the next. */
  readonly tubes: readonly string[];
}

export const vesselSize = { width: 52, height: 50, liquid: 17, foot: 12 } as const;

const topMargin = 4;
const overRim = 8;
const overEach = 8;
const fallEach = 7;
const fromWall = 8;
const apart = 6;
const bend = 6;

/** How many links lie before each vessel, along the longest way. */
function depths(count: number, links: readonly VesselLink[]): number[] {
  const depth = Array.from({ length: count }, () => 0);
  for (let at = 0; at < count; at += 1) for (const { from, to } of links) if (to === at && from < at) depth[at] = Math.max(depth[at] ?? 0, (depth[from] ?? 0) + 1);
  return depth;
}

/** Vessels in a row, each standing lower than what runs into it, with the siphons between them: liquid runs down only. */
export function linkedVessels(count: number, links: readonly VesselLink[], cell: number): LinkedVesselsShape {
  const depth = depths(count, links);
  const widest = Math.max(1, ...links.map(({ from, to }) => Math.abs(to - from)));
  const rim = topMargin + overRim + overEach * widest;
  const places = depth.map((level, at) => ({ x: at * cell + (cell - vesselSize.width) / 2, y: rim + level * fallEach }));
  const used = { out: new Map<number, number>(), into: new Map<number, number>() };
  const next = (counts: Map<number, number>, at: number): number => {
    const before = counts.get(at) ?? 0;
    counts.set(at, before + 1);
    return Math.min(before, 1) * apart;
  };
  const tubes = links.map(({ from, to }) => {
    const [source, goal] = [places[from], places[to]];
    if (!source || !goal) return '';
    const span = Math.abs(to - from);
    const x1 = source.x + vesselSize.width - fromWall - next(used.out, from);
    const x2 = goal.x + fromWall + next(used.into, to);
    const between = places.slice(Math.min(from, to), Math.max(from, to) + 1).map(({ y }) => y);
    const over = Math.min(...between) - overRim - overEach * (span - 1);
    const way = Math.sign(x2 - x1) * bend;
    return `M${x1},${source.y + vesselSize.height - vesselSize.liquid + 5} V${over + bend} Q${x1},${over} ${x1 + way},${over} H${x2 - way} Q${x2},${over} ${x2},${over + bend} V${goal.y + 9}`;
  });
  const lowest = Math.max(...places.map(({ y }) => y), rim);
  return { width: count * cell, height: lowest + vesselSize.height + 4, places, tubes };
}

/** Walls and foot of a vessel at a place, open above. */
export function vesselWalls({ x, y }: { readonly x: number; readonly y: number }): string {
  const { width, height, foot } = vesselSize;
  return `M${x},${y} V${y + height - foot} Q${x},${y + height} ${x + foot},${y + height} H${x + width - foot} Q${x + width},${y + height} ${x + width},${y + height - foot} V${y}`;
}

/** Its liquid, with the curve on top. */
export function vesselLiquid({ x, y }: { readonly x: number; readonly y: number }): { readonly body: string; readonly surface: string } {
  const { width, height, foot, liquid } = vesselSize;
  const level = y + height - liquid;
  const surface = `M${x},${level - 2} Q${x + width / 2},${level + 4} ${x + width},${level - 2}`;
  return { surface, body: `${surface} V${y + height - foot} Q${x + width},${y + height} ${x + width - foot},${y + height} H${x + foot} Q${x},${y + height} ${x},${y + height - foot} Z` };
}
