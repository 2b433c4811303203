import { existsSync } from 'node:fs';
import { installDebian } from './debian';

const places = [process.env.CHROMIUM_PATH, '/usr/bin/chromium', '/usr/bin/chromium-browser'];

export const findChromium = (): string | undefined => places.find((path) => path !== undefined && path !== '' && existsSync(path));

/** Finds Chromium, or installs Debian's package where that can be done. Throws a sentence that says what to do. */
export function ensureChromium(): string {
  const found = findChromium();
  if (found) return found;
  installDebian(['chromium']);
  const installed = findChromium();
  if (installed) return installed;
  throw new Error('The browser tests need Chromium. Install it (on Debian, as root: apt-get install chromium), or set CHROMIUM_PATH to its program.');
}
