import { budgetInputSchema } from '#shared/contracts/method/budget';
import { evaluateBudget } from '#shared/core/uncertainty/budget-operation';
import { operation } from '../operation';

export const budget = operation(budgetInputSchema, evaluateBudget);
