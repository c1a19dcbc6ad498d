import { planInputSchema } from '#shared/contracts/method/plan';
import { evaluatePlan } from '#shared/core/planning/plan';
import { operation } from '../operation';

export const plan = operation(planInputSchema, evaluatePlan);
