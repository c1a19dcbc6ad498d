import supertest from 'supertest';
import { type ApiHarness, startApi } from '../testing/api-harness';

let api: ApiHarness;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

test('the process says that it is alive', async () => {
  const answer = await supertest(api.server).get('/healthz');
  expect(answer.status).toBe(200);
  expect(answer.body).toEqual({ status: 'alive' });
});

test('it is ready while the database stands at this version’s migrations', async () => {
  const answer = await supertest(api.server).get('/readyz');
  expect(answer.text).toBe('{"status":"ready"}');
});

test('it is not ready, and says so as a Problem, when a migration is missing', async () => {
  await api.database.query(
    'superuser',
    'update drizzle.__drizzle_migrations set created_at = created_at - 1',
  );
  const answer = await supertest(api.server).get('/readyz');
  expect(answer.status).toBe(503);
  expect(answer.headers['content-type']).toMatch('application/problem+json');
  expect(JSON.parse(answer.text)).toMatchObject({ code: 'not-ready', type: '/problems/not-ready' });
});
