import { memberList, organisationRead } from '#shared/contracts/organisations';
import { route } from '../../http/module';
import { fail } from '../../http/problem-error';
import { readMembers, readOwnOrganisation } from './organisations.repository';

export const organisationsRoutes = [
  route(organisationRead, async (_input, { tx }) => (await readOwnOrganisation(tx)) ?? fail('not-found')),
  route(memberList, async (_input, { tx }) => ({
    members: (await readMembers(tx)).map(({ since, endedAt, ...member }) => ({
      ...member,
      since: since.toISOString(),
      endedAt: endedAt?.toISOString(),
    })),
  })),
];
