import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import { agent, type Agent } from 'supertest';
import { seedPeople, type SeededPeople } from '../../db/seed/people';
import { createApp } from '../../server/app';
import { hashPassword } from '../../server/auth/passwords';
import { readConfig } from '../../server/config/config';
import type { Clock, Context } from '../../server/context';
import { startContext } from '../../server/start-context';
import { cast, castPassword, type CastName } from './cast';

export interface TestServer extends SeededPeople {
  readonly app: Express;
  readonly context: Context;
  readonly clock: TestClock;
  /** An agent with the session of one of the cast. */
  signInAs(name: CastName): Promise<Agent>;
  nobody(): Agent;
  close(): Promise<void>;
}

export interface TestClock extends Clock {
  advance(ms: number): void;
}

function createTestClock(): TestClock {
  let ahead = 0;
  return { now: () => Date.now() + ahead, advance: (ms) => void (ahead += ms) };
}

let sharedHash: Promise<string> | undefined;

/** A fresh migrated database with the cast, real everything but the clock. */
export async function startTestServer(variables: Readonly<Record<string, string>> = {}): Promise<TestServer> {
  const dataDir = mkdtempSync(join(tmpdir(), 'meniscus-test-'));
  const config = readConfig({ NODE_ENV: 'test', DATA_DIR: dataDir, LOG_LEVEL: process.env.TEST_LOG_LEVEL ?? 'silent', DEMO: 'false', SIGN_IN_TRIES: '50', ...variables });
  const clock = createTestClock();
  const { context, close } = startContext(config, clock);
  sharedHash ??= hashPassword(castPassword);
  const seeded = seedPeople(context.db, await sharedHash, clock.now());
  const app = createApp(context);
  context.jobs.run();
  return {
    ...seeded,
    app,
    context,
    clock,
    nobody: () => agent(app),
    signInAs: async (name) => {
      const signedIn = agent(app);
      await signedIn.post('/api/session').send({ email: cast[name].email, password: castPassword }).expect(200);
      return signedIn;
    },
    close: async () => {
      await close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
