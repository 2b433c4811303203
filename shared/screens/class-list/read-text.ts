export type FileText = { readonly ok: true; readonly text: string } | { readonly ok: false; readonly message: string };

const largestBytes = 1_000_000;

/** The text of a chosen file, strictly UTF-8; two-byte files of spreadsheets are recognised by their mark. */
export async function textOf(file: Blob): Promise<FileText> {
  if (file.size > largestBytes) return { ok: false, message: 'The file is larger than 1 MB. A class list of 5,000 candidates fits into that.' };
  const bytes = new Uint8Array(await file.arrayBuffer());
  const isTwoByte = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  const encoding = isTwoByte ? (bytes[0] === 0xff ? 'utf-16le' : 'utf-16be') : 'utf-8';
  try {
    return { ok: true, text: new TextDecoder(encoding, { fatal: true }).decode(bytes) };
  } catch {
    return { ok: false, message: 'Some characters of this file cannot be read. Save it as CSV in UTF-8, then choose it again.' };
  }
}
