import { once } from 'node:events';
import { get, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { SittingEvent } from '../../shared/contracts/events';
import { castPassword, cast } from '../support/cast';
import { buildPaper, type BuiltPaper } from '../support/paper';
import { pageJpeg } from '../support/pictures';
import { beginBatch, bringIn } from '../support/scans';
import { startTestServer, type TestServer } from '../support/test-server';

describe('the events of a sitting', () => {
  let server: TestServer;
  let paper: BuiltPaper;
  let reader: Agent;
  let http: Server;
  beforeAll(async () => {
    server = await startTestServer();
    paper = buildPaper(server, { candidates: ['W4071', 'W4072'] });
    reader = await server.signInAs('readerOne');
    http = server.app.listen(0);
    await once(http, 'listening');
  });
  afterAll(async () => {
    http.closeAllConnections();
    http.close();
    await server.close();
  });

  const base = (): string => `http://127.0.0.1:${(http.address() as AddressInfo).port}/api`;

  async function stream(): Promise<IncomingMessage> {
    const signIn = await fetch(`${base()}/session`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ email: cast.readerOne.email, password: castPassword }) });
    const cookie = signIn.headers.getSetCookie().map((line) => line.split(';')[0]).join('; ');
    const [response] = (await once(get(`${base()}/sittings/${paper.sittingId}/events`, { headers: { cookie, accept: 'text/event-stream' } }), 'response')) as [IncomingMessage];
    return response;
  }

  async function nextEvent(response: IncomingMessage, wanted: (event: SittingEvent) => boolean): Promise<SittingEvent> {
    let text = '';
    for await (const piece of response.iterator({ destroyOnReturn: false })) {
      text += String(piece);
      for (const match of text.matchAll(/^data: (.+)$/gm)) {
        const event = JSON.parse(match[1] ?? '{}') as SittingEvent;
        if (wanted(event)) return event;
      }
    }
    throw new Error(`The stream ended with ${text}`);
  }

  it('tell at once where scans are, then each change, and never anything of readings', async () => {
    const response = await stream();
    expect(response.headers['content-type']).toBe('text/event-stream; charset=utf-8');
    const first = await nextEvent(response, () => true);
    expect(first).toMatchObject({ pages: { due: 2, in: 0 }, files: { sending: 0, received: 0 }, making: { done: 0, of: 0 }, stuck: 0 });
    expect(Object.keys(first).sort()).toEqual(['files', 'making', 'pages', 'seq', 'stuck']);
    const { id } = await beginBatch(reader, paper.sittingId);
    await bringIn(server, reader, id, 'W4071-p1.jpg', await pageJpeg(1));
    const later = await nextEvent(response, ({ pages }) => pages.in === 1);
    expect(later.seq).toBeGreaterThan(first.seq);
    response.destroy();
  });

  it('answer once where they are asked for as JSON, and nobody from outside', async () => {
    const { body } = await reader.get(`/api/sittings/${paper.sittingId}/events`).query({ since: 0 }).expect(200);
    expect(body).toMatchObject({ pages: { due: 2 } });
    await (await server.signInAs('outsider')).get(`/api/sittings/${paper.sittingId}/events`).set('Accept', 'text/event-stream').expect(404);
    await server.nobody().get(`/api/sittings/${paper.sittingId}/events`).set('Accept', 'text/event-stream').expect(401);
  });
});
