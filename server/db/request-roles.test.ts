import { type TestDatabase, createTestDatabase } from '../testing/test-database';
import { openPools } from './pools';
import { assertRequestRoles } from './request-roles';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase();
});
afterAll(() => database.drop());

async function assertWith(tenantUrl: string, platformUrl: string): Promise<void> {
  const pools = openPools({ tenantUrl, platformUrl, maximumConnections: 1, onIdleError: () => undefined });
  try {
    await assertRequestRoles(pools);
  } finally {
    await pools.close();
  }
}

test('the two request logins are accepted', async () => {
  await expect(assertWith(database.url('tenant'), database.url('platform'))).resolves.toBeUndefined();
});

test('a superuser is refused', async () => {
  await expect(assertWith(database.superuserUrl, database.url('platform'))).rejects.toThrow('is a superuser');
});

test('a login that bypasses row-level security is refused', async () => {
  await expect(assertWith(database.url('tenant'), database.url('maintenance'))).rejects.toThrow(
    'bypasses row-level security',
  );
});

test('the owner is refused', async () => {
  await expect(assertWith(database.url('owner'), database.url('platform'))).rejects.toThrow(
    'owns the database',
  );
});
