import { type TestDatabase, createTestDatabase } from '../../testing/test-database';
import type { DatabaseUrls } from './database';
import { requireDatabase } from './external-database';

let database: TestDatabase;
let urls: DatabaseUrls;
beforeAll(async () => {
  database = await createTestDatabase();
  const url = (role: keyof DatabaseUrls) => database.url(role);
  urls = {
    owner: url('owner'),
    maintenance: url('maintenance'),
    tenant: url('tenant'),
    platform: url('platform'),
  };
});
afterAll(() => database.drop());

const changed = (role: keyof DatabaseUrls, change: object): DatabaseUrls => ({
  ...urls,
  [role]: Object.assign(new URL(urls[role]), change).href,
});

test('a server with its four logins and its database is taken', async () => {
  await expect(requireDatabase(urls)).resolves.toBeUndefined();
});

test.each<
  readonly [
    name: string,
    change: Readonly<Partial<Record<'password' | 'pathname' | 'port', string>>>,
    words: RegExp,
  ]
>([
  ['another password', { password: 'guess' }, /DATABASE_URL_TENANT: the server refuses/],
  ['a database that is not there', { pathname: '/nowhere' }, /there is no database nowhere/],
  ['a port where nobody listens', { port: '1' }, /no server answers at 127\.0\.0\.1:1\./],
])('%s is said with the variable, and what to run', async (_name, change, words) => {
  const refused = requireDatabase(changed('tenant', change));
  await expect(refused).rejects.toThrow(words);
  await expect(refused).rejects.toThrow('npm run database:prepare');
});

test('a login of another role is not taken, and every fault is named at once', async () => {
  const refused = requireDatabase({ ...urls, owner: urls.tenant, maintenance: urls.platform });
  await expect(refused).rejects.toThrow('DATABASE_URL_OWNER must be the login wakeledger_owner');
  await expect(refused).rejects.toThrow('DATABASE_URL_MAINTENANCE must be the login wakeledger_maintenance');
});
