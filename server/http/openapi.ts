import * as z from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint';
import { PROBLEMS, problem } from '#shared/contracts/problem';
import { declaredProblems } from './declared-problems';

type Json = Readonly<Record<string, unknown>>;

/** The OpenAPI 3.1 document, made of the very values that the server enforces and the client calls. */
export function openApiDocument(endpoints: readonly Endpoint[]): Json {
  const paths: Record<string, Record<string, Json>> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: operation(endpoint) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Wakeledger',
      version: '1',
      description: 'Every operation of the product, as the server holds it.',
    },
    paths,
    components: { schemas: { Problem: schema(problem, 'output') } },
  };
}

function operation(endpoint: Endpoint): Json {
  return {
    summary: endpoint.summary,
    'x-access': endpoint.access,
    parameters: [
      ...fields(endpoint.params).map(([name, value, _required]) => parameter('path', name, value, true)),
      ...fields(endpoint.query).map(([name, value, required]) => parameter('query', name, value, required)),
      ...(endpoint.command
        ? [header('Idempotency-Key', 'Chosen by the caller; the same key again gets the same answer.')]
        : []),
      ...(endpoint.versioned ? [header('If-Match', 'The version that was edited.')] : []),
    ],
    ...requestBody(endpoint),
    responses: {
      200: success(endpoint),
      ...problemResponses(endpoint),
    },
  };
}

const parameter = (place: 'path' | 'query', name: string, value: unknown, required: boolean): Json => ({
  name,
  in: place,
  required,
  schema: value,
});

const header = (name: string, description: string): Json => ({
  name,
  in: 'header',
  required: true,
  description,
  schema: { type: 'string' },
});

function requestBody(endpoint: Endpoint): Json {
  if (endpoint.method === 'GET') return {};
  if (endpoint.kind === 'upload') {
    const file = {
      type: 'object',
      properties: { file: { type: 'string', format: 'binary' } },
      required: ['file'],
    };
    return { requestBody: { required: true, content: { 'multipart/form-data': { schema: file } } } };
  }
  if (fields(endpoint.body).length === 0 && endpoint.body instanceof z.ZodObject) return {};
  return {
    requestBody: {
      required: true,
      content: { 'application/json': { schema: schema(endpoint.body, 'input') } },
    },
  };
}

function success(endpoint: Endpoint): Json {
  const content =
    endpoint.kind === 'download'
      ? { 'application/octet-stream': { schema: { type: 'string', format: 'binary' } } }
      : { 'application/json': { schema: schema(endpoint.response, 'output') } };
  return { description: 'Done', content };
}

function problemResponses(endpoint: Endpoint): Json {
  const byStatus = new Map<number, string[]>();
  for (const code of declaredProblems(endpoint)) {
    const { status } = PROBLEMS[code];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  const content = { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } };
  return Object.fromEntries(
    [...byStatus].map(([status, codes]) => [String(status), { description: codes.join(', '), content }]),
  );
}

function schema(type: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _version, ...rest } = z.toJSONSchema(type, { io, unrepresentable: 'throw' });
  return rest;
}

function fields(type: z.ZodType): readonly (readonly [string, unknown, boolean])[] {
  const { properties, required } = schema(type, 'input') as {
    readonly properties?: Json;
    readonly required?: readonly string[];
  };
  return Object.entries(properties ?? {}).map(([name, value]) => [
    name,
    value,
    required?.includes(name) ?? false,
  ]);
}
