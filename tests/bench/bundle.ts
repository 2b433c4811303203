import { readFileSync, readdirSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { gzipSync } from 'node:zlib';
import { buildWeb, isWebStale } from '../../server/commands/build-web';
import type { BenchLine } from './figures';

/** What an app of the same stack weighs before any screen: a recorded figure, not measured in this run. */
const emptyAppKb = 310;

const gzippedKb = (file: string): number => gzipSync(readFileSync(file), { level: 9 }).length / 1000;

/** First-load JavaScript, gzipped: what the page itself asks for, and the layout with the first screen. */
export async function benchBundle(): Promise<BenchLine[]> {
  const webDir = resolve('dist');
  if (isWebStale(webDir)) await buildWeb(webDir);
  const folder = join(webDir, '_expo/static/js/web');
  const page = readFileSync(join(webDir, 'index.html'), 'utf8');
  const files = readdirSync(folder).filter((name) => name.endsWith('.js'));
  const first = files.filter((name) => page.includes(name) || /^(_layout|sign-in)-/.test(name));
  const kb = first.reduce((sum, name) => sum + gzippedKb(join(folder, name)), 0);
  return [{ name: 'first-load JavaScript / empty app', ratio: kb / emptyAppKb, budget: null, detail: `${kb.toFixed(0)} kB gzipped in ${first.length} files, empty app ${emptyAppKb} kB` }];
}
