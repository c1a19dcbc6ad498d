import { builtInCycle } from '../../../../seeds/reference/cycles/built-in-cycles';
import { rankingInputSchema } from '#shared/contracts/method/ranking-input';
import { evaluateRank } from '#shared/core/ranking/rank';
import { operation } from '../operation';

export const rank = operation(rankingInputSchema, (input) => evaluateRank(input, builtInCycle));
