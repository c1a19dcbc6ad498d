import { frictionLineInputSchema } from '#shared/contracts/method/friction-line';
import { evaluateFrictionLine } from '#shared/core/similarity/friction-line-operation';
import { operation } from '../operation';

export const frictionLine = operation(frictionLineInputSchema, evaluateFrictionLine);
