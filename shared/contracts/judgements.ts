import * as z from 'zod';
import { id, name, nothing, programmeParams, remark, timestamp } from './common';
import { endpoint } from './endpoint';

/** How the evidence of a variant is formed from its adopted results (method section 10). */
export const EVIDENCE_RULES = ['newest', 'weighted-mean'] as const;

/** How a result is brought to the reference Reynolds number (method section 6). */
export const reynoldsChoice = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('friction-line') }),
  z.strictObject({ kind: z.literal('own-sweep') }),
  z.strictObject({ kind: z.literal('sweep-of'), resultId: id }),
]);
export type ReynoldsChoice = z.infer<typeof reynoldsChoice>;

/** Why somebody did something, in words that a colleague understands a year later. */
export const reason = z.string().trim().min(3).max(1000);

/**
 * What is held of a result, whole: whatever is left out is not held (any more). `includedReason` lets a result in that is
 * not comparable, `setAsideReason` keeps one out that would count.
 */
export const judgementFields = z.strictObject({
  reynolds: reynoldsChoice,
  includedReason: reason.optional(),
  setAsideReason: reason.optional(),
});
export type JudgementFields = z.infer<typeof judgementFields>;

export const judgement = judgementFields.extend({
  id,
  comment: remark.optional(),
  at: timestamp,
  by: name,
});
export type Judgement = z.infer<typeof judgement>;

/** What holds of a result that nobody has judged. */
export const UNJUDGED: JudgementFields = { reynolds: { kind: 'friction-line' } };

export const judgementOrder = judgementFields.extend({
  resultId: id,
  /** The judgement that the person saw, absent where there was none; another one meanwhile is a conflict. */
  expectedJudgementId: id.optional(),
});
export type JudgementOrder = z.infer<typeof judgementOrder>;

export const judgementList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/results/:resultId/judgements',
  summary: 'What was held of a result, and when; the first is what holds now',
  access: 'results.read',
  params: programmeParams.extend({ resultId: id }),
  query: nothing,
  body: nothing,
  response: z.strictObject({ judgements: z.array(judgement).describe('Newest first') }),
  command: false,
  versioned: false,
  problems: [],
});

export const resultsJudge = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/results/judgements',
  summary:
    'Judge one result or many: how it is brought to the reference Reynolds number, what is included with a reason, what is set aside. All of it or nothing',
  access: 'results.judge',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({ judgements: z.array(judgementOrder).min(1).max(500), comment: remark.optional() }),
  response: z.strictObject({
    judgements: z.array(judgement.extend({ resultId: id })).describe('In the order asked for'),
  }),
  command: true,
  versioned: false,
  problems: ['conflict', 'wrong-state', 'unusable-input'],
});
