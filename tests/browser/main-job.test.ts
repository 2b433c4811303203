import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { buildDemoSitting, drawDemoPages } from '../support/demo-sitting';
import { readWithKeys, readWithPad } from '../support/read-at-desk';
import { listenToResponses } from '../support/reader-session';
import { marksByTruth, marksInFile, ruleAll } from '../support/rule-held';
import { itemsRead, writtenPaper } from '../support/written-paper';
import type { BuiltPaper } from '../support/paper';

/** Sends every file of a folder through the tray, as a person does. */
async function upload(page: Page, address: string, sittingId: string, folder: string, pages: number): Promise<void> {
  await page.goto(`${address}/sittings/${sittingId}/scans`);
  const chooser = page.waitForEvent('filechooser');
  await page.getByTestId('add-scans').click();
  await (await chooser).setFiles(readdirSync(folder).map((name) => join(folder, name)));
  await page.getByTestId('send-files').click();
  await page.getByText(`${pages} pages, all with a script`).waitFor({ timeout: 60_000 });
}

for (const viewport of ['wide', 'phone'] as const) {
  describe(`the main job, ${viewport}`, () => {
    const paper = writtenPaper();
    let bench: BrowserBench;
    let folder: string;
    let built: BuiltPaper;
    beforeAll(async () => {
      folder = mkdtempSync(join(tmpdir(), 'meniscus-pages-'));
      [bench] = await Promise.all([startBrowserBench(), drawDemoPages(folder, paper.truth, itemsRead)]);
      built = buildDemoSitting(bench.server, paper.truth.map(({ candidate }) => candidate), itemsRead);
    });
    afterAll(async () => {
      await bench.close();
      rmSync(folder, { recursive: true, force: true });
    });

    it('a reader uploads the batch and reads all answers, one of each code among them', async () => {
      const { page, context, complaints } = await openPage(bench, 'readerOne', viewport);
      const heard = listenToResponses(page);
      await upload(page, bench.address, built.sittingId, folder, paper.truth.length);
      await page.goto(`${bench.address}/desk/${built.sittingId}`);
      page.setDefaultTimeout(15_000);
      const read = await (viewport === 'wide' ? readWithKeys : readWithPad)(page, paper, 24);
      expect(read).toBe(24);
      const recorded = bench.server.context.db.$client.prepare('select count(*) from reading').pluck().get();
      expect(recorded).toBe(24);
      for (const path of ['', `sittings/${built.sittingId}`, `sittings/${built.sittingId}/class-list`, 'settings']) {
        await page.goto(`${bench.address}/${path}`);
        await page.waitForLoadState('networkidle');
      }
      // The reader's whole session: every answer of the interface, to its last field.
      const { addresses, leaks } = await heard();
      expect(leaks).toEqual([]);
      expect(addresses).toEqual(expect.arrayContaining(['/api/desk/leases', '/api/desk/standing', '/api/me', '/api/waiting']));
      expect(complaints).toEqual([]);
      await context.close();
    });

    it('a lead sees them scored as the truth says, rules on those set aside, and exports; the file equals the truth', async () => {
      const { page, context, complaints } = await openPage(bench, 'lead', viewport);
      await page.goto(`${bench.address}/sittings/${built.sittingId}/moderation?show=to-rule`);
      await ruleAll(page, paper);
      await page.goto(`${bench.address}/sittings/${built.sittingId}/marks`);
      const saving = page.waitForEvent('download');
      await page.getByTestId('export-marks').click();
      const path = await (await saving).path();
      expect(marksInFile(readFileSync(path, 'utf8'))).toEqual(marksByTruth(paper));
      expect(complaints).toEqual([]);
      await context.close();
    });
  });
}
