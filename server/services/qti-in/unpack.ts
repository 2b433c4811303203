import { Unzip, UnzipInflate, unzipSync } from 'fflate';
import { invalidRequest } from '../../errors';

const mostEntries = 400;
const mostBytesOfFile = 512 * 1024;
const mostBytes = 8 * 1024 * 1024;
const step = 4096;

const refuse = (message: string) => invalidRequest(`The package was not read. ${message}`);

/** A name within the package: relative, no way up, no drive, no backslash. */
const isPlain = (name: string): boolean => name !== '' && name.length <= 200 && !/[\\:]/.test(name) && !name.startsWith('/') && [...name].every((one) => one >= ' ') && name.split('/').every((part) => part !== '..' && part !== '.');

function listed(bytes: Uint8Array): Set<string> {
  const names = new Set<string>();
  let total = 0;
  unzipSync(bytes, {
    filter: ({ name, originalSize, compression }) => {
      if (!isPlain(name)) throw refuse('It names a file outside itself.');
      if (names.has(name)) throw refuse(`It holds ${name} twice.`);
      if (compression !== 0 && compression !== 8) throw refuse(`${name} is packed in a way that is not read.`);
      total += originalSize;
      names.add(name);
      if (names.size > mostEntries) throw refuse(`It holds more than ${mostEntries} files.`);
      if (total > mostBytes) throw refuse('Unpacked it holds more than 8 MiB.');
      return false;
    },
  });
  return names;
}

/** Takes in pieces and stops at the limit, whatever sizes the package states. */
function inflated(bytes: Uint8Array, names: ReadonlySet<string>): Map<string, Uint8Array> {
  const files = new Map<string, Uint8Array[]>();
  let total = 0;
  const unzip = new Unzip((file) => {
    if (!names.has(file.name) || files.has(file.name)) throw refuse('Its list of files is not what it holds.');
    const parts: Uint8Array[] = [];
    files.set(file.name, parts);
    if (!file.name.endsWith('.xml')) return;
    let size = 0;
    file.ondata = (error, part) => {
      if (error) throw error;
      size += part.length;
      total += part.length;
      if (size > mostBytesOfFile) throw refuse(`${file.name} holds more than 512 KiB.`);
      if (total > mostBytes) throw refuse('Unpacked it holds more than 8 MiB.');
      parts.push(part.slice());
    };
    file.start();
  });
  unzip.register(UnzipInflate);
  for (let at = 0; at < bytes.length; at += step) unzip.push(bytes.subarray(at, at + step), at + step >= bytes.length);
  return new Map([...files].filter(([name]) => name.endsWith('.xml')).map(([name, parts]) => [name, Buffer.concat(parts)]));
}

/** The XML files of a ZIP by name. Throws a refusal; never inflates more than its limits. */
export function unpack(bytes: Uint8Array): Map<string, Uint8Array> {
  try {
    return inflated(bytes, listed(bytes));
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'invalid_request') throw error;
    throw refuse('It is no ZIP, or a broken one.');
  }
}
