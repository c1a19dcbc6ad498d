import { builtInCycle } from '../../../../seeds/reference/cycles/built-in-cycles';
import { powertrainInputSchema } from '#shared/contracts/method/powertrain';
import { airOf } from '#shared/core/air/air';
import { evaluatePowertrain } from '#shared/core/road-load/powertrain-operation';
import { operation } from '../operation';

export const powertrain = operation(powertrainInputSchema, ({ referenceAir, ...input }) =>
  evaluatePowertrain(
    { ...input, airDensityKgM3: airOf(referenceAir, 'referenceAir').densityKgM3 },
    builtInCycle,
  ),
);
