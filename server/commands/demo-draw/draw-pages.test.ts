import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { candidateNumbers, inventTruth } from '../../../db/seed/truth/truth';
import { drawPages } from './draw-pages';
import type { PageDrawn } from '../../../db/seed/pages/page-job';
import type { PrintedSheet } from '../../../db/seed/pages/printed';

const sheet: PrintedSheet = {
  title: 'CHM 214, Paper 2',
  lines: ['University of Wrenmoor'],
  items: [1, 2, 3, 4, 5, 6, 7].map((number) => ({ number, marks: 2, prompt: 'Find Z_eff for a 3p electron of a Cl atom.' })),
};
const terms = [{ count: 6, factor: '0.35' }, { count: 8, factor: '0.85' }, { count: 2, factor: '1' }];
const items = sheet.items.map(({ number }) => ({
  number,
  quantity: 'zeff' as const,
  nuclear: 17,
  key: '6.10',
  terms,
  roundings: ['6.1'],
  slips: [],
}));
const present = { seed: 'test', items, absentShare: 0 };

let outDir: string;
beforeEach(() => {
  outDir = mkdtempSync(join(tmpdir(), 'pages-'));
});
afterEach(() => rmSync(outDir, { recursive: true, force: true }));

describe('drawing a batch in a process of its own', () => {
  it('writes one file a candidate and page, named by both, and reports each when it is whole', async () => {
    const [here, away] = inventTruth({ ...present, candidates: candidateNumbers(2, 4071) });
    if (!here || !away) throw new Error('Two candidates were asked for.');
    const reported: PageDrawn[] = [];
    const candidates = [here, { ...away, isAbsent: true, answers: [] }];
    const pages = await drawPages({
      outDir,
      seed: 'test',
      sheet,
      candidates,
      withSamples: true,
      onPage: (page) => {
        expect(statSync(join(outDir, page.file)).size).toBe(page.bytes);
        reported.push(page);
      },
    });
    const names = ['sample-p1.jpg', 'sample-p2.jpg', 'W4071-p1.jpg', 'W4071-p2.jpg'];
    expect(pages.map((page) => page.file)).toEqual(names);
    expect(reported).toEqual(pages);
    expect(readdirSync(outDir).sort()).toEqual([...names].sort());
  });

  it('stops when it is told to and leaves only whole pages', async () => {
    const candidates = inventTruth({ ...present, candidates: candidateNumbers(60) });
    const stopped = new AbortController();
    const drawing = drawPages({
      outDir,
      seed: 'test',
      sheet,
      candidates,
      signal: stopped.signal,
      onPage: () => stopped.abort(new Error('Enough pages.')),
    });
    await expect(drawing).rejects.toThrow('Enough pages.');
    const whole = readdirSync(outDir).filter((name) => name.endsWith('.jpg'));
    expect(whole.length).toBeGreaterThan(0);
    expect(whole.length).toBeLessThan(60);
  });

  it('says what went wrong when a page cannot be drawn', async () => {
    const [candidate] = inventTruth({ ...present, candidates: ['W4071'] });
    const [answer] = candidate?.answers ?? [];
    if (!candidate || !answer) throw new Error('One candidate was asked for.');
    const unwritable = { ...answer, kind: 'value' as const, text: '\u2603' };
    await expect(drawPages({ outDir, seed: 'test', sheet, candidates: [{ ...candidate, answers: [unwritable] }] })).rejects.toThrow(/has no/);
  });
});
