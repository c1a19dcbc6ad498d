import * as z from 'zod';
import {
  CHECK_FINDINGS,
  CHECK_NAMES,
  CHECK_POLICIES,
  CHECK_UNITS,
  CHECK_VERDICTS,
  type Check,
} from '#shared/core/checks/check';

const bound = z.number().nullable();
const conditionValue = z.union([z.string(), z.number(), z.boolean()]);

/** One check of a result, without words: the client finds them. Typed by the core. */
export const resultCheck: z.ZodType<Check, Check> = z.strictObject({
  check: z.enum(CHECK_NAMES),
  verdict: z.enum(CHECK_VERDICTS),
  value: z.number().nullable().describe('What was found, in `unit`'),
  unit: z.enum(CHECK_UNITS),
  limit: z.strictObject({ from: bound, to: bound, excludedAbove: bound }).nullable(),
  policy: z
    .enum(CHECK_POLICIES)
    .nullable()
    .describe('The limit of the organisation’s policies that it rests on'),
  finding: z.enum(CHECK_FINDINGS).nullable(),
  items: z.array(
    z.strictObject({ item: z.string(), reference: conditionValue, stated: conditionValue.nullable() }),
  ),
  refusal: z
    .strictObject({ code: z.string(), where: z.string(), detail: z.string() })
    .nullable()
    .describe('Why the method refuses the result'),
});
