import sharp from 'sharp';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { UploadView } from '../../shared/contracts/scans';
import { buildPaper } from '../support/paper';
import { beginBatch, bringIn } from '../support/scans';
import { startTestServer, type TestServer } from '../support/test-server';

/** The printed file itself is what comes in: pages that no scanner spoiled, read by their codes. */
describe('printed sheets that come in', () => {
  let server: TestServer;
  let lead: Agent;
  let sittingId: string;
  let batchId: string;
  let older: Buffer;
  let printed: Buffer;

  async function print(of: string, spares: number): Promise<Buffer> {
    const { body } = await lead.post(`/api/sittings/${of}/printings`).send({ paperSize: 'a4', spares }).expect(202);
    await server.context.jobs.settle();
    const file = await lead.get(`/api/printings/${(body as { id: string }).id}/file`).buffer(true).parse((response, done) => {
      const pieces: Buffer[] = [];
      response.on('data', (piece: Buffer) => pieces.push(piece)).on('end', () => done(null, Buffer.concat(pieces)));
    }).expect(200);
    return file.body as Buffer;
  }

  const places = (upload: UploadView): (string | null)[] => upload.pages.map(({ place, why }) => place ?? why);
  const pictureOf = async (pageId: string | undefined, size: string): Promise<Buffer> => (await lead.get(`/api/page-images/${pageId}/file`).query({ size }).expect(200)).body as Buffer;

  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
    sittingId = buildPaper(server, { candidates: ['W4071', 'W4072'] }).sittingId;
    older = await print(sittingId, 0);
    printed = await print(sittingId, 1);
    batchId = (await beginBatch(lead, sittingId)).id;
  });
  afterAll(() => server.close());

  it('go where their codes say, whatever the file is called, with their boxes sure and judged for ink', async () => {
    const upload = await bringIn(server, lead, batchId, 'scan0001.pdf', printed);
    expect(upload.state).toBe('done');
    expect(places(upload)).toEqual([
      ...['W4071', 'W4072'].flatMap((number) => [`${number}, page 1`, `${number}, page 2`]),
      ...[1, 2].map((page) => `This is page ${page} of spare script 3, which has no candidate yet. Say whose it is.`),
    ]);
    const crops = server.context.db.$client.prepare('select evidence, sides_confirmed as sides, ink, count(*) as n from crop group by 1, 2, 3').all();
    expect(crops).toEqual(expect.arrayContaining([expect.objectContaining({ evidence: 'in', sides: 4, ink: 'blank' })]));
    expect(server.context.db.$client.prepare("select max(residual_mm) from page_image where state = 'placed'").pluck().get()).toBeLessThan(0.2);
    // Drawn anew at 150 dpi: 210 by 297 mm.
    expect(await sharp(await pictureOf(upload.pages[0]?.id, 'display')).metadata()).toMatchObject({ width: 1240, height: 1754 });
  });

  it('are known as of an older layout, and looked at by a person', async () => {
    const upload = await bringIn(server, lead, batchId, 'old.pdf', older);
    expect(places(upload)[0]).toMatch(/^This is page 1 of W4071, on a sheet of layout \d+; the script has layout \d+\. Look at it before it is placed\.$/);
  });

  it('do not come in twice: a second picture of a page waits for a person', async () => {
    const { body } = await lead.get(`/api/batches/${batchId}`).expect(200);
    const first = (body as { uploads: UploadView[] }).uploads.flatMap(({ pages }) => pages).find(({ place }) => place === 'W4071, page 1');
    const again = await sharp(await pictureOf(first?.id, 'original')).rotate(180).modulate({ brightness: 0.97 }).jpeg().toBuffer();
    expect(places(await bringIn(server, lead, batchId, 'again.jpg', again))).toEqual(['Page 1 of W4071 is in already.']);
  });

  it('are told apart where two lie in one picture', async () => {
    const { body } = await lead.get(`/api/batches/${batchId}`).expect(200);
    const ids = (body as { uploads: UploadView[] }).uploads.flatMap(({ pages }) => pages).filter(({ place }) => place !== null).map(({ id }) => id);
    const [one, two] = await Promise.all(ids.slice(0, 2).map((id) => pictureOf(id, 'original')));
    const both = await sharp(one).extend({ right: 1700, background: 'white' }).composite([{ input: two!, left: 1680, top: 0 }]).jpeg().toBuffer();
    expect(places(await bringIn(server, lead, batchId, 'W4072-p1.jpg', both))).toEqual(['Two sheets are in one picture. Scan them apart.']);
  });

  it('of another sitting are named and never filed here', async () => {
    const elsewhere = buildPaper(server, { candidates: ['W5001'] }).sittingId;
    const foreign = await print(elsewhere, 0);
    const upload = await bringIn(server, lead, batchId, 'foreign.pdf', foreign);
    expect(places(upload)[0]).toMatch(/^This sheet belongs to another sitting: .+\. Bring it in there\.$/);
  });
});
