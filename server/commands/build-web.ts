import { spawn } from 'node:child_process';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const sources = ['app', 'shared', 'assets', 'app.json', 'metro.config.js', 'package-lock.json'];

function newestChange(path: string): number {
  const found = statSync(path);
  if (!found.isDirectory()) return found.mtimeMs;
  return Math.max(found.mtimeMs, ...readdirSync(path).map((name) => newestChange(join(path, name))));
}

/** Whether the built web app is missing or older than what it is made of. */
export function isWebStale(webDir: string): boolean {
  const page = join(webDir, 'index.html');
  if (!existsSync(page)) return true;
  const built = statSync(page).mtimeMs;
  return sources.some((source) => existsSync(join(root, source)) && newestChange(join(root, source)) > built);
}

/** Builds the web app with Expo. Rejects with the build's own output when it fails. */
export function buildWeb(webDir: string): Promise<void> {
  const build = spawn(join(root, 'node_modules/.bin/expo'), ['export', '--platform', 'web', '--output-dir', webDir], {
    cwd: root,
    env: { ...process.env, CI: '1', EXPO_NO_TELEMETRY: '1', NODE_ENV: 'production' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  build.stdout.on('data', (chunk: Buffer) => void (said += chunk.toString()));
  build.stderr.on('data', (chunk: Buffer) => void (said += chunk.toString()));
  return new Promise((done, failed) => {
    build.on('error', failed);
    build.on('exit', (code) => (code === 0 ? done() : failed(new Error(`The web app was not built.\n${said}`))));
  });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await buildWeb(resolve(process.env.WEB_DIR ?? 'dist'));
