import type { Agent } from 'supertest';
import type { BatchSummary, UploadView } from '../../shared/contracts/scans';
import type { TestServer } from './test-server';

export async function beginBatch(agent: Agent, sittingId: string, bundle = 'A'): Promise<BatchSummary> {
  const { body } = await agent.post(`/api/sittings/${sittingId}/batches`).send({ bundle }).expect(201);
  return body as BatchSummary;
}

/** Sends a whole file in one part and completes it; its pages may still be in the making. */
export async function sendFile(agent: Agent, batchId: string, fileName: string, bytes: Buffer): Promise<UploadView> {
  const begun = await agent.post(`/api/batches/${batchId}/uploads`).send({ fileName, size: bytes.length }).expect(201);
  const { id } = begun.body as UploadView;
  await agent.put(`/api/uploads/${id}/parts/0`).attach('file', bytes, fileName).expect(200);
  const completed = await agent.post(`/api/uploads/${id}/complete`).expect(202);
  return completed.body as UploadView;
}

/** Sends a file and waits until its pages are made or refused. */
export async function bringIn(server: TestServer, agent: Agent, batchId: string, fileName: string, bytes: Buffer): Promise<UploadView> {
  const { id } = await sendFile(agent, batchId, fileName, bytes);
  await server.context.jobs.settle();
  const { body } = await agent.get(`/api/uploads/${id}`).expect(200);
  return body as UploadView;
}
