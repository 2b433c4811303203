import { spawn, type ChildProcess } from 'node:child_process';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const apiPort = process.env.PORT ?? '8080';
const webPort = process.env.WEB_PORT ?? '8081';

const run = (name: string, args: string[], env: Record<string, string>): ChildProcess =>
  spawn(join(root, 'node_modules/.bin', name), args, { cwd: root, stdio: 'inherit', env: { ...process.env, ...env } });

// The interface restarts when its files change; Metro reloads the page. Both are at the address of the interface.
const children = [
  run('tsx', ['watch', '--clear-screen=false', 'server/commands/serve.ts'], { NODE_ENV: 'development', PORT: apiPort, DEV_WEB_ORIGIN: `http://localhost:${webPort}` }),
  run('expo', ['start', '--web', '--port', webPort], { EXPO_NO_TELEMETRY: '1', BROWSER: 'none' }),
];

const stop = () => children.forEach((child) => child.kill('SIGTERM'));
process.on('SIGINT', stop);
process.on('SIGTERM', stop);
for (const child of children) child.on('exit', stop);
