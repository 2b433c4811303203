import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { prepareZXingModule, type ZXingReaderModule } from 'zxing-wasm/reader';
import type { Point } from './homography';
import type { Grey } from './pixels';

/** A code in a picture. Corners are the symbol's own, in the order top left, top right, bottom right, bottom left, however it lies. */
export interface FoundCode {
  readonly text: string;
  readonly corners: readonly [Point, Point, Point, Point];
  /** Light on dark: the picture is a negative. */
  readonly isInverted: boolean;
}

/** The decoder with the memory it shares, whose types its package leaves out. */
type Reader = ZXingReaderModule & { readonly HEAPU8: Uint8Array; _malloc(bytes: number): number; _free(at: number): void };
type Options = Parameters<Reader['readBarcodesFromPixmap']>[3];

const mostCodes = 12;
/** With fewer codes than this another look is worth its time. */
const enoughCodes = 3;
const localAverage = 0;
const globalHistogram = 1;

const firstLook: Options = {
  formats: 'QRCode',
  tryHarder: true,
  tryRotate: true,
  tryInvert: false,
  tryDownscale: true,
  tryDenoise: false,
  binarizer: localAverage,
  isPure: false,
  downscaleFactor: 3,
  downscaleThreshold: 500,
  minLineCount: 2,
  maxNumberOfSymbols: mostCodes,
  validateOptionalChecksum: false,
  returnErrors: false,
  eanAddOnSymbol: 0,
  textMode: 0,
  characterSet: 0,
  tryCode39ExtendedMode: false,
};
const looks: readonly Options[] = [firstLook, { ...firstLook, tryDenoise: true }, { ...firstLook, binarizer: globalHistogram, tryInvert: true }];

export type CodeFinder = (grey: Grey) => FoundCode[];

const middleOf = ({ corners }: FoundCode): Point => ({ x: corners.reduce((sum, { x }) => sum + x, 0) / 4, y: corners.reduce((sum, { y }) => sum + y, 0) / 4 });
const sideOf = ({ corners: [one, two] }: FoundCode): number => Math.hypot(one.x - two.x, one.y - two.y);

/** Whether two finds are one printed symbol, seen in two looks. */
function isSame(one: FoundCode, other: FoundCode): boolean {
  const [here, there] = [middleOf(one), middleOf(other)];
  return one.text === other.text && Math.hypot(here.x - there.x, here.y - there.y) < sideOf(one) / 2;
}

function look(reader: Reader, { width, height, data }: Grey, options: Options): FoundCode[] {
  const at = reader._malloc(data.length);
  try {
    // NOTE the heap may be another one after malloc.
    reader.HEAPU8.set(data, at);
    const found = reader.readBarcodesFromPixmap(at, width, height, options);
    const codes = Array.from({ length: found.size() }, (_, index) => found.get(index)).flatMap((code): FoundCode[] => {
      if (!code?.isValid) return [];
      const { topLeft, topRight, bottomRight, bottomLeft } = code.position;
      // NOTE a mirrored symbol comes with two of its corners exchanged.
      const [second, fourth] = code.isMirrored ? [bottomLeft, topRight] : [topRight, bottomLeft];
      return [{ text: code.text, corners: [topLeft, second, bottomRight, fourth], isInverted: code.isInverted }];
    });
    found.delete();
    return codes;
  } finally {
    reader._free(at);
  }
}

/** Loads the decoder once. NOTE without its bytes it would fetch them from a public server. */
export async function loadCodeFinder(): Promise<CodeFinder> {
  const file = readFileSync(createRequire(import.meta.url).resolve('zxing-wasm/reader/zxing_reader.wasm'));
  const wasmBinary = file.buffer.slice(file.byteOffset, file.byteOffset + file.byteLength) as ArrayBuffer;
  const reader = (await prepareZXingModule({ overrides: { wasmBinary }, fireImmediately: true })) as Reader;
  return (grey) => {
    const found: FoundCode[] = [];
    for (const options of looks) {
      for (const code of look(reader, grey, options)) if (!found.some((known) => isSame(known, code))) found.push(code);
      if (found.length >= enoughCodes) break;
    }
    return found;
  };
}
