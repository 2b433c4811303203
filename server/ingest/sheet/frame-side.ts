import { mapped, type Homography, type Point } from './homography';
import { levelsBetween, type Grey } from './pixels';

/** One side of a frame: its ends in millimetres and the way out of the box. */
export interface SidePlace {
  readonly from: Point;
  readonly to: Point;
  readonly outward: Point;
}

export interface LookForSide {
  readonly grey: Grey;
  readonly map: Homography;
  /** How far to both sides the line is looked for. */
  readonly reachMm: number;
  /** How far from one common distance a slanting line may be seen. */
  readonly slantMm: number;
  /** A side is looked at in at most so many places. */
  readonly mostProfiles: number;
  /** Levels between ink and paper, as the codes show them. */
  readonly contrast: number;
}

export interface FoundSide {
  readonly isConfirmed: boolean;
  /** Outwards from where it should be, at the middle of the side. */
  readonly offsetMm: number;
  /** Growth of the offset for each millimetre along the side. */
  readonly slope: number;
  /** How much darker the line is than the paper on both its sides. */
  readonly contrast: number;
}

const stepMm = 0.1;
/** The paper beside a line is looked at from here to here, on both sides, in steps. */
const paperFrom = 5;
const paperTo = 8;
const leastDark = 5;
const leastDarkShare = 0.2;
const mostResidualMm = 0.35;
const leastShare = 0.55;
const steepest = 0.06;
const endMm = 2;
const besideMm = 0.35;
const fewestProfiles = 14;
const profileMm = 1.5;

const lost: FoundSide = { isConfirmed: false, offsetMm: 0, slope: 0, contrast: 0 };

interface Profile {
  /** Along the side from its middle. */
  readonly alongMm: number;
  readonly levels: Float64Array;
  /** Darkness of a thin line at each step. */
  readonly line: Float64Array;
}

function levelsAcross({ grey, map, reachMm }: LookForSide, at: Point, out: Point): Float64Array {
  const steps = 2 * (Math.round(reachMm / stepMm) + paperTo) + 1;
  const half = ((steps - 1) / 2) * stepMm;
  const start = mapped(map, { x: at.x - out.x * half, y: at.y - out.y * half });
  const end = mapped(map, { x: at.x + out.x * half, y: at.y + out.y * half });
  const levels = new Float64Array(steps);
  levelsBetween(grey, [start, end], levels);
  return levels;
}

/** How much darker each place is than the paper on the darker of its sides: high for a line, not for an edge or a shadow. */
function lineIn(levels: Float64Array): Float64Array {
  const sums = new Float64Array(levels.length + 1);
  for (let at = 0; at < levels.length; at += 1) sums[at + 1] = sums[at]! + levels[at]!;
  const paperSteps = paperTo - paperFrom + 1;
  const line = new Float64Array(levels.length);
  for (let at = paperTo; at < levels.length - paperTo; at += 1) {
    const before = sums[at - paperFrom + 1]! - sums[at - paperTo]!;
    const behind = sums[at + paperTo + 1]! - sums[at + paperFrom]!;
    line[at] = (before < behind ? before : behind) / paperSteps - (sums[at + 2]! - sums[at - 1]!) / 3;
  }
  return line;
}

function profilesOf(look: LookForSide, { from, to, outward }: SidePlace): Profile[] {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const [along, inset] = [{ x: (to.x - from.x) / length, y: (to.y - from.y) / length }, Math.min(endMm, length * 0.15)];
  const count = Math.min(look.mostProfiles, Math.max(fewestProfiles, Math.round((length - 2 * inset) / profileMm)));
  return Array.from({ length: count }, (_, index) => {
    const alongMm = -length / 2 + inset + ((length - 2 * inset) * index) / (count - 1);
    const at = (shift: number): Point => ({ x: from.x + along.x * (length / 2 + alongMm + shift), y: from.y + along.y * (length / 2 + alongMm + shift) });
    const levels = levelsAcross(look, at(-besideMm), outward);
    const beside = levelsAcross(look, at(besideMm), outward);
    for (let step = 0; step < levels.length; step += 1) levels[step] = (levels[step]! + beside[step]!) / 2;
    return { alongMm, levels, line: lineIn(levels) };
  });
}

/** The step at which most profiles see a line. */
function sharedStep(profiles: readonly Profile[], contrast: number): number {
  const steps = profiles[0]?.line.length ?? 0;
  const votes = new Float64Array(steps);
  for (const { line } of profiles) for (let at = 0; at < steps; at += 1) votes[at] = votes[at]! + Math.max(0, Math.min(line[at]!, contrast / 2));
  let best = 0;
  let most = -1;
  for (let at = 3; at < steps - 3; at += 1) {
    let sum = 0;
    for (let near = at - 3; near <= at + 3; near += 1) sum += votes[near]!;
    if (sum > most) {
      best = at;
      most = sum;
    }
  }
  return best;
}

interface Seen {
  readonly alongMm: number;
  readonly offsetMm: number;
  readonly dark: number;
}

/** The middle of the darkness round the darkest line near a step. */
function lineNear({ alongMm, levels, line }: Profile, shared: number, slantMm: number): Seen {
  const within = Math.round(slantMm / stepMm);
  let peak = Math.max(0, shared - within);
  for (let at = peak; at <= Math.min(line.length - 1, shared + within); at += 1) if ((line[at] ?? 0) > (line[peak] ?? 0)) peak = at;
  let sum = 0;
  let moment = 0;
  let paper = 0;
  for (let at = peak - 4; at <= peak + 4; at += 1) paper = Math.max(paper, levels[at] ?? 0);
  for (let at = peak - 4; at <= peak + 4; at += 1) {
    const dark = paper - (levels[at] ?? paper);
    sum += dark;
    moment += dark * at;
  }
  const middle = sum > 0 ? moment / sum : peak;
  return { alongMm, offsetMm: (middle - (levels.length - 1) / 2) * stepMm, dark: line[peak] ?? 0 };
}

const medianOf = (values: readonly number[]): number => [...values].sort((one, other) => one - other)[Math.floor(values.length / 2)] ?? 0;

/** A line through most of what was seen: refitted to the near ones until only they count. */
function lineThrough(seen: readonly Seen[]): { offsetMm: number; slope: number } {
  let fit = { offsetMm: medianOf(seen.map(({ offsetMm }) => offsetMm)), slope: 0 };
  for (const reach of [0.7, 0.35, 0.2]) {
    const near = seen.filter(({ alongMm, offsetMm }) => Math.abs(offsetMm - fit.offsetMm - fit.slope * alongMm) <= reach);
    if (near.length < 3) break;
    const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
    const [x, y] = [mean(near.map(({ alongMm }) => alongMm)), mean(near.map(({ offsetMm }) => offsetMm))];
    const spread = near.reduce((sum, { alongMm }) => sum + (alongMm - x) ** 2, 0);
    const slope = spread > 0 ? near.reduce((sum, { alongMm, offsetMm }) => sum + (alongMm - x) * (offsetMm - y), 0) / spread : 0;
    fit = { offsetMm: y - slope * x, slope };
  }
  return fit;
}

/** Looks for one side of a frame near where a map puts it. */
export function findSide(look: LookForSide, place: SidePlace): FoundSide {
  const profiles = profilesOf(look, place);
  const shared = sharedStep(profiles, look.contrast);
  const least = Math.max(leastDark, look.contrast * leastDarkShare);
  const seen = profiles.map((profile) => lineNear(profile, shared, look.slantMm)).filter(({ dark }) => dark >= least);
  if (seen.length < profiles.length * leastShare) return lost;
  const { offsetMm, slope } = lineThrough(seen);
  const near = seen.filter((one) => Math.abs(one.offsetMm - offsetMm - slope * one.alongMm) <= mostResidualMm);
  const isConfirmed = near.length >= profiles.length * leastShare && Math.abs(slope) <= steepest && Math.abs(offsetMm) <= look.reachMm;
  return isConfirmed ? { isConfirmed, offsetMm, slope, contrast: medianOf(near.map(({ dark }) => dark)) } : lost;
}
