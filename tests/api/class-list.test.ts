import { eq } from 'drizzle-orm';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { answer, auditEntry, script } from '../../db/schema';
import { buildPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('the class list', () => {
  let server: TestServer;
  let lead: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  afterAll(() => server.close());

  const empty = () => buildPaper(server, { candidates: [], locked: false }).sittingId;
  const preview = async (sitting: string, text: string) => (await lead.post(`/api/sittings/${sitting}/class-list/preview`).send({ text }).expect(200)).body;
  const confirm = (sitting: string, text: string, hash: string) => lead.post(`/api/sittings/${sitting}/class-list/confirm`).send({ text, hash });
  const numbers = async (sitting: string) =>
    (await lead.get(`/api/sittings/${sitting}/candidates`).expect(200)).body.candidates.map(({ number }: { number: string }) => number);

  async function imported(sitting: string, text: string) {
    const { hash } = await preview(sitting, text);
    return (await confirm(sitting, text, hash).expect(200)).body;
  }

  it('previews before it imports, and imports what was previewed', async () => {
    const sitting = empty();
    const text = 'candidate number,name,e-mail\nW4071,Robin Calloway,robin@wrenmoor.example\nW4072,,\n';
    const seen = await preview(sitting, text);
    expect(seen).toMatchObject({
      counts: { new: 2, changed: 0, unchanged: 0 },
      errors: [],
      notInText: 0,
      rows: [
        { line: 2, number: 'W4071', name: 'Robin Calloway', email: 'robin@wrenmoor.example', outcome: 'new' },
        { line: 3, number: 'W4072', name: null, email: null, outcome: 'new' },
      ],
    });
    expect(await numbers(sitting)).toEqual([]);
    expect((await confirm(sitting, text, seen.hash).expect(200)).body).toEqual({ added: 2, changed: 0, unchanged: 0, scripts: 0 });
    expect(await numbers(sitting)).toEqual(['W4071', 'W4072']);
  });

  it('says what a second list would change, and keeps who is not in it', async () => {
    const sitting = empty();
    await imported(sitting, 'number;name\nW1;Ada Fenn\nW2;Bo Larch\nW3;Cy Moor');
    const seen = await preview(sitting, 'number;name\nw1;Ada Fenn\nW2;Bo Larch-Pine\nW4;Di Nettle');
    expect(seen).toMatchObject({ counts: { new: 1, changed: 1, unchanged: 1 }, notInText: 1 });
    await imported(sitting, 'number;name\nW1;Ada Fenn\nW2;Bo Larch-Pine\nW4;Di Nettle');
    expect(await numbers(sitting)).toEqual(['W1', 'W2', 'W3', 'W4']);
    const { body } = await lead.get(`/api/sittings/${sitting}/names`).expect(200);
    expect(body.names.map(({ name }: { name: string }) => name)).toEqual(['Ada Fenn', 'Bo Larch-Pine', 'Cy Moor', 'Di Nettle']);
  });

  it('keeps a known name where the new list says nothing of names', async () => {
    const sitting = empty();
    await imported(sitting, 'number,name\nW1,Ada Fenn');
    expect(await preview(sitting, 'W1\nW2')).toMatchObject({ counts: { new: 1, changed: 0, unchanged: 1 } });
  });

  it('names every error by line and column, and imports nothing', async () => {
    const sitting = empty();
    const text = ['W4070,A,a@b.example', 'W4071,B,not an address', 'W4071,C,', ',D,', 'W 4*,E,'].join('\n');
    const seen = await preview(sitting, text);
    expect(seen.hash).toBeNull();
    expect(seen.errors).toEqual([
      { line: 2, column: 3, message: '“not an address” is no e-mail address.' },
      { line: 3, column: 1, message: 'W4071 stands on line 2 too.' },
      { line: 4, column: 1, message: 'The candidate number is missing.' },
      { line: 5, column: 1, message: '“W 4*” is no candidate number: letters, digits and . _ / - only.' },
    ]);
    await confirm(sitting, text, '0'.repeat(64)).expect(400);
    expect(await numbers(sitting)).toEqual([]);
  });

  it('refuses a confirmation when the list changed since the preview', async () => {
    const sitting = empty();
    const { hash } = await preview(sitting, 'W1\nW2');
    await imported(sitting, 'W2');
    await confirm(sitting, 'W1\nW2', hash).expect(409);
    await confirm(sitting, 'W1\nW3', hash).expect(409);
    expect(await numbers(sitting)).toEqual(['W2']);
  });

  it('asks for no reading of someone absent, and asks again when they turn out to be there', async () => {
    const { sittingId } = buildPaper(server);
    const { db } = server.context;
    const { body } = await lead.get(`/api/sittings/${sittingId}/candidates`);
    const [first] = body.candidates;
    const ofFirst = db.select({ id: answer.id }).from(answer).innerJoin(script, eq(script.id, answer.script)).where(eq(script.candidate, first.id)).all();
    for (const { id } of ofFirst) db.update(answer).set({ evidence: 'in', readingsDue: 1 }).where(eq(answer.id, id)).run();
    const due = () => db.select({ due: answer.readingsDue }).from(answer).innerJoin(script, eq(script.id, answer.script)).where(eq(script.candidate, first.id)).all();
    const away = await lead.patch(`/api/candidates/${first.id}`).set('If-Match', '1').send({ attendance: 'absent' }).expect(200);
    expect(away.body).toMatchObject({ attendance: 'absent', pagesDue: 0, rev: 2 });
    expect(due().map((row) => row.due)).toEqual([0, 0]);
    const late = await lead.patch(`/api/candidates/${first.id}`).set('If-Match', '1').send({ attendance: 'late' }).expect(409);
    expect(late.body.error.current).toMatchObject({ attendance: 'absent', rev: 2 });
    await lead.patch(`/api/candidates/${first.id}`).set('If-Match', '2').send({ attendance: 'late' }).expect(200);
    expect(due().map((row) => row.due)).toEqual([1, 1]);
  });

  it('writes no name into the audit trail', async () => {
    const sitting = empty();
    await imported(sitting, 'number,name,email\nW1,Unusual Surname,unusual@wrenmoor.example');
    const acts = server.context.db.select().from(auditEntry).where(eq(auditEntry.sitting, sitting)).all();
    expect(acts.map(({ act }) => act)).toContain('class-list-imported');
    expect(JSON.stringify(acts)).not.toMatch(/unusual/i);
  });

  describe('someone else’s', () => {
    it('shows names to the lead and the exams officer only', async () => {
      const sitting = empty();
      await imported(sitting, 'number,name\nW1,Ada Fenn');
      await (await server.signInAs('officer')).get(`/api/sittings/${sitting}/names`).expect(200);
      for (const name of ['readerOne', 'external'] as const) {
        const other = await server.signInAs(name);
        await other.get(`/api/sittings/${sitting}/names`).expect(403);
        const { text } = await other.get(`/api/sittings/${sitting}/candidates`).expect(200);
        expect(text).not.toContain('Ada Fenn');
      }
    });

    it('lets only the lead write, and hides it from other courses', async () => {
      const { sittingId } = buildPaper(server);
      const { body } = await lead.get(`/api/sittings/${sittingId}/candidates`);
      const tries = (agent: Agent) => [
        agent.post(`/api/sittings/${sittingId}/class-list/preview`).send({ text: 'W1' }),
        agent.post(`/api/sittings/${sittingId}/class-list/confirm`).send({ text: 'W1', hash: '0'.repeat(64) }),
        agent.patch(`/api/candidates/${body.candidates[0].id}`).set('If-Match', '1').send({ attendance: 'absent' }),
      ];
      for (const name of ['readerOne', 'external', 'officer'] as const) for (const request of tries(await server.signInAs(name))) await request.expect(403);
      const outsider = await server.signInAs('outsider');
      for (const request of [...tries(outsider), outsider.get(`/api/sittings/${sittingId}/candidates`), outsider.get(`/api/sittings/${sittingId}/names`)]) await request.expect(404);
      await (await server.signInAs('officer')).get(`/api/sittings/${sittingId}/candidates`).expect(403);
    });
  });

  describe('edge cases', () => {
    it('reads a byte order mark, CRLF, semicolons, quotes and accents', async () => {
      const sitting = empty();
      const seen = await preview(sitting, '\uFEFFCandidate No.;E-mail;Full name\r\nW1;a@b.example;"Ünal; Eşref"\r\n\r\nW2;;"say ""Bo"""\r\n');
      expect(seen.errors).toEqual([]);
      expect(seen.rows).toMatchObject([
        { line: 2, number: 'W1', name: 'Ünal; Eşref', email: 'a@b.example' },
        { line: 4, number: 'W2', name: 'say "Bo"' },
      ]);
    });

    it('counts lines as an editor does, through quoted line breaks', async () => {
      const seen = await preview(empty(), 'W1,"one\ntwo"\nW1,x');
      expect(seen.errors).toEqual([{ line: 3, column: 1, message: 'W1 stands on line 1 too.' }]);
    });

    it.each([
      ['name,email\nA,b@c.example', 'No column is headed “candidate number”.'],
      ['number,name\n', 'There is a header and no candidate under it.'],
      ['W1,"open', 'A quotation mark is opened and never closed.'],
      ['W1,A,a@b.example,more', 'Without a header there are three columns: candidate number, name, e-mail.'],
      ['W\uFFFD1', 'Some characters cannot be read. Save the file as UTF-8.'],
      ['\n\n', 'No candidate stands in this text.'],
      ['number,number\nW1,W2', 'Column 1 has this heading too.'],
    ])('refuses %j', async (text, message) => {
      const { errors, hash } = await preview(empty(), text);
      expect(hash).toBeNull();
      expect(errors.map((error: { message: string }) => error.message)).toContain(message);
    });

    it('takes 5,000 candidates and refuses the next', async () => {
      const lines = Array.from({ length: 5001 }, (_, index) => `W${index}`);
      const sitting = empty();
      expect((await preview(sitting, lines.slice(0, 5000).join('\n'))).counts.new).toBe(5000);
      expect((await preview(sitting, lines.join('\n'))).errors).toEqual([{ line: 5001, column: 1, message: 'A class list has at most 5,000 candidates.' }]);
    });

    it('refuses more than a megabyte, an empty text and an unknown attendance', async () => {
      const { sittingId } = buildPaper(server);
      const { body } = await lead.get(`/api/sittings/${sittingId}/candidates`);
      await lead.post(`/api/sittings/${sittingId}/class-list/preview`).send({ text: 'W'.repeat(1_100_000) }).expect(413);
      await lead.post(`/api/sittings/${sittingId}/class-list/preview`).send({ text: '' }).expect(400);
      await lead.patch(`/api/candidates/${body.candidates[0].id}`).set('If-Match', '1').send({ attendance: 'asleep' }).expect(400);
    });
  });
});
