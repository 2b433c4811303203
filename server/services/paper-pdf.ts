import { fileURLToPath } from 'node:url';
import PDFDocument from 'pdfkit';
import { draftedItems, paperLockedAt } from '../../db/queries/papers';
import { findCourse } from '../../db/queries/courses';
import { work } from '../../shared/chemistry/work';
import { marksText } from '../../shared/marking/grains';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { printRuns, type RunStyle } from './print-runs';
import { schemeInWords } from './scheme-words';
import { requireSitting } from './sitting-access';

const font = (name: string): string => fileURLToPath(new URL(`../../assets/fonts/${name}.ttf`, import.meta.url));
const fonts = { text: font('AtkinsonHyperlegibleNext_400Regular'), strong: font('AtkinsonHyperlegibleNext_600SemiBold'), value: font('AtkinsonHyperlegibleMono_500Medium'), symbol: font('STIXTwoText_400Regular_Italic') } as const;

/** A4 in points, 18 mm of margin. */
const margin = 51;

type Document = InstanceType<typeof PDFDocument>;

/** Where the baseline lies below the top of a line, and how far a subscript is dropped, in sizes of the text. */
const ascent = 0.95;
const drop = 0.18;

type Fount = Exclude<keyof typeof fonts, 'symbol'>;
const sizes: Readonly<Record<RunStyle, number>> = { plain: 1, symbol: 1.06, subscript: 0.7 };

/** NOTE: each fount has its own ascent, so runs on one line need a baseline that they share. */
function write(document: Document, name: Fount, size: number, text: string, options: PDFKit.Mixins.TextOptions = {}): Document {
  const runs = printRuns(text);
  runs.forEach(({ style, text: piece }, index) => {
    const baseline = -size * (style === 'subscript' ? ascent + drop : ascent);
    const isLast = index === runs.length - 1;
    document.font(fonts[style === 'symbol' ? 'symbol' : name]).fontSize(size * sizes[style]);
    document.text(piece, { ...options, baseline, continued: isLast ? (options.continued ?? false) : true });
  });
  return document;
}

function writeScheme(document: Document, scheme: ItemScheme): void {
  const worked = work(scheme.asked);
  write(document, 'value', 12, ['Key', scheme.key.text.replace('-', '−'), ...scheme.units.slice(0, 1)].join(' '));
  if (worked.ok) {
    const { groups, nuclearCharge, sigma, zeff, steps, selfScreening } = worked.value.derivation;
    const terms = groups.filter(({ counted, place }) => counted > 0 && place !== 'outer').map(({ counted, coefficient }) => `${counted} × ${coefficient.text}`);
    if (terms.length > 0) write(document, 'value', 9.5, `${terms.join(' + ')} = ${sigma.text};  ${nuclearCharge} − ${sigma.text} = ${zeff.text}`);
    for (const step of steps) write(document, 'value', 9.5, step);
    if (selfScreening) write(document, 'text', 9.5, selfScreening);
  }
  for (const { name, words } of schemeInWords(scheme)) {
    write(document, 'strong', 9.5, `${name}: `, { continued: true });
    write(document, 'text', 9.5, words);
  }
}

/** The paper and its mark scheme as a PDF: the questions as printed, then each key with its working and what else counts. */
export async function paperPdf(context: Context, actor: Actor, sittingId: string): Promise<{ fileName: string; bytes: Buffer }> {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  const items = draftedItems(db, sittingId);
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
    writeScheme(document, scheme);
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
