import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { LayoutOf } from '../../server/ingest/sheet/layout';
import { checkWith } from '../../server/print/sheet-check';
import type { PrintedItem } from '../../server/print/sheet-setting';
import { writeSheets } from '../../server/print/sheets-pdf';
import { planOf } from '../../server/services/sheet-order';
import { paperSizes, type PaperSize } from '../../shared/sheets/geometry';
import type { PageIdentity } from '../../shared/sheets/identity';
import { rasterise } from '../support/printed-pages';

/** Half as fine again as a scan, so that drawing a page anew costs it nothing that a scan would have. */
export const masterDpi = 300;
export const secret = 'a secret of the tests';
export const checkOf = checkWith(secret);

export const papers = ['a4', 'letter'] as const satisfies readonly PaperSize[];
const sittingOf = { a4: 214, letter: 215 } as const;
const layoutNumber = 3;
const scripts = [5, 6, 7];

const items: PrintedItem[] = ['C', 'N', 'O', 'F', 'Ne', 'Na', 'Mg', 'Al', 'Si', 'P'].map((symbol, index) => ({
  number: index + 1,
  marks: '2',
  prompt: index % 3 === 1 ? `By Slater’s rules, find Z_eff for an outermost p electron of ${symbol}, and say in one line which electrons of the atom screen it; to two decimals.` : `Find Z_eff for an outermost electron of ${symbol}, to two decimals.`,
}));

export interface Master {
  readonly identity: PageIdentity;
  readonly paper: PaperSize;
  readonly width: number;
  readonly height: number;
  readonly pixels: Uint8Array;
}

const boxesOf = (paper: PaperSize, page: number) => {
  const planned = planOf(items, paper);
  if (!planned.ok) throw new Error(planned.reason);
  return planned.plan.pages[page - 1]?.boxes ?? [];
};

/** The boxes as they were printed, for the sittings of these tests alone. */
export const layoutOf: LayoutOf = ({ sitting, page, layout }) => {
  const paper = papers.find((each) => sittingOf[each] === sitting);
  if (!paper || layout !== layoutNumber) return null;
  const boxes = boxesOf(paper, page);
  return { page: paperSizes[paper], boxes: boxes.map(({ use, item, x, y, w, h }) => ({ id: `${use} ${item ?? ''}`, isFramed: use !== 'working', x, y, w, h })) };
};

/** Sheets as the product prints them, made pixels by Poppler. */
export async function printMasters(): Promise<Master[]> {
  const folder = mkdtempSync(join(tmpdir(), 'meniscus-sheets-'));
  try {
    const all: Master[] = [];
    for (const paper of papers) {
      const path = join(folder, `${paper}.pdf`);
      await writeSheets({ path, paper, sitting: sittingOf[paper], layout: layoutNumber, title: 'CH214, Paper 2, spring sitting', held: '6 May 2026', items, owners: scripts.map((script) => ({ script, candidateNumber: `W40${script}` })), secret, madeAt: 0 }, () => undefined);
      const pages = rasterise(path, mkdtempSync(join(folder, 'pages-')), masterDpi);
      const pagesOfScript = pages.length / scripts.length;
      pages.forEach(({ width, height, pixels }, index) => {
        const identity = { sitting: sittingOf[paper], layout: layoutNumber, script: scripts[Math.floor(index / pagesOfScript)] ?? 0, page: (index % pagesOfScript) + 1 };
        // A copy of its own, that threads can share.
        const shared = new Uint8Array(new SharedArrayBuffer(pixels.length));
        shared.set(pixels);
        all.push({ identity, paper, width, height, pixels: shared });
      });
    }
    return all;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
