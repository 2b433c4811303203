import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { cast, castPassword } from '../../db/seed/cast';
import { demoSheet } from '../../db/seed/pages/demo-sheet';
import { drawPages } from './demo-draw/draw-pages';
import { pageCount, PAGE_HEIGHT_MM, PAGE_WIDTH_MM, sheetBoxes } from '../../db/seed/pages/sheet-layout';
import { seedPeople } from '../../db/seed/people';
import { demoItems, workedKey, type DemoItem } from '../../db/seed/truth/demo-items';
import type { CandidateTruth } from '../../db/seed/truth/written';
import { allCourses } from '../../db/queries/people';
import { itemDraft } from '../../shared/contracts/items';
import { marksText } from '../../shared/marking/grains';
import type { Actor } from '../auth/access';
import { hashPassword } from '../auth/passwords';
import type { Context } from '../context';
import { candidatesOf, changeAttendance } from '../services/candidates';
import { importClassList } from '../services/class-list';
import { createItem } from '../services/items';
import { saveLayout, saveSample } from '../services/layouts';
import { printFor } from '../services/printings';
import { lockPaper } from '../services/paper-lock';
import { createSitting } from '../services/sittings';
import { demoSeed, demoTruth, secondBatch, type DemoSitting } from './demo-truth';

export const demoIsWanted = ({ config, db }: Context): boolean => config.demo && allCourses(db).length === 0;

/** Who can sign in to the demo, one line each. */
export const signInLines = (): string[] => [
  `Sign in to the demo with the password ${castPassword} as`,
  ...Object.values(cast).map(({ email, name }) => `  ${email.padEnd(32)} ${name}`),
];

function addItems(context: Context, lead: Actor, sittingId: string, items: readonly DemoItem[]): string[] {
  return items.map((item) => {
    const { symbol, charge, electron } = item.asked;
    const quantity = item.asked.quantity === 'sigma' ? 'sigma' : 'zeff';
    const draft = itemDraft.parse({
      asked: { symbol, charge, electron, quantity, convention: 'slater' },
      decimals: workedKey(item).decimals,
      prompt: null,
      marks: marksText(item.maxGrains),
      roundings: { downToDecimals: 1, truncation: false },
      bands: [],
      crossedOut: 'ask',
      twoAnswers: 'ask',
    });
    return createItem(context, lead, sittingId, draft).id;
  });
}

/** The empty printed pages, drawn in a process of their own, as the pictures that regions are drawn on. */
async function addSamplePages(context: Context, lead: Actor, sittingId: string): Promise<void> {
  const outDir = join(context.config.dataDir, 'demo-samples');
  await drawPages({ outDir, seed: demoSeed, sheet: demoSheet, candidates: [], withSamples: true });
  for (let page = 1; page <= pageCount(demoItems.length); page += 1) {
    await saveSample(context, lead, sittingId, page, readFileSync(join(outDir, `sample-p${page}.jpg`)));
  }
  rmSync(outDir, { recursive: true });
}

/** Some did not come, as on any morning. */
function markAbsent(context: Context, lead: Actor, sittingId: string, truth: readonly CandidateTruth[]): void {
  const absent = new Set(truth.filter(({ isAbsent }) => isAbsent).map(({ candidate }) => candidate));
  for (const { id, number, rev } of candidatesOf(context, lead, sittingId)) if (absent.has(number)) changeAttendance(context, lead, id, rev, 'absent');
}

/**
 * The invented demo, through the same services that people use: one sitting locked with twelve items and a class list, and
 * one whose paper is still open to change.
 */
export async function seedDemo(context: Context): Promise<DemoSitting> {
  const { courseId, people } = seedPeople(context.db, await hashPassword(castPassword), context.clock.now());
  const lead: Actor = { personId: people.lead, isOfficer: false };
  const truth = demoTruth();
  const sitting = createSitting(context, lead, courseId, { title: 'Paper 2, spring sitting', heldOn: '2026-05-06', secondPolicy: 'all', totalRounding: 'none' });
  const items = addItems(context, lead, sitting.id, demoItems);
  const pages = Array.from({ length: pageCount(items.length) }, () => ({ widthMm: PAGE_WIDTH_MM, heightMm: PAGE_HEIGHT_MM }));
  const boxes = sheetBoxes(items.length).map(({ itemNumber, ...box }) => ({ ...box, item: items[itemNumber - 1] ?? '' }));
  saveLayout(context, lead, sitting.id, 0, { pages, boxes });
  await addSamplePages(context, lead, sitting.id);
  const late = new Set(secondBatch(truth).map(({ candidate }) => candidate));
  const list = (isLate: boolean): string => truth.filter(({ candidate }) => late.has(candidate) === isLate).map(({ candidate }) => candidate).join('\n');
  importClassList(context, lead, sitting.id, list(false));
  lockPaper(context, lead, sitting.id);
  printFor(context, lead, sitting.id, { paperSize: 'a4', spares: 4, for: 'all' });
  // These came too late for a printed sheet: they write on paper without codes, whose regions are drawn.
  importClassList(context, lead, sitting.id, list(true));
  markAbsent(context, lead, sitting.id, truth);
  const next = createSitting(context, lead, courseId, { title: 'Paper 3, summer sitting', heldOn: '2026-06-03', secondPolicy: 'none', totalRounding: 'none' });
  addItems(context, lead, next.id, demoItems.slice(4, 8));
  return { sittingId: sitting.id, readers: [people.readerOne, people.readerTwo] };
}
