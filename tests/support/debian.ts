import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

/** Installs Debian packages where that can be done: as root, with apt-get. */
export function installDebian(packages: readonly string[]): void {
  if (!existsSync('/usr/bin/apt-get') || process.getuid?.() !== 0) return;
  console.log(`Installing from Debian: ${packages.join(', ')}.`);
  spawnSync('apt-get', ['update'], { stdio: 'inherit' });
  spawnSync('apt-get', ['install', '-y', '--no-install-recommends', ...packages], { stdio: 'inherit', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } });
}

const runs = (program: string, args: readonly string[]): boolean => spawnSync(program, args, { stdio: 'ignore' }).error === undefined;

/** Finds the programs that read printed sheets back, or installs them. Throws a sentence that says what to do. */
export function ensureSheetReaders(): void {
  const areHere = (): boolean => runs('pdftoppm', ['-v']) && runs('zbarimg', ['--version']);
  if (areHere()) return;
  installDebian(['poppler-utils', 'zbar-tools']);
  if (!areHere()) throw new Error('The tests of printed sheets read them back with Poppler and ZBar. Install both (on Debian, as root: apt-get install poppler-utils zbar-tools).');
}
