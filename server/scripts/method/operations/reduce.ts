import { rankingInputSchema } from '#shared/contracts/method/ranking-input';
import { evaluateReduce } from '#shared/core/reduction/reduce';
import { operation } from '../operation';

export const reduce = operation(rankingInputSchema, evaluateReduce);
