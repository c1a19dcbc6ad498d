import { checkGrants } from './check-grants';
import { checkKeys } from './check-keys';
import { checkPolicies, checkTables, type Queryable } from './check-tables';

/**
 * Reads the catalogue, as the owner or the maintenance login, and returns everything that could let one organisation
 * see, change or infer another's rows. Empty is good.
 */
export async function checkRowSecurity(client: Queryable): Promise<readonly string[]> {
  return [
    ...(await checkTables(client)),
    ...(await checkPolicies(client)),
    ...(await checkKeys(client)),
    ...(await checkGrants(client)),
  ];
}
