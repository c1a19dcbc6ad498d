import type { Proposal, ProposalOrder, ProposalSummary } from '#shared/contracts/proposals';
import { compareRankings } from '#shared/core/ranking/ranking-comparison';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound, refuseUnusable } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { programmeExists } from '../programmes';
import { groundOf } from './ground';
import { comparisonNow, outcomeOf, type Outcome } from './outcome';
import { changeIssues, movedGround, sawTheSame } from './proposals.policy';
import { findProposal, insertProposal, listProposals, type ProposalPlace } from './proposals.repository';

export async function allProposals(
  work: MemberContext,
  programmeId: string,
): Promise<readonly ProposalSummary[]> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  const proposals = await listProposals(work, programmeId);
  return proposals.map(({ outcome: _outcome, ...summary }) => summary);
}

/** One proposal; what is open is compared with today. */
export async function oneProposal(work: MemberContext, place: ProposalPlace): Promise<Proposal> {
  const proposal = demandFound(await findProposal(work, place));
  if (proposal.state !== 'open') return { ...proposal, moved: [] };
  const { changes, outcome } = proposal;
  return {
    ...proposal,
    now: await comparisonNow(work, place.programmeId, changes, outcome.query),
    moved: [...movedGround(outcome.ground, await groundOf(work, place.programmeId, changes))],
  };
}

/** Names of the results that changes of evidence name. */
function resultNames(
  changes: ProposalOrder['changes'],
  { sources }: Outcome,
): { readonly resultId: string; readonly name: string }[] {
  const ids = new Set(changes.flatMap((change) => (change.kind === 'evidence' ? change.resultIds : [])));
  return sources.inputs.results
    .filter(({ id }) => ids.has(id))
    .map(({ id, name }) => ({ resultId: id, name: name ?? id }));
}

/**
 * Stores changes with what they come to, worked out here: what the browser showed is only held against it, so that
 * nobody proposes on a ranking that has moved under their hands.
 */
export async function makeProposal(
  work: MemberContext,
  programmeId: string,
  order: ProposalOrder,
): Promise<Proposal> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  const outcome = await outcomeOf(work, programmeId, order.changes, order.query);
  if (outcome.changed.withoutSubject.length > 0) fail('not-found');
  refuseUnusable(changeIssues(order.changes, outcome.sources.context));
  if (!sawTheSame(order.seen, outcome.before, outcome.after)) {
    fail('conflict', {
      where: 'seen',
      detail: 'The ranking moved since you looked: results, judgements or limits are others now. Look again.',
    });
  }
  const ground = await groundOf(work, programmeId, order.changes);
  const proposalId = await insertProposal(work, programmeId, order, {
    query: order.query,
    comparison: compareRankings(outcome.before, outcome.after),
    ground: ground.map(({ holds }) => holds),
    resultNames: resultNames(order.changes, outcome),
  });
  await recordAudit(work, {
    action: 'proposal.made',
    entityKind: 'proposal',
    entityId: proposalId,
    summary: [
      { field: 'title', after: order.title },
      { field: 'changes', after: order.changes },
    ],
  });
  return oneProposal(work, { programmeId, proposalId });
}
