import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { insertReading } from '../../db/queries/desk';
import { insertScore, insertVerdict, saveDerivedState, saveTotal, type ScoreRow } from '../../db/queries/settling';
import { answer, score, total, verdict, type reading } from '../../db/schema';
import { understand } from '../../server/services/readings';
import { settleAnswers } from '../../server/services/settle';
import { startTestServer, type TestServer } from '../support/test-server';
import { benchScheme } from './bench-scheme';
import type { BenchLine } from './figures';
import { largeSitting, type LargeSitting } from './large-sitting';

const scripts = 4000;
const items = 20;
const chunk = 50;

type ReadingRow = typeof reading.$inferSelect;

const size = (server: TestServer) => {
  const { scheme, hash } = benchScheme();
  return { course: server.courseId, lead: server.people.lead, scheme, schemeHash: hash, items, scripts };
};

/** Eighty thousand readings: half right, the rest spread over three thousand other values. */
function readingsFor(server: TestServer, sitting: LargeSitting): ReadingRow[] {
  const { scheme } = benchScheme();
  return sitting.scripts.flatMap(({ answers }, at) =>
    answers.map((answerId, index): ReadingRow => {
      const n = (at * items + index) % 6000;
      const text = n % 2 === 0 ? '6.10' : `${Math.floor(n / 200)}.${String(n % 100).padStart(2, '0')}`;
      return {
        id: uuidv7(),
        answer: answerId,
        reader: server.people.readerOne,
        purpose: 'live',
        ...understand({ text, method: [] }, scheme),
        note: null,
        knewKey: false,
        lease: null,
        openedAt: 0,
        recordedAt: 1,
        grammar: 1,
      };
    }),
  );
}

const inChunks = <Row>(rows: readonly Row[], length: number): Row[][] =>
  Array.from({ length: Math.ceil(rows.length / length) }, (_, index) => rows.slice(index * length, (index + 1) * length));

function timed(work: () => void): number {
  const begun = process.hrtime.bigint();
  work();
  return Number(process.hrtime.bigint() - begun) / 1e6;
}

/** Ours: every reading inserted, settled, marked and added up, a few scripts a transaction. */
function scoreAll(server: TestServer, rows: readonly ReadingRow[]): number {
  const { context } = server;
  return timed(() => {
    for (const part of inChunks(rows, chunk * items)) {
      inTransaction(context.db, () => {
        for (const row of part) insertReading(context.db, row);
        settleAnswers(context, part.map((row) => row.answer));
      });
    }
  });
}

/** The floor: the rows that came of it, written by the same prepared statements into a sitting that has none. */
function writeAll(db: Database, from: Database, rows: readonly ReadingRow[]): number {
  const scores = new Map(from.select().from(score).all().map((row): [string, ScoreRow] => [row.answer, row]));
  const states = new Map(from.select().from(answer).all().map((row) => [row.id, row]));
  const totals = new Map(from.select().from(total).all().map((row) => [row.script, row]));
  const verdicts = from.select().from(verdict).all();
  return timed(() => {
    inTransaction(db, () => verdicts.forEach((row) => insertVerdict(db, row)));
    for (const part of inChunks(rows, chunk * items)) {
      inTransaction(db, () => {
        const touched = new Set<string>();
        for (const row of part) {
          insertReading(db, row);
          const scored = scores.get(row.answer);
          const derived = states.get(row.answer);
          if (!scored || !derived) throw new Error('The scored sitting lacks a row.');
          insertScore(db, scored);
          saveDerivedState(db, { ...derived, answer: derived.id });
          touched.add(derived.script);
        }
        for (const script of touched) {
          const row = totals.get(script);
          if (row) saveTotal(db, row);
        }
      });
    }
  });
}

/** A second database with the same ids, so that the same rows fit. */
async function twinOf(server: TestServer): Promise<TestServer> {
  const twin = await startTestServer();
  const client = twin.context.db.$client;
  client.pragma('foreign_keys = OFF');
  const names = ['person', 'course', 'membership', 'sitting', 'candidate', 'item', 'item_scheme', 'scheme_version', 'scheme_version_item', 'paper_lock', 'script', 'answer'];
  client.prepare('attach database ? as source').run(server.context.db.$client.name);
  for (const name of names.slice(0, 3)) client.exec(`delete from main.${name}`);
  for (const name of names) client.exec(`insert into main.${name} select * from source.${name}`);
  client.exec('detach database source');
  client.pragma('foreign_keys = ON');
  return twin;
}

/** Scoring and storing 80,000 readings, as a ratio to writing the same rows by the same prepared statements. */
export async function benchScoring(): Promise<BenchLine[]> {
  const ours = await startTestServer();
  const sitting = largeSitting(ours.context.db, size(ours));
  const rows = readingsFor(ours, sitting);
  const floor = await twinOf(ours);
  const scoring = scoreAll(ours, rows);
  const writing = writeAll(floor.context.db, ours.context.db, rows);
  await ours.close();
  await floor.close();
  return [{ name: 'scoring and storing / writing the same rows', ratio: scoring / writing, budget: { most: 2.5 }, detail: `${rows.length} readings, ${scoring.toFixed(0)} ms to ${writing.toFixed(0)} ms` }];
}
