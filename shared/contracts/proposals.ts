import * as z from 'zod';
import type { RankingComparison } from '#shared/core/ranking/ranking-comparison';
import { id, name, nothing, notNegative, programmeParams, timestamp } from './common';
import { endpoint } from './endpoint';
import { blockageMethod } from './facilities';
import { EVIDENCE_RULES, reason } from './judgements';
import { policyValues } from './policies';
import { rankingQuery, viewEvidence, viewExclusion, viewFigure, viewGroup } from './rankings';

const facilityChange = {
  blockage: blockageMethod.optional(),
  biasURelative: notNegative.max(1).optional(),
  sessionURelative: notNegative.max(1).optional(),
};
const frictionLine = z.enum(['on', 'off']);
const evidence = {
  variantId: id,
  resultIds: z.array(id).max(50).describe('Empty: rests on its newest usable result again'),
  rule: z.enum(EVIDENCE_RULES),
};

/** One change of judgement, tried without saving and proposed to a colleague. */
export const judgementChange = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('set-aside'), resultId: id, reason }),
  z.strictObject({ kind: z.literal('bring-back'), resultId: id }),
  z.strictObject({ kind: z.literal('include-not-comparable'), resultId: id, reason }),
  z.strictObject({ kind: z.literal('evidence'), ...evidence }),
  z.strictObject({ kind: z.literal('facility'), facilityId: id, ...facilityChange }),
  z.strictObject({ kind: z.literal('policies'), values: policyValues.partial() }),
  z.strictObject({ kind: z.literal('friction-line'), frictionLine }),
]);
export type JudgementChange = z.infer<typeof judgementChange>;

/** What a change was proposed on: what held of its subject then. Where it holds no more, nothing can be accepted. */
export const proposalGround = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('result'), resultId: id, name, judgementId: id.optional() }),
  z.strictObject({ kind: z.literal('evidence'), ...evidence, name, adoptionId: id.optional() }),
  z.strictObject({
    kind: z.literal('facility'),
    facilityId: id,
    name,
    number: z.int().min(1).describe('The version of corrections and uncertainties'),
    ...facilityChange,
  }),
  z.strictObject({ kind: z.literal('policies'), number: z.int().min(0), values: policyValues }),
  z.strictObject({ kind: z.literal('friction-line'), frictionLine }),
]);
export type ProposalGround = z.infer<typeof proposalGround>;

const text = z.string();
const standing = z.strictObject({
  rank: z.int(),
  figure: viewFigure,
  coefficient: z.number(),
  evidence: z.array(viewEvidence),
});
const evidenceChange = z.strictObject({ variantId: text, variantName: text, evidence: viewEvidence });

/** Typed by the core, so that lists are read-only on both sides. */
export const rankingComparison: z.ZodType<RankingComparison, RankingComparison> = z.strictObject({
  moves: z.array(
    z.strictObject({
      variantId: text,
      name: text,
      before: standing.nullable(),
      after: standing.nullable(),
      places: z.int(),
      shiftM2: z.number().nullable(),
      moved: z.boolean(),
    }),
  ),
  probabilities: z.array(
    z.strictObject({
      lowerId: text,
      lowerName: text,
      higherId: text,
      higherName: text,
      before: z.number().nullable(),
      after: z.number(),
    }),
  ),
  bracketsGained: z.array(viewGroup),
  bracketsLost: z.array(viewGroup),
  entering: z.array(evidenceChange),
  leaving: z.array(evidenceChange),
  exclusionsGained: z.array(viewExclusion),
  exclusionsLost: z.array(viewExclusion),
  changed: z.boolean(),
});

/** What a proposal came to when it was made, under which choices of the ranking, and what it stood on. */
export const proposalOutcome = z.strictObject({
  query: rankingQuery,
  comparison: rankingComparison,
  ground: z.array(proposalGround),
  /** Names of the results that evidence names, as they were. */
  resultNames: z.array(z.strictObject({ resultId: id, name })),
});
export type ProposalOutcome = z.infer<typeof proposalOutcome>;

const decision = z.strictObject({
  verdict: z.enum(['accepted', 'dropped']),
  comment: text,
  at: timestamp,
  by: name,
});

export const PROPOSAL_STATES = ['open', 'accepted', 'dropped'] as const;

export const proposalSummary = z.strictObject({
  id,
  title: text,
  comment: text,
  changes: z.array(judgementChange),
  at: timestamp,
  by: name,
  byYou: z.boolean(),
  state: z.enum(PROPOSAL_STATES),
  decision: decision.optional(),
});
export type ProposalSummary = z.infer<typeof proposalSummary>;

/** What is not as it was when the change was proposed. */
const groundMove = z.strictObject({
  where: text.describe('`changes.<position>`'),
  detail: text,
});

export const proposal = proposalSummary.extend({
  outcome: proposalOutcome,
  /** Open ones only: what it would come to today. Absent too where nothing can be ranked today. */
  now: rankingComparison.optional(),
  moved: z.array(groundMove).describe('Empty: everything is as it was proposed on'),
});
export type Proposal = z.infer<typeof proposal>;

const proposalParams = programmeParams.extend({ proposalId: id });

export const proposalList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/proposals',
  summary: 'Changes of judgement that were put before colleagues, newest first',
  access: 'proposals.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ proposals: z.array(proposalSummary) }),
  command: false,
  versioned: false,
  problems: [],
});

export const proposalRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/proposals/:proposalId',
  summary: 'One proposal: what changes, what the proposer saw, and what it would come to today',
  access: 'proposals.read',
  params: proposalParams,
  query: nothing,
  body: nothing,
  response: proposal,
  command: false,
  versioned: false,
  problems: [],
});

const seenFigure = z.strictObject({ variantId: id, dragAreaM2: z.number() });

export const proposalMake = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/proposals',
  summary:
    'Put changes of judgement before a colleague. The ranking is computed again here; where it is not what the person saw, it is a conflict',
  access: 'proposals.make',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({
    title: z.string().trim().min(3).max(120),
    comment: z.string().trim().min(3).max(800),
    changes: z.array(judgementChange).min(1).max(100),
    query: rankingQuery.describe('The choices that the ranking was seen with'),
    seen: z.strictObject({
      before: z.array(seenFigure).max(1000).describe('In the order of the ranking'),
      after: z.array(seenFigure).max(1000),
    }),
  }),
  response: proposal,
  command: true,
  versioned: false,
  problems: ['conflict', 'wrong-state', 'unusable-input', 'method-refused'],
});
export type ProposalOrder = z.output<(typeof proposalMake)['body']>;

export const proposalAccept = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/proposals/:proposalId/acceptance',
  summary:
    'Let every change of a colleague’s proposal hold, all or none. What moved since it was proposed is a conflict',
  access: 'proposals.decide',
  params: proposalParams,
  query: nothing,
  body: z.strictObject({ comment: reason }),
  response: proposal,
  command: true,
  versioned: false,
  problems: ['conflict', 'wrong-state', 'unusable-input', 'already-exists', 'method-refused'],
});

export const proposalDrop = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/proposals/:proposalId/drop',
  summary: 'Drop a proposal: one’s own, or a colleague’s by whoever may accept it',
  access: 'proposals.make',
  params: proposalParams,
  query: nothing,
  body: z.strictObject({ comment: reason }),
  response: proposal,
  command: true,
  versioned: false,
  problems: ['conflict', 'wrong-state'],
});
