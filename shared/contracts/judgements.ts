import * as z from 'zod';
import { id } from './common';

/** How the evidence of a variant is formed from its adopted results (method section 10). */
export const EVIDENCE_RULES = ['newest', 'weighted-mean'] as const;

/** How a result is brought to the reference Reynolds number (method section 6). */
export const reynoldsChoice = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('friction-line') }),
  z.strictObject({ kind: z.literal('own-sweep') }),
  z.strictObject({ kind: z.literal('sweep-of'), resultId: id }),
]);
export type ReynoldsChoice = z.infer<typeof reynoldsChoice>;
