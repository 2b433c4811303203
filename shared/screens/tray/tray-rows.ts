import type { SendingFile } from '../../client/file-sender';
import type { BatchSummary, UploadView } from '../../contracts/scans';

export type TrayRow =
  | { readonly kind: 'refused-here'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly problem: string }
  | { readonly kind: 'refused' | 'duplicate'; readonly key: string; readonly bundle: string; readonly fileName: string; readonly problem: string }
  | { readonly kind: 'loose'; readonly key: string; readonly bundle: string; readonly pages: number }
  | { readonly kind: 'sending'; readonly key: string; readonly bundle: string; readonly files: number; readonly sent: number; readonly doneBytes: number; readonly bytes: number; readonly isOffline: boolean; readonly now: readonly SendingFile[] }
  | { readonly kind: 'batch'; readonly key: string; readonly batch: BatchSummary; readonly brokenOff: number };

const sum = (numbers: readonly number[]): number => numbers.reduce((total, number) => total + number, 0);

/** Files of the batch that this device is sending, or has sent and the server has not listed as done yet. */
const onTheWay = (sending: readonly SendingFile[], batchId: string): SendingFile[] => sending.filter((file) => file.batchId === batchId && file.state !== 'refused');

/**
 * What stands in the tray, what needs someone first: refused files, loose pages, pictures sent twice, then what is on its way, then the
 * bundles, newest first. `shown` are the files of the bundle on view.
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
  return [...here, ...of('refused'), ...loose, ...of('duplicate'), ...under, ...stacks];
}

/** The name the next bundle gets unless someone names it: the first letter that none has. */
export function nextBundle(names: readonly string[]): string {
  const taken = new Set(names.map((name) => name.toUpperCase()));
  for (let index = 0; ; index += 1) {
    const letter = String.fromCharCode(65 + (index % 26)) + (index < 26 ? '' : String(Math.floor(index / 26) + 1));
    if (!taken.has(letter)) return letter;
  }
}
