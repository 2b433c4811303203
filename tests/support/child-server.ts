import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { agent, type Agent } from 'supertest';
import { cast, castPassword, type CastName } from './cast';

export interface ChildServer {
  readonly address: string;
  readonly process: ChildProcess;
  signInAs(name: CastName): Promise<Agent>;
  /** The most memory the process and its threads ever held, in MB. */
  peakMb(): number;
  /** Ends it as a power cut would. */
  kill(): Promise<void>;
}

/** Starts the real server on a data folder, as a process of its own. */
export async function startChildServer(dataDir: string, variables: Readonly<Record<string, string>> = {}): Promise<ChildServer> {
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  const child = spawn(process.execPath, ['--import', loader, fileURLToPath(new URL('./serve.ts', import.meta.url))], {
    env: { PATH: process.env.PATH, NODE_ENV: 'test', DATA_DIR: dataDir, DEMO: 'false', PORT: '0', LOG_LEVEL: process.env.TEST_LOG_LEVEL ?? 'silent', SIGN_IN_TRIES: '50', ...variables },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const ended = once(child, 'exit');
  const [line] = (await Promise.race([once(child.stdout, 'data'), ended.then(() => Promise.reject(new Error('The server ended at its start.')))])) as [Buffer];
  const address = line.toString().trim().split('\n')[0] ?? '';
  return {
    address,
    process: child,
    signInAs: async (name) => {
      const signedIn = agent(address);
      await signedIn.post('/api/session').send({ email: cast[name].email, password: castPassword }).expect(200);
      return signedIn;
    },
    peakMb: () => Number(/VmHWM:\s+(\d+)/.exec(readFileSync(`/proc/${child.pid}/status`, 'utf8'))?.[1] ?? Number.NaN) / 1024,
    kill: async () => {
      child.kill('SIGKILL');
      await ended;
    },
  };
}
