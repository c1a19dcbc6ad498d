import { and, desc, eq, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { ProposalOrder, ProposalOutcome, ProposalSummary } from '#shared/contracts/proposals';
import type { Work } from '../../http/context';
import { present } from '../../db/returned-row';
import { proposalDecisions, proposals } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';

/** Where a proposal stands: in which programme, under which id. */
export interface ProposalPlace {
  readonly programmeId: string;
  readonly proposalId: string;
}

/** A proposal as it is stored, with its end where it has one. */
export interface StoredProposal extends ProposalSummary {
  readonly outcome: ProposalOutcome;
}

const author = alias(memberships, 'author');
const decider = alias(memberships, 'decider');

async function select(work: Work, where: SQL | undefined): Promise<readonly StoredProposal[]> {
  const rows = await work.tx
    .select({
      proposal: proposals,
      by: author.displayName,
      decision: proposalDecisions,
      decidedBy: decider.displayName,
    })
    .from(proposals)
    .innerJoin(
      author,
      and(eq(author.organisationId, proposals.organisationId), eq(author.userId, proposals.createdBy)),
    )
    .leftJoin(
      proposalDecisions,
      and(
        eq(proposalDecisions.organisationId, proposals.organisationId),
        eq(proposalDecisions.proposalId, proposals.id),
      ),
    )
    .leftJoin(
      decider,
      and(
        eq(decider.organisationId, proposalDecisions.organisationId),
        eq(decider.userId, proposalDecisions.decidedBy),
      ),
    )
    .where(where)
    .orderBy(desc(proposals.createdAt), desc(proposals.id));
  return rows.map(({ proposal, by, decision, decidedBy }) => ({
    id: proposal.id,
    title: proposal.title,
    comment: proposal.comment,
    changes: [...proposal.changes],
    at: proposal.createdAt.toISOString(),
    by,
    byYou: proposal.createdBy === work.userId,
    state: decision?.verdict ?? 'open',
    ...(decision === null || decidedBy === null
      ? {}
      : {
          decision: {
            verdict: decision.verdict,
            comment: decision.comment,
            at: decision.decidedAt.toISOString(),
            by: decidedBy,
          },
        }),
    outcome: proposal.outcome,
  }));
}

/** Newest first. */
export async function listProposals(work: Work, programmeId: string): Promise<readonly StoredProposal[]> {
  return select(work, eq(proposals.programmeId, programmeId));
}

export async function findProposal(
  work: Work,
  { programmeId, proposalId }: ProposalPlace,
): Promise<StoredProposal | undefined> {
  const [proposal] = await select(
    work,
    and(eq(proposals.programmeId, programmeId), eq(proposals.id, proposalId)),
  );
  return proposal;
}

export async function insertProposal(
  { tx, userId, now }: Work,
  programmeId: string,
  { title, comment, changes }: Pick<ProposalOrder, 'title' | 'comment' | 'changes'>,
  outcome: ProposalOutcome,
): Promise<string> {
  const [row] = await tx
    .insert(proposals)
    .values({ programmeId, title, comment, changes, outcome, createdBy: userId, createdAt: now })
    .returning({ id: proposals.id });
  return present(row).id;
}

/** Ends a proposal. False where somebody else has ended it: there is one end for each. */
export async function insertDecision(
  { tx, userId, now }: Work,
  proposalId: string,
  verdict: 'accepted' | 'dropped',
  comment: string,
): Promise<boolean> {
  const rows = await tx
    .insert(proposalDecisions)
    .values({ proposalId, verdict, comment, decidedBy: userId, decidedAt: now })
    .onConflictDoNothing()
    .returning({ id: proposalDecisions.id });
  return rows.length > 0;
}
