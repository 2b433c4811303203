import { createWriteStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { openPromise, type Entry, type ZipFile } from 'yauzl';
import { inMegabytes, mostEntries, mostPictureBytes, mostRatio, mostUnpackedBytes, ratioFromBytes } from './limits';
import { damaged, InputRefusal } from './refusal';

/** One file of an archive: unpacked to a path of ours, or why it was left out. */
export type Unpacked = { readonly name: string } & ({ readonly path: string } | { readonly refusal: string });

/** What systems add to archives without being asked. */
const isClutter = (name: string): boolean => name.endsWith('/') || /(^|\/)(__MACOSX\/|\.DS_Store$|Thumbs\.db$|desktop\.ini$|\._)/i.test(name);

const bomb = (): InputRefusal => new InputRefusal('The archive unpacks to far more than scans would. Send the pages themselves, or a fresh archive of them.');

function refusalOf(error: unknown): InputRefusal {
  if (error instanceof InputRefusal) return error;
  const message = error instanceof Error ? error.message : '';
  if (/relative path|absolute path|invalid characters in fileName/i.test(message)) return new InputRefusal('The archive names a place outside itself. Pack the pages again, without folders.');
  if (/multi-disk/i.test(message)) return new InputRefusal('The archive is one piece of several. Send it as one file.');
  if (/strong encryption|encrypted/i.test(message)) return new InputRefusal('The archive is protected by a password. Send it without one.');
  return new InputRefusal(`The archive is incomplete or damaged. Pack and upload it again.`);
}

/** All entries that are files, read from the directory of the archive alone. */
async function listEntries(zip: ZipFile, archiveBytes: number): Promise<Entry[]> {
  if (zip.entryCount > mostEntries * 2) throw new InputRefusal(`The archive holds ${zip.entryCount.toLocaleString('en-GB')} files; ${mostEntries.toLocaleString('en-GB')} are the most. Split it.`);
  const entries: Entry[] = [];
  for await (const entry of zip.eachEntry()) if (!isClutter(entry.fileName)) entries.push(entry);
  if (entries.length === 0) throw new InputRefusal('The archive is empty.');
  if (entries.length > mostEntries) throw new InputRefusal(`The archive holds ${entries.length.toLocaleString('en-GB')} files; ${mostEntries.toLocaleString('en-GB')} are the most. Split it.`);
  const announced = entries.reduce((sum, { uncompressedSize }) => sum + uncompressedSize, 0);
  if (announced > mostUnpackedBytes || (announced > ratioFromBytes && announced > archiveBytes * mostRatio)) throw bomb();
  return entries;
}

async function unpackOne(zip: ZipFile, entry: Entry, path: string): Promise<Unpacked> {
  const name = entry.fileName;
  if (entry.isEncrypted()) return { name, refusal: 'It is protected by a password. Send it without one.' };
  if (entry.uncompressedSize === 0) return { name, refusal: 'The file is empty.' };
  if (entry.uncompressedSize > mostPictureBytes) return { name, refusal: `It is larger than ${inMegabytes(mostPictureBytes)}.` };
  if (!entry.canDecodeFileData()) return { name, refusal: 'It is packed in a way that is not read here. Pack the pages again.' };
  try {
    // NOTE the stream ends with an error once it gives a byte more or less than the directory announced.
    await pipeline(await zip.openReadStreamPromise(entry), createWriteStream(path, { flags: 'wx' }));
    return { name, path };
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOSPC') throw error;
    return { name, refusal: damaged };
  }
}

/** Unpacks an archive one file at a time into a folder, under names of ours, and never more than was announced. */
export async function unpackZip(path: string, outDir: string): Promise<Unpacked[]> {
  let zip: ZipFile | undefined;
  try {
    const { size } = await stat(path);
    zip = await openPromise(path, { lazyEntries: true, autoClose: false, validateEntrySizes: true, strictFileNames: false });
    const entries = await listEntries(zip, size);
    const unpacked: Unpacked[] = [];
    for (const [index, entry] of entries.entries()) unpacked.push(await unpackOne(zip, entry, join(outDir, `entry-${index}`)));
    return unpacked;
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOSPC') throw error;
    throw refusalOf(error);
  } finally {
    zip?.close();
  }
}
