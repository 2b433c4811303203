import { randomFrom } from '../../db/seed/truth/random';
import { loadCodeFinder, type CodeFinder } from '../../server/ingest/sheet/codes';
import { readSheet, type ReadBox, type SheetReading } from '../../server/ingest/sheet/read-sheet';
import { cornersOf } from '../../server/ingest/sheet/page-map';
import type { PageIdentity } from '../../shared/sheets/identity';
import { fill, kinds, type Kind } from './answers';
import { scenarios } from './faults';
import { checkOf, layoutOf, type Master } from './printed';
import { scan, type Scan } from './scanned';

export interface Trial {
  readonly master: Master;
  readonly scenario: string;
  readonly seed: number;
}

export interface BoxOutcome {
  readonly kind: Kind;
  readonly ink: ReadBox['ink'];
  /** The farthest corner from where it truly is. */
  readonly errorMm: number;
  readonly sidesConfirmed: number;
  readonly isCutOff: boolean;
  /** Whether part of it truly lies outside the picture. */
  readonly isOutside: boolean;
}

export interface Outcome {
  readonly scenario: string;
  readonly seed: number;
  readonly paper: string;
  readonly state: SheetReading['state'];
  readonly reason: string | null;
  readonly identity: 'right' | 'wrong' | 'none';
  readonly codes: number;
  readonly isBilevel: boolean;
  readonly boxes: readonly BoxOutcome[];
  readonly ms: number;
}

const isSamePage = (one: PageIdentity, other: PageIdentity): boolean => one.sitting === other.sitting && one.script === other.script && one.page === other.page && one.layout === other.layout;

function boxOutcome(box: ReadBox, kind: Kind, { truth, grey, pxPerMm }: Scan, printed: { x: number; y: number; w: number; h: number }): BoxOutcome {
  const corners = cornersOf(printed).map(truth);
  const errors = corners.map(({ x, y }, index) => Math.hypot(x - (box.corners[index]?.x ?? 0), y - (box.corners[index]?.y ?? 0)) / pxPerMm);
  return {
    kind,
    ink: box.ink,
    errorMm: Math.max(...errors),
    sidesConfirmed: box.sidesConfirmed ?? 0,
    isCutOff: box.isCutOff,
    isOutside: corners.some(({ x, y }) => x < 0 || y < 0 || x > grey.width || y > grey.height),
  };
}

let loaded: Promise<CodeFinder> | undefined;

/** Writes into the boxes of a printed sheet, scans it badly and reads it. Runs in a worker thread. */
export default async function runTrial({ master, scenario, seed }: Trial): Promise<Outcome> {
  const findCodes = await (loaded ??= loadCodeFinder());
  const random = randomFrom('sheets', scenario, seed);
  const layout = layoutOf(master.identity);
  const faultsOf = scenarios[scenario];
  if (!layout || !faultsOf) throw new Error(`There is no ${scenario}.`);
  const canvas = { width: master.width, height: master.height, pixels: Uint8Array.from(master.pixels) };
  const written = new Map<string, Kind>(layout.boxes.map(({ id }) => [id, random.pick(kinds)]));
  for (const box of layout.boxes) fill(canvas, box, written.get(box.id) ?? 'empty', random);
  const scanned = await scan(canvas, master.paper, faultsOf(random), random);
  const begun = performance.now();
  const reading = readSheet(scanned.grey, { findCodes, checkOf, layoutOf });
  const ms = performance.now() - begun;
  const framed = reading.state === 'read' ? reading.boxes.filter(({ sidesConfirmed }) => sidesConfirmed !== null) : [];
  return {
    scenario,
    seed,
    paper: master.paper,
    state: reading.state,
    reason: 'reason' in reading ? (reading.reason ?? null) : null,
    identity: !('identity' in reading) ? 'none' : isSamePage(reading.identity, master.identity) ? 'right' : 'wrong',
    codes: 'codes' in reading ? reading.codes : 0,
    isBilevel: reading.state === 'read' && reading.isBilevel,
    boxes: framed.map((box) => boxOutcome(box, written.get(box.id) ?? 'empty', scanned, layout.boxes.find(({ id }) => id === box.id) ?? { x: 0, y: 0, w: 0, h: 0 })),
    ms,
  };
}
