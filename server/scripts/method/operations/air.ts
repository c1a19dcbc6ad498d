import { airInputSchema } from '#shared/contracts/method/air';
import { airOf } from '#shared/core/air/air';
import { operation } from '../operation';

export const air = operation(airInputSchema, (input) => airOf(input));
