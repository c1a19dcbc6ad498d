import {
  proposalAccept,
  proposalDrop,
  proposalList,
  proposalMake,
  proposalRead,
} from '#shared/contracts/proposals';
import { route, type Route } from '../../http/module';
import { acceptProposal, dropProposal } from './decisions.service';
import { allProposals, makeProposal, oneProposal } from './proposals.service';

export const proposalsRoutes: readonly Route[] = [
  route(proposalList, async ({ params }, work) => ({
    proposals: [...(await allProposals(work, params.programmeId))],
  })),
  route(proposalRead, async ({ params }, work) => oneProposal(work, params)),
  route(proposalMake, async ({ params, body }, work) => makeProposal(work, params.programmeId, body)),
  route(proposalAccept, async ({ params, body }, work) => acceptProposal(work, params, body.comment)),
  route(proposalDrop, async ({ params, body }, work) => dropProposal(work, params, body.comment)),
];
