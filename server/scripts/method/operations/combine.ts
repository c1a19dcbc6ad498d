import { combineInputSchema } from '#shared/contracts/method/combine';
import { evaluateCombine } from '#shared/core/combination/combine-operation';
import { operation } from '../operation';

export const combine = operation(combineInputSchema, evaluateCombine);
