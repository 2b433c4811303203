import fc from 'fast-check';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inTransaction } from '../../db/client';
import { giveLease } from '../../server/services/desk';
import { answerView } from '../../server/services/answers';
import { paperPlan } from '../../server/services/paper-plan';
import { recordReading, takeBackReading } from '../../server/services/readings';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { markPaper, type SettledAnswer } from '../../shared/marking/mark-paper';
import type { Code } from '../../shared/marking/scheme';
import { allRight, chainPaper, oneErrorCarriedOn } from '../support/chain-paper';
import { giveEvidence } from '../support/evidence';
import { actorOf, buildPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

interface Written {
  readonly given: { readonly text: string } | { readonly code: Code };
  readonly method: readonly string[];
}

const runs = 25;
const candidates = Array.from({ length: runs * 2 }, (_, index) => `W${5001 + index}`);

/** What a candidate may have written for each item: right, with one error carried on, without the unit, something else, nothing. */
const texts = allRight.map((right, at): readonly string[] => [right, oneErrorCarriedOn[at] ?? right, right.split(' ')[0] ?? right, '1.00']);
const written = (at: number): fc.Arbitrary<Written> =>
  fc.record({
    given: fc.oneof({ weight: 6, arbitrary: fc.constantFrom(...(texts[at] ?? [])).map((text) => ({ text })) }, { weight: 1, arbitrary: fc.constant({ code: 'blank' as Code }) }),
    method: at === 1 ? fc.subarray(['groups']) : fc.constant([]),
  });
const papers = fc.tuple(...texts.map((_, at) => written(at)));
const orders = fc.shuffledSubarray([0, 1, 2, 3, 4], { minLength: 5 });

describe('the order in which readings come', () => {
  let server: TestServer;
  let ids: Map<string, string[]>;
  let version: string;
  let next = 0;

  beforeAll(async () => {
    server = await startTestServer();
    const { sittingId, items } = buildPaper(server, { drafts: chainPaper, candidates });
    const answers = giveEvidence(server, sittingId);
    ids = new Map(candidates.map((candidate) => [candidate, items.map((item) => answers.find((answer) => answer.candidate === candidate && answer.itemId === item)?.id ?? '')]));
    version = server.context.db.$client.prepare('select scheme_version from sitting where id = ?').pluck().get(sittingId) as string;
  });
  afterAll(() => server.close());

  /** Reads the answers of the next candidate in an order; some are taken back and read again at the end. */
  function readIn(order: readonly number[], paper: readonly Written[], again: readonly number[]): (number | null)[] {
    const { context } = server;
    const reader = actorOf(server, 'readerOne');
    const answers = ids.get(candidates[next] ?? '') ?? [];
    next += 1;
    const record = (at: number, { given, method }: Written, leased?: string): string => {
      const answerId = answers[at] ?? '';
      const id = uuidv7();
      const leaseId = leased ?? inTransaction(context.db, () => giveLease(context, answerId, reader.personId));
      recordReading(context, reader, id, { answerId, leaseId, method: [...method], openedAt: 1, ...given });
      return id;
    };
    const wrong: Written = { given: { text: '0.50' }, method: [] };
    const undone = order.map((at) => [at, record(at, again.includes(at) ? wrong : (paper[at] ?? wrong))] as const).filter(([at]) => again.includes(at));
    for (const [at, id] of undone) {
      const lease = takeBackReading(context, reader, id);
      record(at, paper[at] ?? wrong, lease?.id);
    }
    return answers.map((id) => answerView(context, actorOf(server, 'lead'), id).score?.grains ?? null);
  }

  /** The same paper marked at once by the pure rules, without a database. */
  function marked(paper: readonly Written[]): (number | null)[] {
    const items = [...paperPlan(server.context.db, version).items.values()].map(({ id, at, body }) => ({ id, number: at + 1, scheme: completeScheme(body) }));
    const settled = new Map(items.map(({ id }, at): [string, SettledAnswer] => [id, { given: paper[at]?.given ?? { code: 'blank' }, struck: paper[at]?.method ?? [] }]));
    const verdicts = markPaper(items, settled);
    return items.map(({ id }) => verdicts.get(id)?.verdict.grains ?? null);
  }

  it('changes no mark, whatever is written, carried on, struck or left out', () => {
    fc.assert(
      fc.property(papers, orders, orders, fc.subarray([0, 1, 2, 3, 4], { maxLength: 2 }), (paper, order, other, again) => {
        const whole = marked(paper);
        expect(readIn(order, paper, [])).toEqual(whole);
        expect(readIn(other, paper, again)).toEqual(whole);
      }),
      { numRuns: runs, seed: 1930, endOnFailure: true },
    );
  });
});
