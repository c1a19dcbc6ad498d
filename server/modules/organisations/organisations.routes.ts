import { memberList, organisationRead } from '#shared/contracts/organisations';
import { route } from '../../http/module';
import { members, ownOrganisation } from './organisations.service';

export const organisationsRoutes = [
  route(organisationRead, async (_input, { tx }) => ownOrganisation(tx)),
  route(memberList, async (_input, { tx }) => ({ members: await members(tx) })),
];
