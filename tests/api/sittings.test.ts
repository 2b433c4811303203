import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('courses and sittings', () => {
  let server: TestServer;
  beforeAll(async () => void (server = await startTestServer()));
  afterAll(() => server.close());

  const wanted = { title: 'Paper 2, spring sitting', heldOn: '2026-05-06' };

  it('lets a lead begin a sitting, with the next number for printed sheets', async () => {
    const lead = await server.signInAs('lead');
    const first = await lead.post(`/api/courses/${server.courseId}/sittings`).send(wanted).expect(201);
    const second = await lead.post(`/api/courses/${server.courseId}/sittings`).send(wanted).expect(201);
    expect(first.body).toMatchObject({ ...wanted, courseCode: 'CHM 214', status: 'draft', lockedAt: null, secondPolicy: 'none', roles: ['lead'] });
    expect(second.body.printNumber).toBe(first.body.printNumber + 1);
    const { body } = await lead.get(`/api/courses/${server.courseId}/sittings`).expect(200);
    expect(body.sittings.map(({ id }: { id: string }) => id)).toContain(first.body.id);
  });

  it('shows everyone their own courses, and the exams officer all', async () => {
    const reader = await server.signInAs('readerOne');
    const officer = await server.signInAs('officer');
    const candidate = await server.signInAs('candidate');
    expect((await reader.get('/api/courses')).body.courses).toMatchObject([{ code: 'CHM 214', roles: ['reader'] }]);
    expect((await officer.get('/api/courses')).body.courses.map(({ code }: { code: string }) => code)).toEqual(['CHM 105', 'CHM 214']);
    expect((await candidate.get('/api/courses')).body.courses).toEqual([]);
  });

  it('changes what is named and refuses an old rev with what is there now', async () => {
    const { sittingId } = buildPaper(server);
    const lead = await server.signInAs('lead');
    const { body: before } = await lead.get(`/api/sittings/${sittingId}`).expect(200);
    const changed = await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', String(before.rev)).send({ title: 'Paper 2', boardDate: '2026-06-20' }).expect(200);
    expect(changed.body).toMatchObject({ title: 'Paper 2', boardDate: '2026-06-20', heldOn: '2026-05-06' });
    const late = await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', String(before.rev)).send({ title: 'Other' }).expect(409);
    expect(late.body.error.current).toMatchObject({ title: 'Paper 2' });
    await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', String(changed.body.rev)).send({ boardDate: null, secondPolicy: 'all' }).expect(200);
    expect((await lead.get(`/api/sittings/${sittingId}`)).body).toMatchObject({ boardDate: null, secondPolicy: 'all' });
  });

  it('counts every stage, and keeps from readers what would tell them of a pair', async () => {
    const { sittingId } = buildPaper(server, { candidates: ['W1', 'W2', 'W3'] });
    const lead = await server.signInAs('lead');
    const { body: list } = await lead.get(`/api/sittings/${sittingId}/candidates`);
    await lead.patch(`/api/candidates/${list.candidates[0].id}`).set('If-Match', '1').send({ attendance: 'absent' }).expect(200);
    const { body } = await lead.get(`/api/sittings/${sittingId}/progress`).expect(200);
    expect(body).toMatchObject({
      isLocked: true,
      items: 2,
      itemsPlaced: 2,
      layoutPages: 1,
      candidates: { expected: 2, absent: 1, present: 0 },
      pages: { due: 2, in: 0, excused: 0, loose: 0 },
      readings: { taken: 0, due: 0 },
      answers: { all: 6, readable: 0, held: 0, scored: 0 },
    });
    for (const name of ['external', 'officer'] as const) {
      const seen = await (await server.signInAs(name)).get(`/api/sittings/${sittingId}/progress`).expect(200);
      expect(seen.body).toEqual(body);
    }
    const reader = await (await server.signInAs('readerOne')).get(`/api/sittings/${sittingId}/progress`).expect(200);
    expect(reader.body).toEqual({ ...body, answers: { ...body.answers, held: null, scored: null } });
  });

  it('tells a reader nothing of keys', async () => {
    const { sittingId } = buildPaper(server);
    const reader = await server.signInAs('readerOne');
    const seen = [await reader.get(`/api/sittings/${sittingId}`).expect(200), await reader.get(`/api/courses/${server.courseId}/sittings`).expect(200)];
    for (const { text } of seen) expect(text).not.toMatch(/6\.10|61\/10|"key"|scheme|band/i);
  });

  describe('someone else’s', () => {
    it('refuses other roles and hides it from people of other courses', async () => {
      const { sittingId } = buildPaper(server);
      for (const name of ['readerOne', 'external', 'officer'] as const) {
        const other = await server.signInAs(name);
        await other.post(`/api/courses/${server.courseId}/sittings`).send(wanted).expect(403);
        await other.patch(`/api/sittings/${sittingId}`).set('If-Match', '1').send({ title: 'x' }).expect(403);
      }
      const outsider = await server.signInAs('outsider');
      await outsider.get(`/api/sittings/${sittingId}`).expect(404);
      await outsider.get(`/api/sittings/${sittingId}/progress`).expect(404);
      await outsider.get(`/api/courses/${server.courseId}/sittings`).expect(404);
      await outsider.post(`/api/courses/${server.courseId}/sittings`).send(wanted).expect(404);
      await server.nobody().get('/api/courses').expect(401);
    });
  });

  describe('edge cases', () => {
    it.each([
      [{ ...wanted, title: '  ' }, 'title'],
      [{ ...wanted, heldOn: '6 May' }, 'heldOn'],
      [{ ...wanted, heldOn: '2026-02-30' }, 'heldOn'],
      [{ ...wanted, secondPolicy: 'by-risk' }, 'secondPolicy'],
    ])('refuses %j', async (body, field) => {
      const lead = await server.signInAs('lead');
      const refused = await lead.post(`/api/courses/${server.courseId}/sittings`).send(body).expect(400);
      expect(refused.body.error.fields).toHaveProperty(field);
    });

    it('needs the rev that was seen, and something to change', async () => {
      const { sittingId } = buildPaper(server);
      const lead = await server.signInAs('lead');
      await lead.patch(`/api/sittings/${sittingId}`).send({ title: 'x' }).expect(400);
      await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', '2').send({}).expect(400);
      await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', '2').send({ status: 'released' }).expect(400);
    });
  });
});
