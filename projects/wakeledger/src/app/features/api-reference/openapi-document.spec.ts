import { openApiDocument, operationGroups } from './openapi-document';

const DOCUMENT = openApiDocument.parse({
  openapi: '3.1.0',
  info: { title: 'Wakeledger', version: '1' },
  paths: {
    '/api/v1/cycles': {
      get: { summary: 'The traces', 'x-access': 'cycles.read', responses: { 200: { description: 'Done' } } },
    },
    '/api/v1/programmes/{programmeId}/variants': {
      post: {
        summary: 'Add a variant',
        parameters: [
          { name: 'programmeId', in: 'path', required: true, schema: { type: 'string', format: 'uuid' } },
        ],
        requestBody: { content: { 'application/json': { schema: { type: 'object' } } } },
        responses: {
          409: {
            content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
          },
        },
      },
    },
  },
});

describe('the page for scripts', () => {
  it('groups operations by what they are about', () => {
    expect(operationGroups(DOCUMENT).map(({ name }) => name)).toEqual(['cycles', 'variants']);
  });

  it('shows method, address, parameters and body of each', () => {
    expect(operationGroups(DOCUMENT)[1]?.operations[0]).toMatchObject({
      method: 'POST',
      path: '/api/v1/programmes/{programmeId}/variants',
      parameters: [{ name: 'programmeId', place: 'path', required: true, words: 'string, uuid' }],
      body: '{\n  "type": "object"\n}',
    });
  });

  it('does not repeat the Problem object under every refusal', () => {
    expect(operationGroups(DOCUMENT)[1]?.operations[0]?.answers).toEqual([
      { status: '409', words: '', schema: undefined },
    ]);
  });
});
