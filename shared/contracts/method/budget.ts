import * as z from 'zod';
import type { BudgetInput } from '#shared/core/uncertainty/budget-operation';
import { figureInputSchema } from './figure';

/** Input of the operation `budget`. */
export const budgetInputSchema = z.strictObject({
  figure: figureInputSchema,
  other: figureInputSchema.nullish(),
}) satisfies z.ZodType<BudgetInput>;
