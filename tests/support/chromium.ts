import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

const places = [process.env.CHROMIUM_PATH, '/usr/bin/chromium', '/usr/bin/chromium-browser'];

export const findChromium = (): string | undefined => places.find((path) => path !== undefined && path !== '' && existsSync(path));

/** Finds Chromium, or installs Debian's package where that can be done. Throws a sentence that says what to do. */
export function ensureChromium(): string {
  const found = findChromium();
  if (found) return found;
  const canInstall = existsSync('/usr/bin/apt-get') && process.getuid?.() === 0;
  if (canInstall) {
    console.log('Chromium is missing: installing the Debian package.');
    spawnSync('apt-get', ['update'], { stdio: 'inherit' });
    spawnSync('apt-get', ['install', '-y', '--no-install-recommends', 'chromium'], { stdio: 'inherit', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } });
  }
  const installed = findChromium();
  if (installed) return installed;
  throw new Error('The browser tests need Chromium. Install it (on Debian, as root: apt-get install chromium), or set CHROMIUM_PATH to its program.');
}
