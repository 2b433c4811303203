import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import { beforeAll, describe, expect, it } from 'vitest';
import { quantile } from '../bench/figures';
import { isWritten } from './answers';
import { scenarios } from './faults';
import { printMasters, type Master } from './printed';
import type { BoxOutcome, Outcome, Trial } from './trial';

/** MENISCUS_SHEETS=full reads three times as many pages. */
const pagesOfScenario = process.env.MENISCUS_SHEETS === 'full' ? 14 : 4;
const threads = 2;

async function runAll(masters: readonly Master[]): Promise<Outcome[]> {
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  const pool = new Piscina({ filename: fileURLToPath(new URL('./trial.ts', import.meta.url)), minThreads: threads, maxThreads: threads, execArgv: ['--import', loader] });
  const trials = Object.keys(scenarios).flatMap((scenario, at) =>
    Array.from({ length: pagesOfScenario }, (_, seed): Trial[] => {
      const master = masters[(seed * 7 + at * 5) % masters.length];
      return master ? [{ master, scenario, seed }] : [];
    }).flat(),
  );
  try {
    return await Promise.all(trials.map((trial) => pool.run(trial) as Promise<Outcome>));
  } finally {
    await pool.destroy();
  }
}

const confirmed = (boxes: readonly BoxOutcome[]): BoxOutcome[] => boxes.filter(({ sidesConfirmed }) => sidesConfirmed === 4);
const nameOf = ({ scenario, seed, paper }: Outcome): string => `${scenario} ${seed} on ${paper}`;

function report(outcomes: readonly Outcome[]): void {
  const boxes = outcomes.flatMap((outcome) => outcome.boxes);
  const errors = confirmed(boxes).map(({ errorMm }) => errorMm);
  const written = boxes.filter(({ kind }) => isWritten(kind));
  const empty = boxes.filter(({ kind }) => !isWritten(kind));
  const count = (some: readonly BoxOutcome[], ink: string): number => some.filter((box) => box.ink === ink).length;
  const perScenario = Object.keys(scenarios).map((scenario) => {
    const own = outcomes.filter((outcome) => outcome.scenario === scenario);
    const ownErrors = confirmed(own.flatMap((outcome) => outcome.boxes)).map(({ errorMm }) => errorMm);
    return `  ${scenario}: ${own.filter(({ state }) => state === 'read').length} of ${own.length} read, box error at most ${Math.max(...ownErrors).toFixed(2)} mm`;
  });
  console.log(
    [
      `${outcomes.length} pages, ${outcomes.filter(({ identity }) => identity === 'right').length} identified, ${outcomes.filter(({ identity }) => identity === 'wrong').length} wrongly`,
      ...perScenario,
      `box error where four sides are confirmed (${errors.length} of ${boxes.length} boxes): median ${quantile(errors, 0.5).toFixed(3)}, 95 % ${quantile(errors, 0.95).toFixed(3)}, 99 % ${quantile(errors, 0.99).toFixed(3)}, largest ${Math.max(...errors).toFixed(3)} mm`,
      `written boxes (${written.length}): ${count(written, 'written')} written, ${count(written, 'unsure')} unsure, ${count(written, 'blank')} blank`,
      `empty boxes (${empty.length}): ${count(empty, 'blank')} blank, ${count(empty, 'unsure')} unsure, ${count(empty, 'written')} written`,
      `reading a page: median ${quantile(outcomes.map(({ ms }) => ms), 0.5).toFixed(0)} ms`,
    ].join('\n'),
  );
}

describe('printed sheets, written on and badly scanned', () => {
  let outcomes: readonly Outcome[];
  beforeAll(async () => {
    outcomes = await runAll(await printMasters());
    report(outcomes);
  }, 1_200_000);

  it('identifies 99.5 % of the pages, and none as another', () => {
    expect(outcomes.filter(({ identity }) => identity === 'wrong').map(nameOf)).toEqual([]);
    expect(outcomes.filter(({ identity }) => identity === 'right').length).toBeGreaterThanOrEqual(outcomes.length * 0.995);
  });

  it('places the boxes within 1 mm where four sides are confirmed, and says where they are not', () => {
    const boxes = outcomes.flatMap((outcome) => outcome.boxes);
    expect(quantile(confirmed(boxes).map(({ errorMm }) => errorMm), 0.99)).toBeLessThan(1);
    expect(boxes.filter(({ errorMm, sidesConfirmed }) => errorMm > 1 && sidesConfirmed === 4)).toEqual([]);
    expect(confirmed(boxes).length).toBeGreaterThan(boxes.length * 0.9);
  });

  it('says which boxes are cut off', () => {
    for (const { isCutOff, isOutside } of outcomes.flatMap((outcome) => outcome.boxes)) if (isOutside) expect(isCutOff).toBe(true);
  });

  it('calls no written box blank and no blank box written', () => {
    const boxes = outcomes.flatMap((outcome) => outcome.boxes.map((box) => ({ page: nameOf(outcome), ...box })));
    expect(boxes.length).toBeGreaterThanOrEqual(300);
    expect(boxes.filter(({ kind, ink }) => isWritten(kind) && ink === 'blank')).toEqual([]);
    expect(boxes.filter(({ kind, ink }) => !isWritten(kind) && ink === 'written')).toEqual([]);
  });

  it('leaves no more than one box in seven of grey pages to a person', () => {
    const boxes = outcomes.filter(({ isBilevel }) => !isBilevel).flatMap((outcome) => outcome.boxes);
    expect(boxes.filter(({ ink }) => ink === 'unsure').length).toBeLessThan(boxes.length / 7);
  });

  it('knows a picture of black and white, where no box is ever blank', () => {
    for (const outcome of outcomes) expect([nameOf(outcome), outcome.isBilevel]).toEqual([nameOf(outcome), outcome.scenario === 'black and white' && outcome.state === 'read']);
    expect(outcomes.filter(({ isBilevel }) => isBilevel).flatMap(({ boxes }) => boxes.filter(({ ink }) => ink === 'blank'))).toEqual([]);
  });
});
