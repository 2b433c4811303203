import { strToU8, zipSync } from 'fflate';
import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { insertLease } from '../../db/queries/desk';
import { insertPageImage } from '../../db/queries/page-images';
import { scriptOfCandidate } from '../../db/queries/people-and-paper';
import { answersOfSitting } from '../../db/queries/settling';
import { allRoutes } from '../../shared/contracts/all-routes';
import type { GuardRole, RouteContract } from '../../shared/contracts/route';
import { createBatch } from '../../server/services/batches';
import { candidatesOf } from '../../server/services/candidates';
import { printFor } from '../../server/services/printings';
import { beginUpload } from '../../server/services/uploads';
import { cast, type CastName } from '../support/cast';
import { actorOf, buildPaper, itemDraft, layoutFor } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

/** What stands behind the names in an address, so that every route meets a thing that is there. */
interface World {
  readonly ids: Readonly<Record<string, string>>;
  /** A body that passes the schema of each route that has one, so that the guard is what answers. */
  readonly bodies: Readonly<Record<string, unknown>>;
}

function buildWorld(server: TestServer): World {
  const { context, courseId, people } = server;
  const { sittingId, items } = buildPaper(server);
  const [answerId = ''] = answersOfSitting(context.db, sittingId);
  const leaseId = uuidv7();
  const now = context.clock.now();
  insertLease(context.db, { id: leaseId, answer: answerId, reader: people.readerOne, takenAt: now, expiresAt: now + 60_000 });
  const [candidate] = candidatesOf(context, actorOf(server, 'lead'), sittingId);
  const unknown = uuidv7();
  const scriptId = scriptOfCandidate(context.db, candidate?.id ?? '')?.id ?? '';
  const batchId = createBatch(context, actorOf(server, 'readerOne'), sittingId, 'A').id;
  const uploadId = beginUpload(context, actorOf(server, 'readerOne'), batchId, { fileName: 'page.jpg', size: 10 }).id;
  const pageId = uuidv7();
  insertPageImage(context.db, { id: pageId, upload: uploadId, index: 0, sitting: sittingId, state: 'loose' });
  const printingId = printFor(context, actorOf(server, 'lead'), sittingId, { paperSize: 'a4', spares: 0, for: 'all' }).id;
  return {
    ids: { courses: courseId, sittings: sittingId, items: items[0] ?? '', answers: answerId, candidates: candidate?.id ?? '', 'desk/leases': leaseId, readings: unknown, rulings: unknown, exports: unknown, batches: batchId, uploads: uploadId, 'page-images': pageId, printings: printingId, scripts: scriptId },
    bodies: {
      signIn: { email: 'nobody@wrenmoor.example', password: 'wrong' },
      makeSitting: { title: 'Another sitting', heldOn: '2026-06-03' },
      changeSitting: { title: 'Paper 2' },
      makeItem: itemDraft(),
      saveItem: itemDraft(),
      orderItems: { items },
      workKey: { sittingId, draft: itemDraft() },
      spotTest: { text: '6.10' },
      previewClassList: { text: 'W9001' },
      confirmClassList: { text: 'W9001', hash: 'x'.repeat(64) },
      changeAttendance: { attendance: 'present' },
      saveBoxes: layoutFor(items),
      takeLeases: { itemId: items[0] ?? '' },
      recordReading: { answerId, leaseId, text: '6.10', openedAt: now },
      recordBlankReadings: { readings: [], openedAt: now },
      recordThirdReading: { text: '6.10', openedAt: now },
      ruleAnswer: { kind: 'value', text: '6.10' },
      makeExport: { kind: 'marks-csv' },
      putPaperFile: { format: 'meniscus-paper', version: 1, title: 'Paper', items: [], pages: [], boxes: [] },
      checkKey: { text: '6.10' },
      vetItem: { outcome: 'signed', comment: null },
      makeBatch: { bundle: 'B' },
      changeBatch: { state: 'cancelled' },
      beginUpload: { fileName: 'page.jpg', size: 10 },
      placePage: { candidateId: candidate?.id ?? '', pageNo: 1 },
      turnPage: { by: 1 },
      loosenPage: { reopen: false },
      readNumber: { scriptId, text: 'W4071' },
      bindScript: { candidateId: candidate?.id ?? '', seen: null, reason: 'a spare sheet' },
      swapScripts: { withScriptId: scriptId, seen: candidate?.id ?? '', seenOther: candidate?.id ?? '', reason: 'exchanged' },
      settleNumber: { seen: candidate?.id ?? null, reason: 'the same hand' },
      makeByHand: { reason: 'large print' },
      typeByHand: { readings: [{ id: unknown, itemId: items[0] ?? '', text: '6.10' }], openedAt: now },
    },
  };
}

/** Fills the names of an address: each stands for a thing of the resource before it. */
const addressOf = (contract: RouteContract, ids: World['ids']): string =>
  `/api${contract.path.replace(/([a-z-]+(?:\/[a-z-]+)*)\/:(\w+)/g, (_all, resource: string, name: string) => {
    if (name !== 'id') return `${resource}/${name === 'reading' ? uuidv7() : '1'}`;
    return `${resource}/${ids[resource] ?? ids[resource.split('/').at(-1) ?? ''] ?? uuidv7()}`;
  })}`.replace(/:n\b|:page\b/g, '1');

/** Routes whose thing is one's own, or not made here: to anybody else it is not there, whatever the role. */
const ownOnly = new Set(['endLease', 'recordReading', 'takeBackReading', 'takeBackRuling', 'getExportFile', 'getCrop', 'changeBatch', 'checkKey', 'vetItem']);
/** Nothing was uploaded here yet, so those let in find nothing. */
const notThereYet = new Set(['getSample', 'getPageImageFile', 'placePage', 'turnPage', 'getNumberStrip', 'readNumber', 'getByHand', 'typeByHand']);
/** Bytes in, so that the guard runs after the transport; tested beside their resource. */
const takesBytes = (contract: RouteContract) => contract.accepts === 'multipart/form-data';

const rolesOf = (name: CastName): readonly GuardRole[] => [...cast[name].roles, ...('isOfficer' in cast[name] ? (['officer'] as const) : [])];

describe('every route answers every role as its contract says', () => {
  let server: TestServer;
  let world: World;
  const agents = new Map<CastName, Agent>();
  const names = Object.keys(cast) as CastName[];
  beforeAll(async () => {
    server = await startTestServer();
    world = buildWorld(server);
  });
  afterAll(() => server.close());

  const agentOf = async (name: CastName): Promise<Agent> => {
    const known = agents.get(name) ?? (await server.signInAs(name));
    agents.set(name, known);
    return known;
  };

  const ask = async (agent: Agent, id: string, contract: RouteContract) => {
    const sent = agent[contract.method](addressOf(contract, world.ids)).set('If-Match', '1');
    const queries: Record<string, object> = { getRecentReadings: { sitting: world.ids.sittings }, getDeskStanding: { sitting: world.ids.sittings }, getCrop: { box: uuidv7() } };
    const query = queries[id] ?? {};
    if (contract.accepts === 'application/zip') return sent.query(query).set('Content-Type', contract.accepts).send(Buffer.from(zipSync({ 'imsmanifest.xml': strToU8('<manifest/>') })));
    return sent.query(query).send((world.bodies[id] ?? {}) as object);
  };

  const guarded = Object.entries(allRoutes).filter(([, contract]) => contract.access.who === 'course' && !takesBytes(contract));

  for (const [id, contract] of Object.entries(allRoutes)) {
    if (contract.access.who === 'anyone' || takesBytes(contract)) continue;
    it(`${contract.method.toUpperCase()} ${contract.path} asks nobody in`, async () => {
      const response = await ask(server.nobody(), id, contract);
      expect(response.status, JSON.stringify(response.body)).toBe(401);
    });
  }

  for (const [id, contract] of guarded) {
    if (contract.access.who !== 'course') continue;
    const { roles } = contract.access;
    for (const name of names) {
      const held = rolesOf(name);
      const isAllowed = held.some((role) => roles.includes(role));
      if (isAllowed) continue;
      it(`${contract.method.toUpperCase()} ${contract.path} refuses ${name}`, async () => {
        const response = await ask(await agentOf(name), id, contract);
        const expected = held.length === 0 || ownOnly.has(id) ? 404 : 403;
        const accepted = ownOnly.has(id) ? [403, 404] : [expected];
        expect(accepted, JSON.stringify(response.body)).toContain(response.status);
      });
    }
    it(`${contract.method.toUpperCase()} ${contract.path} lets in whom it names`, async () => {
      for (const name of names.filter((one) => rolesOf(one).some((role) => roles.includes(role)))) {
        const response = await ask(await agentOf(name), id, contract);
        const refused = ownOnly.has(id) ? [401] : notThereYet.has(id) ? [401, 403] : [401, 403, 404];
        expect(refused, `${name}: ${JSON.stringify(response.body)}`).not.toContain(response.status);
      }
    });
  }
});
