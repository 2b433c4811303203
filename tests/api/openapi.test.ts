import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { allRoutes } from '../../shared/contracts/all-routes';
import { startTestServer, type TestServer } from '../support/test-server';

interface Operation {
  readonly operationId: string;
  readonly parameters: readonly { readonly name: string; readonly in: string }[];
  readonly responses: Readonly<Record<string, unknown>>;
}

describe('the description of the interface', () => {
  let server: TestServer;
  beforeAll(async () => void (server = await startTestServer()));
  afterAll(() => server.close());

  it('names every route once, with each name of its address declared and an error described', async () => {
    const { body } = await server.nobody().get('/api/openapi.json').expect(200);
    expect(body.openapi).toBe('3.1.0');
    const paths = Object.entries(body.paths as Record<string, Record<string, Operation>>);
    const operations = paths.flatMap(([path, methods]) => Object.values(methods).map((operation) => ({ path, operation })));
    expect(operations.map(({ operation }) => operation.operationId).sort()).toEqual(Object.keys(allRoutes).sort());
    for (const { path, operation } of operations) {
      const named = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
      const declared = operation.parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => name);
      expect(declared.sort(), path).toEqual(named.sort());
      expect(operation.responses, path).toHaveProperty('default');
    }
  });

  it('says that it is up and ready', async () => {
    await server.nobody().get('/api/health').expect(200);
    await server.nobody().get('/api/ready').expect(200);
  });
});
