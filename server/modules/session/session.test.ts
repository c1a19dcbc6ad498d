import { randomUUID } from 'node:crypto';
import supertest from 'supertest';
import type { SessionState } from '#shared/contracts/session';
import { type ApiHarness, startApi } from '../../testing/api-harness';
import { hashPassword } from './passwords';
import { tokenHash } from './session.repository';

const PASSWORD = 'a long enough passphrase';
let api: ApiHarness;
let email: string;
let slug: string;
let userId: string;

beforeAll(async () => {
  api = await startApi({ environment: { TRUSTED_PROXIES: '1', DEMO: '1' } });
  slug = api.first.slug;
  email = `aerodynamicist@${slug}.example`;
  userId = api.first.userIds.get('aerodynamicist') ?? '';
  await api.database.query('maintenance', 'update users set password_hash = $1 where id = $2', [
    await hashPassword(PASSWORD),
    userId,
  ]);
});
afterAll(() => api.close());

let address = 0;
/** Each caller from an address of its own, so that no test meets another's limits. */
const newAddress = () => `10.0.0.${(address += 1)}`;

function send(method: 'get' | 'post' | 'delete', path: string, from: string, cookie?: string) {
  const request = supertest(api.server)
    [method](path)
    .set('Origin', api.caller.origin)
    .set('X-Forwarded-For', from);
  return cookie === undefined ? request : request.set('Cookie', cookie);
}

const signIn = (from: string, body: object = {}, cookie?: string) =>
  send('post', '/api/v1/session/password', from, cookie).send({
    organisationSlug: slug,
    email,
    password: PASSWORD,
    ...body,
  });

const cookieOf = (answer: supertest.Response) => {
  const given: unknown = answer.headers['set-cookie'];
  return Array.isArray(given) ? String(given[0]).split(';')[0] : undefined;
};

describe('signing in with a password', () => {
  test('says who one is, where, and what that allows', async () => {
    const answer = await signIn(newAddress(), {
      email: email.toUpperCase(),
      organisationSlug: slug.toUpperCase(),
    });
    expect(answer.status).toBe(200);
    const { member } = answer.body as SessionState;
    expect(member).toMatchObject({ userId, role: 'aerodynamicist', organisationId: api.first.id });
    expect(member?.permissions).toContain('results.enter');
    expect(member?.memberships).toHaveLength(1);
  });

  test('gives a cookie that scripts cannot read and other sites do not send', async () => {
    const answer = await signIn(newAddress());
    expect(String(answer.headers['set-cookie'])).toMatch(/^wakeledger=.*Path=\/;.*HttpOnly; SameSite=Lax/);
  });

  test('starts a new session: one planted before is not the one that is signed in', async () => {
    const from = newAddress();
    const first = cookieOf(await signIn(from));
    const second = cookieOf(await signIn(from, {}, first));
    expect(second).not.toBe(first);
    const old = await send('get', '/api/v1/session', from, first);
    expect((old.body as SessionState).member).toBeUndefined();
    const current = await send('get', '/api/v1/session', from, second);
    expect((current.body as SessionState).member?.userId).toBe(userId);
  });

  test.each([
    ['a wrong password', { password: 'wrong' }],
    ['an unknown address', { email: 'nobody@example.org' }],
    ['an organisation that one does not belong to', { organisationSlug: 'elsewhere' }],
    ['a person without a password', { email: 'viewer' }],
  ] as readonly (readonly [name: string, change: { readonly email?: string }])[])(
    '%s is refused in the same words',
    async (_name, change) => {
      // The organisation's own addresses are not known before it has been founded.
      const body = change.email === 'viewer' ? { email: `viewer@${slug}.example` } : change;
      const answer = await signIn(newAddress(), body);
      expect(answer.status).toBe(401);
      expect(JSON.parse(answer.text)).toMatchObject({ code: 'sign-in-refused' });
      expect(JSON.parse(answer.text)).not.toHaveProperty('detail');
    },
  );

  test('a person of one organisation cannot sign in to another by naming it', async () => {
    expect((await signIn(newAddress(), { organisationSlug: api.second.slug })).status).toBe(401);
  });

  test('after eight wrong guesses the guesser waits, the colleague elsewhere does not', async () => {
    const guesser = newAddress();
    for (let guess = 0; guess < 8; guess += 1)
      expect((await signIn(guesser, { password: 'wrong' })).status).toBe(401);
    const blocked = await signIn(guesser);
    expect(blocked.status).toBe(429);
    expect(Number(blocked.headers['retry-after'])).toBeGreaterThan(0);
    expect((await signIn(newAddress())).status).toBe(200);
  });

  test('one address that guesses at many accounts waits too', async () => {
    const guesser = newAddress();
    const statuses: number[] = [];
    for (let account = 0; account < 62; account += 1) {
      const answer = await signIn(guesser, { email: `person${account}@example.org`, password: 'x' });
      statuses.push(answer.status);
    }
    expect(statuses.slice(0, 60).every((status) => status === 401)).toBe(true);
    expect(statuses.slice(60)).toEqual([429, 429]);
  }, 60_000);
});

test('an unknown account takes as long as a known one', async () => {
  const time = async (body: object) => {
    const times: number[] = [];
    for (let round = 0; round < 5; round += 1) {
      const started = performance.now();
      await signIn(newAddress(), { password: 'wrong', ...body });
      times.push(performance.now() - started);
    }
    return times.sort((a, b) => a - b)[2] ?? 0;
  };
  await time({});
  const known = await time({});
  const unknown = await time({ email: 'nobody@example.org' });
  // Without the decoy it would be some twenty times faster.
  expect(unknown / known).toBeGreaterThan(0.4);
}, 60_000);

test('signing out ends the session on the server, not only in the browser', async () => {
  const from = newAddress();
  const cookie = cookieOf(await signIn(from));
  expect((await send('delete', '/api/v1/session', from, cookie).send({})).status).toBe(200);
  const after = await send('get', '/api/v1/session', from, cookie);
  expect((after.body as SessionState).member).toBeUndefined();
});

describe('working in several organisations', () => {
  test('one switches to an organisation that one belongs to, and to no other', async () => {
    await api.database.query(
      'maintenance',
      `insert into memberships (organisation_id, user_id, organisation_kind, role, display_name, email)
       select $1, id, 'maker', 'viewer', display_name, email from users where id = $2`,
      [api.second.id, userId],
    );
    const from = newAddress();
    const cookie = cookieOf(await signIn(from));
    const there = await send('post', '/api/v1/session/organisation', from, cookie).send({
      organisationId: api.second.id,
    });
    expect((there.body as SessionState).member).toMatchObject({
      organisationId: api.second.id,
      role: 'viewer',
    });
    expect((there.body as SessionState).member?.permissions).not.toContain('results.enter');
    const nowhere = await send('post', '/api/v1/session/organisation', from, cookieOf(there)).send({
      organisationId: randomUUID(),
    });
    expect(nowhere.status).toBe(404);
  });

  test('a role that does not exist in the organisation’s kind cannot be held', async () => {
    const statement = `update memberships set role = 'supplier-engineer' where organisation_id = $1`;
    await expect(api.database.query('maintenance', statement, [api.first.id])).rejects.toMatchObject({
      code: '23514',
    });
    const kind = `update memberships set organisation_kind = 'supplier', role = 'supplier-engineer' where organisation_id = $1`;
    await expect(api.database.query('maintenance', kind, [api.first.id])).rejects.toMatchObject({
      code: '23503',
    });
  });
});

describe('the demo', () => {
  test('offers its people, and one continues as any of them', async () => {
    await api.database.query(
      'maintenance',
      `update users set demo = true, task = 'Look around.' where id = $1`,
      [userId],
    );
    const from = newAddress();
    const { body } = await send('get', '/api/v1/session', from);
    expect((body as SessionState).demoPeople).toEqual([
      expect.objectContaining({ userId, role: 'aerodynamicist', task: 'Look around.' }),
    ]);
    const answer = await send('post', '/api/v1/session/demo', from).send({ userId });
    expect((answer.body as SessionState).member?.userId).toBe(userId);
  });

  test('does not let one continue as a person who is not of the demo', async () => {
    const other = api.first.userIds.get('administrator');
    const answer = await send('post', '/api/v1/session/demo', newAddress()).send({ userId: other });
    expect(answer.status).toBe(404);
  });
});

test('outside the demo nobody is offered and nobody can be continued as', async () => {
  const plain = await startApi();
  await plain.database.query('maintenance', 'update users set demo = true');
  const state = await supertest(plain.server).get('/api/v1/session');
  const answer = await supertest(plain.server)
    .post('/api/v1/session/demo')
    .set('Origin', plain.caller.origin)
    .send({ userId: plain.first.userIds.get('viewer') });
  await plain.close();
  expect(state.body).toEqual({});
  expect(answer.status).toBe(404);
});

test('a one-time token sets one password, ends that person’s sessions, and is worth nothing afterwards', async () => {
  const from = newAddress();
  const cookie = cookieOf(await signIn(from));
  const token = randomUUID();
  await api.database.query(
    'maintenance',
    `insert into password_tokens (token_hash, user_id, expires_at) values ($1, $2, now() + interval '1 hour')`,
    [tokenHash(token), userId],
  );
  const set = (password: string) =>
    send('post', '/api/v1/session/password-setting', newAddress()).send({ token, password });
  const done = await set('another long passphrase');
  expect(done.body).toEqual({ email, organisationSlug: slug });
  expect((await set('a third long passphrase')).status).toBe(401);
  const old = await send('get', '/api/v1/session', from, cookie);
  expect((old.body as SessionState).member).toBeUndefined();
  expect((await signIn(newAddress(), { password: 'another long passphrase' })).status).toBe(200);
});
