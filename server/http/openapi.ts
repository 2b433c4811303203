import { z } from 'zod';
import { errorBody } from '../../shared/contracts/errors';
import type { RouteContract } from '../../shared/contracts/route';

type Json = Record<string, unknown>;

const asJsonSchema = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
};

function parameters(contract: RouteContract, place: 'path' | 'query'): Json[] {
  const schema = place === 'path' ? contract.params : contract.query;
  if (!schema) return [];
  const { properties = {}, required = [] } = asJsonSchema(schema, 'input') as { properties?: Record<string, Json>; required?: string[] };
  return Object.entries(properties).map(([name, value]) => ({ name, in: place, required: place === 'path' || required.includes(name), schema: value }));
}

function whoMay({ access }: RouteContract): string {
  if (access.who === 'course') return `Within the course: ${access.roles.join(', ')}.`;
  return access.who === 'anyone' ? 'Anyone.' : 'Anyone who is signed in.';
}

function operation(id: string, contract: RouteContract): Json {
  const status = String(contract.status ?? (contract.response ?? contract.bytes ? 200 : 204));
  const content = contract.bytes
    ? { [contract.bytes]: { schema: { type: 'string', format: 'binary' } } }
    : contract.response && { 'application/json': { schema: asJsonSchema(contract.response, 'output') } };
  const requestType = contract.accepts ?? 'application/json';
  return {
    operationId: id,
    summary: contract.summary,
    description: whoMay(contract),
    parameters: [...parameters(contract, 'path'), ...parameters(contract, 'query')],
    ...(contract.body && { requestBody: { required: true, content: { [requestType]: { schema: asJsonSchema(contract.body, 'input') } } } }),
    responses: {
      [status]: { description: 'As asked.', ...(content && { content }) },
      default: { description: 'An error.', content: { 'application/json': { schema: { $ref: '#/components/schemas/Error' } } } },
    },
    ...(contract.access.who === 'anyone' && { security: [] }),
  };
}

/** The interface as OpenAPI 3.1, made from the same contracts that check requests and responses. */
export function openApiDocument(contracts: Readonly<Record<string, RouteContract>>, version: string): Json {
  const paths: Record<string, Json> = {};
  for (const [id, contract] of Object.entries(contracts)) {
    const path = `/api${contract.path.replace(/:(\w+)/g, '{$1}')}`;
    paths[path] = { ...paths[path], [contract.method]: operation(id, contract) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Meniscus', version },
    paths,
    components: {
      schemas: { Error: asJsonSchema(errorBody, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'meniscus' } },
    },
    security: [{ session: [] }],
  };
}
