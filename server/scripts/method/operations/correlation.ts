import { correlationInputSchema } from '#shared/contracts/method/correlation';
import { evaluateCorrelation } from '#shared/core/correlation/correlation-operation';
import { operation } from '../operation';

export const correlation = operation(correlationInputSchema, evaluateCorrelation);
