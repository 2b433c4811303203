import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inTransaction } from '../../db/client';
import * as tables from '../../db/schema';
import { settleAnswers } from '../../server/services/settle';
import { giveEvidence } from '../support/evidence';
import { buildPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('rows that stay', () => {
  let server: TestServer;
  let sittingId: string;
  beforeAll(async () => {
    server = await startTestServer();
    ({ sittingId } = buildPaper(server));
  });
  afterAll(() => server.close());

  it('refuses to change or remove a row of an append-only table', () => {
    const client = server.context.db.$client;
    for (const table of ['item_scheme', 'scheme_version', 'scheme_version_item', 'audit_entry']) {
      const [column] = client.pragma(`table_info(${table})`) as { name: string }[];
      expect(() => client.exec(`update ${table} set ${column?.name} = ${column?.name}`), table).toThrow('append-only');
      expect(() => client.exec(`delete from ${table}`), table).toThrow('append-only');
    }
    const guards = client.prepare("select count(*) as n from sqlite_master where type = 'trigger'").get() as { n: number };
    expect(guards.n).toBe(34);
  });

  it('chains every entry of the trail to the one before, without a gap', () => {
    const entries = server.context.db.select().from(tables.auditEntry).orderBy(tables.auditEntry.n).all();
    expect(entries.length).toBeGreaterThan(5);
    entries.forEach(({ hash, ...row }, index) => {
      expect(row.n).toBe(index + 1);
      expect(row.prevHash).toBe(entries[index - 1]?.hash ?? '');
      expect(createHash('sha256').update(JSON.stringify(row)).digest('hex')).toBe(hash);
    });
  });

  it('derives the same states, scores and totals again from the same rows', async () => {
    const { context } = server;
    const answers = giveEvidence(server, sittingId);
    const reader = await server.signInAs('readerOne');
    const { body } = await reader.post('/api/desk/leases').send({ itemId: answers[0]?.itemId, count: 20 }).expect(200);
    for (const [index, lease] of (body.leases as { id: string; answerId: string }[]).entries()) {
      const sent = { answerId: lease.answerId, leaseId: lease.id, openedAt: 1, ...(index === 0 ? { code: 'cannot-read' } : { text: ['6.1', '5.75'][index - 1] ?? '6.10' }) };
      await reader.put(`/api/readings/${lease.id}`).send(sent).expect(200);
    }
    const derived = () => ({
      answers: context.db.select().from(tables.answer).all().map(({ id, state, readingsDue, settledCanonical, score }) => ({ id, state, readingsDue, settledCanonical, score })),
      totals: context.db.select().from(tables.total).all().map(({ script, grains, missing }) => ({ script, grains, missing })),
      scores: context.db.select().from(tables.score).all().length,
    });
    const before = derived();
    expect(before.scores).toBe(2);
    inTransaction(context.db, () => settleAnswers(context, answers.map(({ id }) => id)));
    expect(derived()).toEqual(before);
  });
});
