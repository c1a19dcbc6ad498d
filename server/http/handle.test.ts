import { randomUUID } from 'node:crypto';
import { sql } from 'drizzle-orm';
import supertest from 'supertest';
import * as z from 'zod';
import { name, nothing } from '#shared/contracts/common';
import { type Endpoint, endpoint } from '#shared/contracts/endpoint';
import { refuse } from '#shared/core/refusal';
import { counters } from '../db/tables/work';
import { type ApiHarness, startApi } from '../testing/api-harness';
import type { ApiMember } from '../testing/as-member';
import { downloadRoute, route, uploadRoute } from './module';
import { fail } from './problem-error';

const base = {
  kind: 'json' as const,
  access: 'programmes.edit' as const,
  params: nothing,
  query: nothing,
  body: nothing,
  versioned: false,
  problems: [],
};
const read = endpoint({
  ...base,
  method: 'GET',
  path: '/api/v1/try/read',
  summary: 'Tries to write while reading',
  response: nothing,
  command: false,
});
const count = endpoint({
  ...base,
  method: 'POST',
  path: '/api/v1/try/count',
  summary: 'Counts how often it was carried out',
  body: z.strictObject({ name }),
  response: z.strictObject({ value: z.int() }),
  command: true,
  problems: ['already-exists'],
});
const edit = endpoint({
  ...base,
  method: 'PUT',
  path: '/api/v1/try/edit',
  summary: 'Edits version 3',
  response: z.strictObject({ version: z.int() }),
  command: true,
  versioned: true,
});
const misbehave = endpoint({
  ...base,
  method: 'POST',
  path: '/api/v1/try/misbehave',
  summary: 'Fails in the way that is asked for',
  body: z.strictObject({ how: z.string() }),
  response: nothing,
  command: true,
  problems: ['method-refused', 'already-exists'],
});
const upload = endpoint({
  ...base,
  kind: 'upload',
  method: 'POST',
  path: '/api/v1/try/upload',
  summary: 'Takes up to 1 kB',
  response: z.strictObject({ fileName: z.string(), bytes: z.int(), sha256: z.string() }),
  command: true,
});
const download = endpoint({
  ...base,
  kind: 'download',
  method: 'GET',
  path: '/api/v1/try/download',
  summary: 'Gives a file',
  response: nothing,
  command: false,
});

const once = route(count, async ({ body }, { tx }) => {
  const [row] = await tx
    .insert(counters)
    .values({ series: body.name, value: 1 })
    .onConflictDoUpdate({
      target: [counters.organisationId, counters.series],
      set: { value: sql`${counters.value} + 1` },
    })
    .returning({ value: counters.value });
  return { value: row?.value ?? 0 };
});

const routes = [
  once,
  route(read, async (_input, { tx }) => {
    await tx.insert(counters).values({ series: 'written while reading', value: 1 });
    return {};
  }),
  route(edit, async ({ expectedVersion }) =>
    expectedVersion === 3 ? { version: 4 } : fail('conflict', { currentVersion: 3 }),
  ),
  route(misbehave, async ({ body }, { tx }) => {
    await tx.insert(counters).values({ series: `left behind by ${body.how}`, value: 1 });
    if (body.how === 'refusal') refuse('not-positive', 'area.value', 'must be above 0');
    if (body.how === 'double')
      await tx.insert(counters).values({ series: 'left behind by double', value: 1 });
    if (body.how === 'undeclared') fail('still-in-use');
    if (body.how === 'reply') return JSON.parse('{"secret":1}') as Record<string, never>;
    throw new Error('secret detail of the inside');
  }),
  uploadRoute(upload, 1024, async ({ file }) => ({
    fileName: file.fileName,
    bytes: file.content.length,
    sha256: file.sha256,
  })),
  downloadRoute(download, async () => ({
    fileName: 'Übersicht "1".csv',
    mediaType: 'text/csv',
    body: 'a;b',
  })),
];

let api: ApiHarness;
let member: ApiMember;
beforeAll(async () => {
  api = await startApi({ modules: [{ name: 'try', routes }] });
  member = await api.asMember('aerodynamicist');
});
afterAll(() => api.close());

const raw = (target: Endpoint) =>
  supertest(api.server)
    [target.method.toLowerCase() as 'post' | 'put'](target.path)
    .set('Origin', api.caller.origin);

describe('who may', () => {
  test('nobody without a session', async () => {
    expect(await api.asVisitor().refused(count, { body: { name: 'x' } })).toMatchObject({
      code: 'not-signed-in',
    });
  });

  test('nobody whose role does not include it', async () => {
    const viewer = await api.asMember('viewer');
    expect(await viewer.refused(count, { body: { name: 'x' } })).toMatchObject({ code: 'forbidden' });
  });

  test('nobody whose membership has ended, from that moment on', async () => {
    const leaver = await api.asMember('programme-manager', api.second);
    await leaver.ok(count, { body: { name: 'before' } });
    await api.database.query('maintenance', 'update memberships set ended_at = now() where user_id = $1', [
      leaver.userId,
    ]);
    expect(await leaver.refused(count, { body: { name: 'after' } })).toMatchObject({ code: 'not-signed-in' });
  });

  test.each([
    undefined,
    'null',
    'http://evil.example',
    'http://wakeledger.test.evil.example',
    'https://wakeledger.test',
  ])('a change from the origin %s is not carried out', async (origin) => {
    const request = supertest(api.server).post(count.path);
    if (origin !== undefined) request.set('Origin', origin);
    const answer = await request.send({ name: 'x' });
    expect(answer.status).toBe(403);
    expect(JSON.parse(answer.text)).toMatchObject({ code: 'origin-refused' });
  });
});

describe('what comes in', () => {
  test('a body of another form is refused with the place of each mistake', async () => {
    const problem = await member.refused(count, { body: { name: '', more: 1 } });
    expect(problem).toMatchObject({ code: 'malformed-input', status: 400 });
    expect(problem.issues?.map((issue) => issue.where)).toEqual(
      expect.arrayContaining(['body.name', 'body']),
    );
  });

  test('text that is not JSON is refused without an echo of it', async () => {
    const answer = await raw(count).set('Content-Type', 'application/json').send('{"name": <script>');
    expect(answer.status).toBe(400);
    expect(answer.text).not.toContain('script');
  });

  test('a body beyond 2 MB is refused', async () => {
    const problem = await member.refused(count, { body: { name: 'x'.repeat(2_200_000) } });
    expect(problem.code).toBe('too-large');
  });

  test('an address outside the product is answered as a Problem', async () => {
    const answer = await supertest(api.server).get('/api/v1/nothing');
    expect(answer.status).toBe(404);
    expect(JSON.parse(answer.text)).toMatchObject({ code: 'not-found' });
  });
});

describe('commands', () => {
  test('the same key again gets the same answer and is carried out once', async () => {
    const key = randomUUID();
    const input = { key, body: { name: 'once' } };
    expect(await member.ok(count, input)).toEqual({ value: 1 });
    expect(await member.ok(count, input)).toEqual({ value: 1 });
    expect(await member.ok(count, { body: { name: 'once' } })).toEqual({ value: 2 });
  });

  test('ten at once with one key are carried out once', async () => {
    const key = randomUUID();
    const answers = await Promise.all(
      Array.from({ length: 10 }, () => member.call(count, { key, body: { name: 'at once' } })),
    );
    expect(new Set(answers.map((answer) => answer.status))).toEqual(
      new Set(answers.some((answer) => answer.status === 409) ? [200, 409] : [200]),
    );
    expect(await member.ok(count, { body: { name: 'at once' } })).toEqual({ value: 2 });
  });

  test('the same key with another content is refused', async () => {
    const key = randomUUID();
    await member.ok(count, { key, body: { name: 'first' } });
    expect(await member.refused(count, { key, body: { name: 'second' } })).toMatchObject({
      code: 'idempotency-key-reused',
    });
  });

  test('another person’s equal key is another command', async () => {
    const key = randomUUID();
    const colleague = await api.asMember('programme-manager');
    await member.ok(count, { key, body: { name: 'shared key' } });
    expect(await colleague.ok(count, { key, body: { name: 'shared key' } })).toEqual({ value: 2 });
  });

  test('a command without a key is refused', async () => {
    const bare = { ...count, command: false };
    expect(await member.refused(bare, { body: { name: 'x' } })).toMatchObject({
      code: 'idempotency-key-missing',
    });
  });

  test('an edit without the version that was edited is refused', async () => {
    expect(await member.refused(edit)).toMatchObject({ code: 'precondition-missing', status: 428 });
  });

  test('an edit of an older version is refused with the version that stands', async () => {
    expect(await member.refused(edit, { ifMatch: 2 })).toMatchObject({ code: 'conflict', currentVersion: 3 });
  });

  test('an edit answers with the new version as its ETag', async () => {
    const answer = await member.call(edit, { ifMatch: 3 });
    expect(answer.headers['etag']).toBe('"4"');
  });
});

describe('failures', () => {
  const leftBehind = async (how: string) =>
    (
      await api.database.query('superuser', 'select from counters where series = $1', [
        `left behind by ${how}`,
      ])
    ).length;

  test('a refusal of the method keeps its code, place and words, and undoes the rest', async () => {
    expect(await member.refused(misbehave, { body: { how: 'refusal' } })).toMatchObject({
      code: 'method-refused',
      status: 422,
      reason: 'not-positive',
      where: 'area.value',
      detail: 'must be above 0',
    });
    expect(await leftBehind('refusal')).toBe(0);
  });

  test('a name that exists is said to exist, without the name of a constraint', async () => {
    const answer = await member.call(misbehave, { body: { how: 'double' } });
    expect(answer.status).toBe(409);
    expect(answer.text).not.toMatch(/counters|_key/);
  });

  test('what nobody expected is a 500 with the request’s id and nothing of the inside', async () => {
    const quiet = jest.spyOn(process.stderr, 'write').mockReturnValue(true);
    const answer = await member.call(misbehave, { body: { how: 'throw' } });
    quiet.mockRestore();
    expect(answer.status).toBe(500);
    expect(answer.text).not.toContain('secret');
    expect(JSON.parse(answer.text)).toEqual({
      type: '/problems/internal-error',
      title: 'Something went wrong on our side.',
      status: 500,
      code: 'internal-error',
      requestId: answer.headers['x-request-id'],
    });
    expect(await leftBehind('throw')).toBe(0);
  });

  test.each(['undeclared', 'reply'])(
    'in tests, breaking the contract (%s) is a failure of ours',
    async (how) => {
      const quiet = jest.spyOn(process.stderr, 'write').mockReturnValue(true);
      const answer = await member.call(misbehave, { body: { how } });
      quiet.mockRestore();
      expect(answer.status).toBe(500);
    },
  );

  test('a GET cannot write', async () => {
    const quiet = jest.spyOn(process.stderr, 'write').mockReturnValue(true);
    const answer = await member.call(read);
    quiet.mockRestore();
    expect(answer.status).toBe(500);
    expect(await leftBehind('reading')).toBe(0);
  });
});

describe('files', () => {
  test('a file arrives whole, its name stripped of any path', async () => {
    const file = { name: '../../etc/Prüfstand.csv', content: 'a;b\n' };
    expect(await member.ok(upload, { file })).toMatchObject({ fileName: 'Prüfstand.csv', bytes: 4 });
  });

  test('a file beyond the limit is refused after it was read to the end, and kept nowhere', async () => {
    const file = { name: 'large.csv', content: Buffer.alloc(3_000_000, 'x') };
    expect(await member.refused(upload, { file })).toMatchObject({ code: 'too-large', where: 'body.file' });
  });

  test('a body that is not multipart is refused', async () => {
    expect(await member.refused(upload, { body: {} })).toMatchObject({ code: 'malformed-input' });
  });

  test('a stranger’s upload is refused before it is read', async () => {
    const viewer = await api.asMember('viewer');
    const file = { name: 'large.csv', content: Buffer.alloc(100, 'x') };
    expect(await viewer.refused(upload, { file })).toMatchObject({ code: 'forbidden' });
  });

  test('a download is offered for saving and can run nothing', async () => {
    const answer = await member.call(download);
    expect(answer.headers['content-disposition']).toMatch(/^attachment; /);
    expect(answer.headers['content-security-policy']).toBe("default-src 'none'; sandbox");
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
    expect(answer.text).toBe('a;b');
  });
});
