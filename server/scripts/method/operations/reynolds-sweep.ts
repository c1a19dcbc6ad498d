import { reynoldsSweepInputSchema } from '#shared/contracts/method/reynolds-sweep';
import { evaluateReynoldsSweep } from '#shared/core/similarity/reynolds-sweep-operation';
import { operation } from '../operation';

export const reynoldsSweep = operation(reynoldsSweepInputSchema, evaluateReynoldsSweep);
