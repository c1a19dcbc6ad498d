import { blockageInputSchema } from '#shared/contracts/method/blockage';
import { evaluateBlockage } from '#shared/core/reduction/blockage-operation';
import { operation } from '../operation';

export const blockage = operation(blockageInputSchema, evaluateBlockage);
