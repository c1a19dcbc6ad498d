import type { Tx } from '../../db/pools';
import { fail } from '../../http/problem-error';
import { readMembers, readOwnOrganisation } from './organisations.repository';

/** @throws {ProblemError} not-found */
export async function ownOrganisation(tx: Tx) {
  return (await readOwnOrganisation(tx)) ?? fail('not-found');
}

/** Everybody who belongs or belonged to the organisation, as the contract writes them. */
export async function members(tx: Tx) {
  return (await readMembers(tx)).map(({ since, endedAt, ...member }) => ({
    ...member,
    since: since.toISOString(),
    endedAt: endedAt?.toISOString(),
  }));
}
