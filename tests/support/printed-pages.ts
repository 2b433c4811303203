import { spawnSync } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

function run(program: string, args: readonly string[]): string {
  const { stdout, stderr, error, status } = spawnSync(program, args, { encoding: 'utf8', maxBuffer: 64 << 20 });
  if (error) throw new Error(`${program} does not run here. On Debian, as root: apt-get install poppler-utils zbar-tools`);
  if (status !== 0) throw new Error(`${program} ended with ${status}: ${stderr}`);
  return stdout;
}

export interface GreyPage {
  readonly path: string;
  readonly width: number;
  readonly height: number;
  readonly pixels: Uint8Array;
}

export const rasterDpi = 200;

/** Pages of a PDF as grey pictures, by Poppler. */
export function rasterise(pdf: string, folder: string, dpi = rasterDpi): GreyPage[] {
  run('pdftoppm', ['-r', String(dpi), '-gray', pdf, join(folder, 'page')]);
  const files = readdirSync(folder).filter((name) => /^page-\d+\.pgm$/.test(name)).sort();
  return files.map((name) => {
    const path = join(folder, name);
    const bytes = readFileSync(path);
    const head = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(bytes.subarray(0, 64).toString('latin1'));
    if (!head) throw new Error(`${name} is no grey picture.`);
    return { path, width: Number(head[1]), height: Number(head[2]), pixels: bytes.subarray(head[0].length) };
  });
}

/** What ZBar reads on a page, in ascending order. */
export const codesOn = ({ path }: GreyPage): string[] => run('zbarimg', ['--quiet', '--raw', '-S*.disable', '-Sqrcode.enable', path]).trim().split('\n').sort();

export const textOf = (pdf: string): string => run('pdftotext', ['-layout', pdf, '-']);

/** Each font of a PDF, and whether it is embedded. */
export const fontsOf = (pdf: string): { name: string; isEmbedded: boolean }[] =>
  run('pdffonts', [pdf])
    .trim()
    .split('\n')
    .slice(2)
    .map((line) => {
      const cells = line.trim().split(/\s+/);
      return { name: cells[0] ?? '', isEmbedded: cells.at(-5) === 'yes' };
    });

const pxPerMm = rasterDpi / 25.4;

/**
 * The middle of a dark line that crosses a profile, in millimetres along it: the darkness-weighted mean, so that a line that
 * ends between two pixels is found between them. `at` is where the profile stands on the other axis.
 */
export function lineAcross({ width, pixels }: GreyPage, axis: 'x' | 'y', expectedMm: number, at: number): number {
  const reach = 8;
  const from = Math.round(expectedMm * pxPerMm) - reach;
  const other = Math.round(at * pxPerMm);
  let [weight, sum] = [0, 0];
  for (let px = from; px < from + 2 * reach; px += 1) {
    const darkness = 255 - (pixels[axis === 'x' ? other * width + px : px * width + other] ?? 255);
    weight += darkness;
    sum += darkness * (px + 0.5);
  }
  return weight === 0 ? Number.NaN : sum / weight / pxPerMm;
}
