import type { SendingFile } from '../../client/file-sender';
import type { BatchSummary, UploadPage, UploadView } from '../../contracts/scans';

export type TrayRow =
  | { readonly kind: 'refused-here'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly problem: string }
  | { readonly kind: 'refused' | 'duplicate'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly problem: string }
  /** A file whose pages could not be made. */
  | { readonly kind: 'stuck'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly problem: string; readonly uploadId: string }
  /** Pages that were not taken out of a file that was. */
  | { readonly kind: 'pages-refused'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly pages: readonly { readonly name: string; readonly why: string }[]; readonly more: number }
  /** Advice that pages of a file came with. */
  | { readonly kind: 'note'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly note: string; readonly pages: number }
  | { readonly kind: 'making'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly done: number; readonly of: number }
  | { readonly kind: 'loose'; readonly key: string; readonly bundle: string; readonly pages: number }
  | { readonly kind: 'sending'; readonly key: string; readonly bundle: string; readonly files: number; readonly sent: number; readonly doneBytes: number; readonly bytes: number; readonly isOffline: boolean; readonly now: readonly SendingFile[] }
  | { readonly kind: 'batch'; readonly key: string; readonly batch: BatchSummary; readonly brokenOff: number };

const sum = (numbers: readonly number[]): number => numbers.reduce((total, number) => total + number, 0);

/** Files of the batch that this device is sending, or has sent and the server has not listed as done yet. */
const onTheWay = (sending: readonly SendingFile[], batchId: string): SendingFile[] => sending.filter((file) => file.batchId === batchId && file.state !== 'refused');

const refusedShown = 4;

/** What a page goes by in its file: its own name there, or its number. */
const nameOf = ({ name, index }: Pick<UploadPage, 'name' | 'index'>): string => name ?? `page ${index + 1}`;

/** What the files of the bundle on view say beyond their state: stuck, pages refused, advice, and how far each many-page file is. */
function rowsOfFile({ id, fileName, state, stuck, of, pages }: UploadView, bundle: string): TrayRow[] {
  const rows: TrayRow[] = [];
  if (stuck !== null) rows.push({ kind: 'stuck', key: `stuck-${id}`, bundle, fileName, problem: stuck, uploadId: id });
  const refused = pages.filter((page) => page.state === 'refused');
  if (refused.length > 0 && state !== 'refused' && state !== 'duplicate')
    rows.push({ kind: 'pages-refused', key: `pages-${id}`, bundle, fileName, pages: refused.slice(0, refusedShown).map((page) => ({ name: nameOf(page), why: page.why ?? '' })), more: Math.max(0, refused.length - refusedShown) });
  const notes = new Map<string, number>();
  for (const { note } of pages) if (note !== null) notes.set(note, (notes.get(note) ?? 0) + 1);
  for (const [note, n] of notes) rows.push({ kind: 'note', key: `note-${id}-${note}`, bundle, fileName, note, pages: n });
  if (state === 'received' && stuck === null && of !== null && of > 1) rows.push({ kind: 'making', key: `making-${id}`, bundle, fileName, done: pages.length, of });
  return rows;
}

/**
 * What stands in the tray, what needs someone first: stuck and refused files and pages, loose pages, advice, pictures sent twice, then what
 * is on its way, then the bundles, newest first. `shown` are the files of the bundle on view.
 */
export function trayRows(batches: readonly BatchSummary[], sending: readonly SendingFile[], shown: readonly UploadView[], shownBatch: string | null): TrayRow[] {
  const bundleOf = new Map(batches.map(({ id, bundle }) => [id, bundle]));
  const here = sending.flatMap((file): TrayRow[] =>
    file.state === 'refused' ? [{ kind: 'refused-here', key: `here-${file.key}`, bundle: bundleOf.get(file.batchId) ?? '', fileName: file.fileName, problem: file.problem ?? '' }] : [],
  );
  const of = (state: 'refused' | 'duplicate'): TrayRow[] =>
    shown.flatMap((upload): TrayRow[] =>
      upload.state === state ? [{ kind: state, key: upload.id, bundle: bundleOf.get(shownBatch ?? '') ?? '', fileName: upload.fileName, problem: upload.problem ?? '' }] : [],
    );
  const loose = batches.flatMap(({ id, bundle, pages }): TrayRow[] => (pages.loose > 0 ? [{ kind: 'loose', key: `loose-${id}`, bundle, pages: pages.loose }] : []));
  const under = batches.flatMap(({ id, bundle }): TrayRow[] => {
    const files = onTheWay(sending, id);
    if (files.every(({ state }) => state === 'sent')) return [];
    const sent = files.filter(({ state }) => state === 'sent').length;
    return [{ kind: 'sending', key: `sending-${id}`, bundle, files: files.length, sent, doneBytes: sum(files.map(({ sentBytes }) => sentBytes)), bytes: sum(files.map(({ size }) => size)), isOffline: files.some(({ state }) => state === 'offline'), now: files.filter(({ state }) => state === 'sending' || state === 'offline') }];
  });
  const stacks = batches.map((batch): TrayRow => {
    const mine = onTheWay(sending, batch.id).filter(({ state }) => state === 'sending' || state === 'offline').length;
    return { kind: 'batch', key: batch.id, batch, brokenOff: Math.max(0, batch.files.sending - mine) };
  });
  const shownBundle = bundleOf.get(shownBatch ?? '') ?? '';
  const inFiles = shown.flatMap((upload) => rowsOfFile(upload, shownBundle));
  const kind = (...kinds: readonly TrayRow['kind'][]): TrayRow[] => inFiles.filter((row) => kinds.includes(row.kind));
  return [...here, ...kind('stuck'), ...of('refused'), ...kind('pages-refused'), ...loose, ...kind('note'), ...of('duplicate'), ...under, ...kind('making'), ...stacks];
}

/** The name the next bundle gets unless someone names it: the first letter that none has. */
export function nextBundle(names: readonly string[]): string {
  const taken = new Set(names.map((name) => name.toUpperCase()));
  for (let index = 0; ; index += 1) {
    const letter = String.fromCharCode(65 + (index % 26)) + (index < 26 ? '' : String(Math.floor(index / 26) + 1));
    if (!taken.has(letter)) return letter;
  }
}
