import * as z from 'zod';
import { EVIDENCE_RULES } from './judgements';
import { id } from './common';
import { blockageMethod } from './facilities';
import { policyValues } from './policies';
import { notNegative } from './common';

const reason = z.string().trim().min(3).max(1000);

/** One change of judgement, tried without saving and proposed to a colleague. */
export const judgementChange = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('set-aside'), resultId: id, reason }),
  z.strictObject({ kind: z.literal('bring-back'), resultId: id }),
  z.strictObject({ kind: z.literal('include-not-comparable'), resultId: id, reason }),
  z.strictObject({
    kind: z.literal('evidence'),
    variantId: id,
    resultIds: z.array(id).max(50),
    rule: z.enum(EVIDENCE_RULES),
  }),
  z.strictObject({
    kind: z.literal('facility'),
    facilityId: id,
    blockage: blockageMethod.optional(),
    biasURelative: notNegative.optional(),
    sessionURelative: notNegative.optional(),
  }),
  z.strictObject({ kind: z.literal('policies'), values: policyValues.partial() }),
]);
export type JudgementChange = z.infer<typeof judgementChange>;
