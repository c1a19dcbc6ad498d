import type { Proposal } from '#shared/contracts/proposals';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { lockProgramme } from '../programmes';
import { findResults, lockVariants } from '../results';
import { groundOf } from './ground';
import { holdChanges } from './held-changes';
import { movedGround, NEEDED_FOR } from './proposals.policy';
import {
  findProposal,
  insertDecision,
  type ProposalPlace,
  type StoredProposal,
} from './proposals.repository';
import { oneProposal } from './proposals.service';

/** An open proposal; two decisions about one programme wait for each other. */
async function openProposal(work: MemberContext, place: ProposalPlace): Promise<StoredProposal> {
  demandFound(await lockProgramme(work.tx, place.programmeId));
  const proposal = demandFound(await findProposal(work, place));
  const { decision } = proposal;
  if (decision !== undefined) {
    fail('wrong-state', {
      detail: `${decision.by} ${decision.verdict === 'accepted' ? 'accepted' : 'dropped'} this proposal already.`,
    });
  }
  return proposal;
}

async function end(
  work: MemberContext,
  proposal: StoredProposal,
  verdict: 'accepted' | 'dropped',
  comment: string,
): Promise<void> {
  if (!(await insertDecision(work, proposal.id, verdict, comment))) {
    fail('wrong-state', { detail: 'Somebody decided about this proposal just now.' });
  }
  await recordAudit(work, {
    action: `proposal.${verdict}`,
    entityKind: 'proposal',
    entityId: proposal.id,
    summary: [
      { field: 'title', after: proposal.title },
      { field: 'comment', after: comment },
    ],
  });
}

/** Nobody judges or adopts what the changes are about until the transaction ends. */
async function holdSubjects(
  work: MemberContext,
  programmeId: string,
  proposal: StoredProposal,
): Promise<void> {
  const resultIds = proposal.changes.flatMap((change) => ('resultId' in change ? [change.resultId] : []));
  const results = await findResults(work.tx, programmeId, [...new Set(resultIds)]);
  await lockVariants(work, programmeId, [
    ...results.map(({ variantId }) => variantId),
    ...proposal.changes.flatMap((change) => (change.kind === 'evidence' ? [change.variantId] : [])),
  ]);
}

/**
 * Lets every change hold, in this one transaction, by the services that do the same by hand.
 *
 * @throws {ProblemError} forbidden for the author; conflict where something moved since it was proposed, with all of it
 */
export async function acceptProposal(
  work: MemberContext,
  place: ProposalPlace,
  comment: string,
): Promise<Proposal> {
  const proposal = await openProposal(work, place);
  if (proposal.byYou) {
    fail('forbidden', { detail: 'A proposal is accepted by somebody else than who made it.' });
  }
  const { changes, outcome } = proposal;
  if (!changes.every(({ kind }) => work.may(NEEDED_FOR[kind]))) fail('forbidden');
  await holdSubjects(work, place.programmeId, proposal);
  const moved = movedGround(outcome.ground, await groundOf(work, place.programmeId, changes));
  const [first] = moved;
  if (first !== undefined) fail('conflict', { ...first, issues: [...moved] });
  await end(work, proposal, 'accepted', comment);
  await holdChanges(work, place.programmeId, changes, `${proposal.title}. ${proposal.comment}`);
  return oneProposal(work, place);
}

/** @throws {ProblemError} forbidden for a colleague’s proposal, where one may not accept it either */
export async function dropProposal(
  work: MemberContext,
  place: ProposalPlace,
  comment: string,
): Promise<Proposal> {
  const proposal = await openProposal(work, place);
  if (!proposal.byYou && !work.may('proposals.decide')) {
    fail('forbidden', { detail: 'A colleague’s proposal is dropped by who may accept it.' });
  }
  await end(work, proposal, 'dropped', comment);
  return oneProposal(work, place);
}
