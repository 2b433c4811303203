import PDFDocument from 'pdfkit';
import { draftedItems, numbersOf, paperLockedAt } from '../../db/queries/papers';
import { findCourse } from '../../db/queries/courses';
import type { Derivation } from '../../shared/chemistry/derivation';
import { work } from '../../shared/chemistry/work';
import { marksText } from '../../shared/marking/grains';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { fonts, paragraph, type Document, type Part } from '../print/print-paragraph';
import { schemeInWords } from './scheme-words';
import { requireSitting } from './sitting-access';

/** A4 in points, 18 mm of margin. */
const margin = 51;

const write = (document: Document, fount: Part['fount'], size: number, text: string): Document => paragraph(document, { fount, size, text });

function writeSum(document: Document, { groups, nuclearCharge, sigma, zeff }: Derivation): void {
  const terms = groups.filter(({ counted, place }) => counted > 0 && place !== 'outer').map(({ counted, coefficient }) => `${counted} × ${coefficient.text}`);
  if (terms.length > 0) write(document, 'value', 9.5, `${terms.join(' + ')} = ${sigma.text};  ${nuclearCharge} − ${sigma.text} = ${zeff.text}`);
}

function writeScheme(document: Document, scheme: ItemScheme, numberOf: (itemId: string) => number | null): void {
  const worked = work(scheme.asked);
  write(document, 'value', 12, ['Key', scheme.key.text.replace('-', '−'), ...scheme.units.slice(0, 1)].join(' '));
  if (worked.ok) {
    const { derivation, otherDerivation } = worked.value;
    writeSum(document, derivation);
    if (otherDerivation) writeSum(document, otherDerivation);
    for (const step of derivation.steps) write(document, 'value', 9.5, step);
    if (derivation.selfScreening) write(document, 'text', 9.5, derivation.selfScreening);
  }
  for (const { name, words } of schemeInWords(scheme, numberOf)) {
    paragraph(document, { fount: 'strong', size: 9.5, text: `${name}: ` }, { fount: 'text', size: 9.5, text: words });
  }
}

/** The paper and its mark scheme as a PDF: the questions as printed, then each key with its working and what else counts. */
export async function paperPdf(context: Context, actor: Actor, sittingId: string): Promise<{ fileName: string; bytes: Buffer }> {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  const items = draftedItems(db, sittingId);
  const numberOf = numbersOf(db, sittingId);
  const total = items.reduce((sum, { item }) => sum + item.maxGrains, 0);
  const head = `${findCourse(db, sitting.course)?.code ?? ''}, ${sitting.title}`;
  const document = new PDFDocument({ size: 'A4', margin, bufferPages: true, info: { Title: `${head}: paper and mark scheme`, Producer: 'Meniscus', Creator: 'Meniscus' } });
  const chunks: Buffer[] = [];
  document.on('data', (chunk: Buffer) => chunks.push(chunk));
  const finished = new Promise<void>((resolve, reject) => void document.on('end', resolve).on('error', reject));

  write(document, 'strong', 18, head);
  write(document, 'text', 11, `${sitting.heldOn}. ${items.length} items, ${marksText(total)} marks.`).moveDown(1.5);
  for (const { item } of items) write(document, 'text', 12, `${item.number}   ${item.prompt}   [${marksText(item.maxGrains)}]`).moveDown(1);

  document.addPage();
  write(document, 'strong', 18, 'Mark scheme');
  const state = paperLockedAt(db, sittingId) === null ? 'The paper is open to change.' : 'The paper is locked.';
  write(document, 'text', 10, `${state} Marks are provisional until the board of examiners confirms them. The key follows the convention shown: check it against what was taught.`).moveDown(1);
  for (const { item, scheme } of items) {
    if (document.y > document.page.height - 180) document.addPage();
    write(document, 'strong', 12, `${item.number}   ${item.prompt}   [${marksText(item.maxGrains)}]`);
    writeScheme(document, scheme, numberOf);
    document.moveDown(1);
  }
  const { start, count } = document.bufferedPageRange();
  for (let page = start; page < start + count; page += 1) {
    document.switchToPage(page);
    document.page.margins.bottom = 0;
    document.font(fonts.text).fontSize(9).text(`${head}, page ${page + 1} of ${count}`, margin, document.page.height - 34, { width: document.page.width - 2 * margin, align: 'center', lineBreak: false });
  }
  document.end();
  await finished;
  return { fileName: `paper-${sitting.printNumber}.pdf`, bytes: Buffer.concat(chunks) };
}
