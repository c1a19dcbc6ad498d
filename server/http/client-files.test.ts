import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import supertest from 'supertest';
import { type ApiHarness, startApi } from '../testing/api-harness';

const SCRIPT = 'export const word = 1;'.repeat(200);
let api: ApiHarness;
let folder: string;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'wakeledger-client-'));
  writeFileSync(join(folder, 'index.html'), '<app-root ngCspNonce="CSP_NONCE"></app-root>');
  writeFileSync(join(folder, 'main-ABCD1234.js'), '1;');
  writeFileSync(join(folder, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  writeFileSync(join(folder, 'chunk-EFGH5678.js'), SCRIPT);
  writeFileSync(join(folder, 'chunk-EFGH5678.js.br'), brotliCompressSync(SCRIPT));
  writeFileSync(join(folder, 'chunk-EFGH5678.js.gz'), gzipSync(SCRIPT));
  api = await startApi({ environment: { CLIENT_DIRECTORY: folder } });
});
afterAll(async () => {
  await api.close();
  rmSync(folder, { recursive: true, force: true });
});

const get = (path: string) => supertest(api.server).get(path);
/** With the bytes as they were before they were compressed, whatever their type. */
const getRaw = (path: string, encodings: string) =>
  get(path)
    .set('Accept-Encoding', encodings)
    .buffer(true)
    .parse((res, done) => {
      const parts: Buffer[] = [];
      res.on('data', (part: Buffer) => parts.push(part));
      res.on('end', () => done(null, Buffer.concat(parts)));
    });

test.each(['/', '/index.html', '/programmes/abc/ranking?order=energy'])(
  '%s is the page, with a nonce of this answer alone in the page and in the policy',
  async (path) => {
    const [first, second] = [await get(path), await get(path)];
    const nonce = /ngCspNonce="([^"]+)"/.exec(first.text)?.[1] ?? 'none';
    expect(first.headers['content-security-policy']).toBe(
      `default-src 'none';script-src 'self';style-src 'self' 'nonce-${nonce}';img-src 'self' data:;font-src 'self';` +
        `connect-src 'self';base-uri 'self';form-action 'self';frame-ancestors 'none'`,
    );
    expect(first.headers['cache-control']).toBe('no-store');
    expect(second.text).not.toContain(nonce);
  },
);

test('a file named after its content may be kept for ever, any other is asked for again', async () => {
  expect((await get('/main-ABCD1234.js')).headers['cache-control']).toBe(
    'public, max-age=31536000, immutable',
  );
  expect((await get('/favicon.svg')).headers['cache-control']).toBe('no-cache');
});

test.each(['/main-00000000.js', '/api/v1/elsewhere', '/..%2f..%2fpackage.json'])(
  '%s is missing, and no page stands in for it',
  async (path) => {
    const answer = await get(path);
    expect(answer.status).toBe(404);
    expect(JSON.parse(answer.text)).toMatchObject({ code: 'not-found' });
  },
);

test('a file travels in the form that the build laid beside it, under its own type and name', async () => {
  const answer = await getRaw('/chunk-EFGH5678.js', 'gzip, deflate, br');
  expect(answer.headers).toMatchObject({
    'content-encoding': 'br',
    'content-type': 'text/javascript; charset=utf-8',
    'cache-control': 'public, max-age=31536000, immutable',
    vary: 'Accept-Encoding',
  });
  expect((answer.body as Buffer).toString()).toBe(SCRIPT);
});

test.each([
  ['gzip', 'gzip'],
  ['br;q=0, gzip', 'gzip'],
  ['identity', undefined],
])('a browser that reads %s is sent nothing else', async (accepted, encoding) => {
  const answer = await getRaw('/chunk-EFGH5678.js', accepted);
  expect(answer.status).toBe(200);
  expect(answer.headers['content-encoding']).toBe(encoding);
  expect(answer.headers['vary']).toBe('Accept-Encoding');
});

test('a browser that kept a compressed file is told that it is still the same', async () => {
  const first = await getRaw('/chunk-EFGH5678.js', 'br');
  const again = await get('/chunk-EFGH5678.js')
    .set('Accept-Encoding', 'br')
    .set('If-None-Match', String(first.headers['etag']));
  expect(again.status).toBe(304);
});

test('a long answer of the API is compressed, a short one is not', async () => {
  const long = await getRaw('/api/v1/openapi.json', 'gzip');
  expect(long.headers['content-encoding']).toBe('gzip');
  expect((await getRaw('/healthz', 'gzip')).headers['content-encoding']).toBeUndefined();
});

test('a visitor who only looks gets no cookie', async () => {
  expect((await get('/api/v1/session')).headers['set-cookie']).toBeUndefined();
});
