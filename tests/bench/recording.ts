import { fork } from 'node:child_process';
import type { AddressInfo } from 'node:net';
import { fileURLToPath } from 'node:url';
import express from 'express';
import { v7 as uuidv7 } from 'uuid';
import { insertLease } from '../../db/queries/desk';
import { inTransaction } from '../../db/client';
import { createApp } from '../../server/app';
import { createPassport } from '../../server/auth/passport';
import { sessionMiddleware } from '../../server/auth/session-middleware';
import { requireActor } from '../../server/auth/access';
import type { TestServer } from '../support/test-server';
import { benchScheme } from './bench-scheme';
import { median, quantile, type BenchLine } from './figures';
import { largeSitting } from './large-sitting';
import type { LoadRequest } from './load';

const readers = 32;
const perReader = 25;
const rounds = 5;

const listen = (app: express.Express): Promise<{ port: number; close(): void }> =>
  new Promise((resolve) => {
    const server = app.listen(0, '127.0.0.1', () => resolve({ port: (server.address() as AddressInfo).port, close: () => void server.close() }));
  });

function load(port: number, lists: readonly (readonly LoadRequest[])[]): Promise<number[]> {
  const child = fork(fileURLToPath(new URL('./load.ts', import.meta.url)), { execArgv: ['--import', 'tsx'] });
  return new Promise((resolve, reject) => {
    child.on('message', (answer: { latencies?: number[]; error?: string }) => {
      child.kill();
      if (answer.latencies) resolve(answer.latencies);
      else reject(new Error(answer.error));
    });
    child.on('error', reject);
    child.send({ port, readers: lists });
  });
}

/** The floor: a bare Express route behind the same session check that inserts one row by a prepared statement, at the same durability. */
function floorApp(server: TestServer): express.Express {
  const { context } = server;
  const client = context.db.$client;
  client.exec('create table if not exists bench_floor (id text primary key, answer text, reader text, text text, at integer)');
  const insert = client.prepare('insert into bench_floor values (?, ?, ?, ?, ?)');
  const app = express();
  app.use(sessionMiddleware(context, createPassport(context)));
  app.use(express.json());
  app.put('/readings/:id', (req, res) => {
    const actor = requireActor(context, req.user?.personId);
    const { answerId, text } = req.body as { answerId: string; text: string };
    insert.run(req.params.id, answerId, actor.personId, text, Date.now());
    res.json({ kept: true });
  });
  return app;
}

/** Recording a reading over HTTP at 32 concurrent readers, as a ratio of medians to the floor, rounds taking turns. */
export async function benchRecording(server: TestServer): Promise<BenchLine[]> {
  const { context, people, courseId } = server;
  const { scheme, hash } = benchScheme();
  const sitting = largeSitting(context.db, { course: courseId, lead: people.lead, scheme, schemeHash: hash, items: 12, scripts: Math.ceil((readers * perReader * (rounds + 1)) / 12) });
  const cookies = await Promise.all(
    Array.from({ length: readers }, async (_, index) => {
      const agent = await server.signInAs(index % 2 === 0 ? 'readerOne' : 'readerTwo');
      return { reader: index % 2 === 0 ? people.readerOne : people.readerTwo, cookie: (await agent.get('/api/me')).request.cookies as string };
    }),
  );
  const answers = sitting.scripts.flatMap((script) => script.answers);
  const texts = ['6.10', '6.1', '5.75', '6.40', '4.90', '8.10', '7.25', '6.18'];
  let next = 0;
  const requestsFor = (prefix: string) =>
    inTransaction(context.db, () =>
      cookies.map(({ reader, cookie }) =>
        Array.from({ length: perReader }, (): LoadRequest => {
          const answerId = answers[next % answers.length] ?? '';
          const leaseId = uuidv7();
          if (prefix !== '') insertLease(context.db, { id: leaseId, answer: answerId, reader, takenAt: Date.now(), expiresAt: Date.now() + 3_600_000 });
          const text = texts[next % texts.length];
          if (prefix !== '') next += 1;
          return { method: 'PUT', path: `${prefix}/readings/${uuidv7()}`, cookie, body: { answerId, leaseId, text, openedAt: Date.now() } };
        }),
      ),
    );

  const ours = await listen(createApp(context));
  const floor = await listen(floorApp(server));
  const figures = { ours: [] as number[], floor: [] as number[] };
  for (let round = 0; round <= rounds; round += 1) {
    const floorRound = await load(floor.port, requestsFor(''));
    const ourRound = await load(ours.port, requestsFor('/api'));
    // The first round warms both up.
    if (round > 0) {
      figures.floor.push(...floorRound);
      figures.ours.push(...ourRound);
    }
  }
  ours.close();
  floor.close();
  const detail = `median ${median(figures.ours).toFixed(1)} ms to ${median(figures.floor).toFixed(1)} ms, p99 ${quantile(figures.ours, 0.99).toFixed(1)} to ${quantile(figures.floor, 0.99).toFixed(1)}, ${readers} readers, ${figures.ours.length} readings`;
  return [{ name: 'recording a reading / bare insert', ratio: median(figures.ours) / median(figures.floor), budget: { most: 2 }, detail }];
}
