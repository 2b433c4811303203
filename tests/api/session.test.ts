import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { session } from '../../db/schema';
import { sweep } from '../../server/services/sweeping';
import { cast, castPassword } from '../support/cast';
import { startTestServer, type TestServer } from '../support/test-server';

describe('signing in and out', () => {
  let server: TestServer;
  beforeAll(async () => void (server = await startTestServer()));
  afterAll(() => server.close());

  it('gives a session that says who is signed in and with which roles', async () => {
    const lead = await server.signInAs('lead');
    const { body } = await lead.get('/api/me').expect(200);
    expect(body).toMatchObject({ name: cast.lead.name, isOfficer: false, courses: [{ code: 'CHM 214', roles: ['lead'] }] });
  });

  it('sends the cookie out of reach of scripts and other sites', async () => {
    const response = await server.nobody().post('/api/session').send({ email: cast.lead.email, password: castPassword }).expect(200);
    expect(response.headers['set-cookie']?.[0]).toMatch(/^meniscus=.*HttpOnly; SameSite=Lax/);
  });

  it('refuses a wrong password and an unknown name alike, saying how many tries are left', async () => {
    const wrong = await server.nobody().post('/api/session').send({ email: cast.lead.email, password: 'wrong' }).expect(401);
    const unknown = await server.nobody().post('/api/session').send({ email: 'no-one@wrenmoor.example', password: 'wrong' }).expect(401);
    expect(wrong.body.error.message).toMatch(/^That name and password do not go together\. \d+ tries are left\.$/);
    expect(unknown.body.error.message).toBe(wrong.body.error.message);
  });

  it('ends one session, or all of a person', async () => {
    const here = await server.signInAs('readerOne');
    const there = await server.signInAs('readerOne');
    await here.delete('/api/session').expect(204);
    await here.get('/api/me').expect(401);
    await there.get('/api/me').expect(200);
    const third = await server.signInAs('readerOne');
    await third.delete('/api/sessions').expect(204);
    await there.get('/api/me').expect(401);
  });

  it('refuses a write that comes from another site', async () => {
    const lead = await server.signInAs('lead');
    await lead.delete('/api/session').set('Origin', 'https://elsewhere.example').expect(403);
    await lead.get('/api/me').expect(200);
  });

  it('ends a session when its time is up', async () => {
    const reader = await server.signInAs('readerTwo');
    server.clock.advance(13 * 3_600_000);
    await reader.get('/api/me').expect(401);
  });

  it('sweeps away sessions that have ended, and leaves the others', async () => {
    const rows = () => server.context.db.select().from(session).all().length;
    await server.signInAs('lead');
    server.clock.advance(13 * 3_600_000);
    const fresh = await server.signInAs('lead');
    sweep(server.context);
    expect(rows()).toBe(1);
    await fresh.get('/api/me').expect(200);
  });

  describe('edge cases', () => {
    it('names the field of a malformed request', async () => {
      const { body } = await server.nobody().post('/api/session').send({ email: 'x' }).expect(400);
      expect(body.error).toMatchObject({ code: 'invalid_request', fields: { password: expect.any(String) } });
    });

    it('answers broken JSON and unknown addresses in the same form', async () => {
      const broken = await server.nobody().post('/api/session').set('Content-Type', 'application/json').send('{').expect(400);
      expect(broken.body.error).toMatchObject({ code: 'invalid_request', requestId: expect.any(String) });
      const unknown = await server.nobody().get('/api/no-such-thing').expect(404);
      expect(unknown.body.error.code).toBe('not_found');
    });
  });
});
