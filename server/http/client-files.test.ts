import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { type ApiHarness, startApi } from '../testing/api-harness';

let api: ApiHarness;
let folder: string;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'wakeledger-client-'));
  writeFileSync(join(folder, 'index.html'), '<app-root ngCspNonce="CSP_NONCE"></app-root>');
  writeFileSync(join(folder, 'main-ABCD1234.js'), '1;');
  writeFileSync(join(folder, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  api = await startApi({ environment: { CLIENT_DIRECTORY: folder } });
});
afterAll(async () => {
  await api.close();
  rmSync(folder, { recursive: true, force: true });
});

const get = (path: string) => supertest(api.server).get(path);

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

test('a visitor who only looks gets no cookie', async () => {
  expect((await get('/api/v1/session')).headers['set-cookie']).toBeUndefined();
});
