import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { layoutOrdinal } from '../../db/queries/printings';
import { boxesOfLayout, findLayout } from '../../db/queries/layouts';
import { checkWith } from '../../server/print/sheet-check';
import { importClassList } from '../../server/services/class-list';
import { codePlaces, paperSizes, type PaperSize } from '../../shared/sheets/geometry';
import { composeCode, parseCode } from '../../shared/sheets/identity';
import { actorOf, buildPaper, itemDraft } from '../support/paper';
import { codesOn, fontsOf, lineAcross, rasterise, textOf, type GreyPage } from '../support/printed-pages';
import { startTestServer, type TestServer } from '../support/test-server';

/** Eight items, one of them with a raised charge and two lines of text. */
const drafts = [
  ...['C', 'N', 'O', 'F', 'Ne'].map((symbol) => itemDraft(symbol, '2p')),
  itemDraft('Mg', '2p', { asked: { symbol: 'Mg', charge: 2, electron: '2p', quantity: 'zeff', convention: 'slater' } }),
  itemDraft('Cl', '3p', { prompt: 'A long question, so that its words need a second line on the page: by Slater’s rules, find Z_eff for a 3p electron of a Cl atom and σ beside it, to two decimals.' }),
  itemDraft('Fe', '4s'),
];

interface Printed {
  readonly pages: readonly GreyPage[];
  readonly pdf: string;
  readonly sitting: number;
  readonly sittingId: string;
  readonly layout: number;
}

async function printOn(server: TestServer, folder: string, paperSize: PaperSize): Promise<Printed> {
  const lead = await server.signInAs('lead');
  const { sittingId } = buildPaper(server, { drafts, candidates: ['W4071', 'W4072'] });
  importClassList(server.context, actorOf(server, 'lead'), sittingId, 'W4073,Ottilie Farnbrough,o.farnbrough@wrenmoor.example');
  const { body } = await lead.post(`/api/sittings/${sittingId}/printings`).send({ paperSize, spares: 1 }).expect(202);
  await server.context.jobs.settle();
  const { body: bytes } = await lead.get(`/api/printings/${body.id}/file`).buffer(true).parse((response, done) => {
    const chunks: Buffer[] = [];
    response.on('data', (chunk: Buffer) => chunks.push(chunk)).on('end', () => done(null, Buffer.concat(chunks)));
  }).expect(200);
  const pdf = join(folder, `${paperSize}.pdf`);
  writeFileSync(pdf, bytes as Buffer);
  const { body: view } = await lead.get(`/api/sittings/${sittingId}`).expect(200);
  return { pages: rasterise(pdf, mkdtempSync(join(folder, 'pages-'))), pdf, sitting: view.printNumber as number, sittingId, layout: body.layout as number };
}

describe.each(['a4', 'letter'] as const)('sheets printed on %s, read back by programs from elsewhere', (paperSize) => {
  let server: TestServer;
  let folder: string;
  let printed: Printed;
  beforeAll(async () => {
    server = await startTestServer();
    folder = mkdtempSync(join(tmpdir(), 'meniscus-sheets-'));
    printed = await printOn(server, folder, paperSize);
  });
  afterAll(async () => {
    await server.close();
    rmSync(folder, { recursive: true, force: true });
  });

  it('carry six codes a page, each with the digits that were meant', () => {
    const checkOf = checkWith(server.context.config.sheetSecret);
    expect(printed.pages).toHaveLength(4 * 2);
    printed.pages.forEach((page, index) => {
      const identity = { sitting: printed.sitting, layout: printed.layout, script: Math.floor(index / 2) + 1, page: (index % 2) + 1 };
      const codes = codesOn(page);
      expect(codes).toEqual(codePlaces(paperSizes[paperSize]).map(({ place }) => composeCode({ ...identity, place }, checkOf)));
      expect(parseCode(codes[3] ?? '', checkOf)).toEqual({ ok: true, identity: { ...identity, place: 4 } });
    });
  });

  it('have the size of the paper and every frame within 0.2 mm of its place', () => {
    const layout = findLayout(server.context.db, printed.sittingId, printed.layout);
    const boxes = boxesOfLayout(server.context.db, layout?.id ?? '').filter(({ use }) => use !== 'working');
    expect(layoutOrdinal(server.context.db, layout?.id ?? '')).toBe(2);
    expect(boxes).toHaveLength(9);
    let farthest = 0;
    printed.pages.forEach((page, index) => {
      expect(Math.abs(page.width - (paperSizes[paperSize].widthMm / 25.4) * 200)).toBeLessThan(1.5);
      expect(Math.abs(page.height - (paperSizes[paperSize].heightMm / 25.4) * 200)).toBeLessThan(1.5);
      for (const { x, y, w, h } of boxes.filter(({ pageNo }) => pageNo === (index % 2) + 1)) {
        for (const part of [0.2, 0.5, 0.8]) {
          for (const side of [x, x + w]) farthest = Math.max(farthest, Math.abs(lineAcross(page, 'x', side, y + part * h) - side));
          for (const side of [y, y + h]) farthest = Math.max(farthest, Math.abs(lineAcross(page, 'y', side, x + part * w) - side));
        }
      }
    });
    expect(farthest).toBeLessThan(0.2);
  });

  it('name candidates by number only, with stems, marks and instructions in embedded fonts', () => {
    const text = textOf(printed.pdf);
    for (const words of ['W4071', 'W4072', 'W4073', 'Spare', 'script 00004', 'page 2 of 2', 'layout 2', '[3]', 'Answer 8', 'Items 7 and 8 are on the back.', 'cross it out and write again']) expect(text).toContain(words);
    expect(text).not.toMatch(/Ottilie|Farnbrough|wrenmoor/i);
    // The keys of the items: 3.25 for C 2p, 6.10 for Cl 3p (Slater, Phys. Rev. 36, 57, 1930).
    expect(text).not.toMatch(/3\.25|6\.10/);
    const fonts = fontsOf(printed.pdf);
    expect(fonts.length).toBeGreaterThanOrEqual(4);
    expect(fonts.filter(({ isEmbedded }) => !isEmbedded)).toEqual([]);
  });
});
