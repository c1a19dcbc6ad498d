import { builtInCycle } from '../../../../seeds/reference/cycles/built-in-cycles';
import { cycleEnergyInputSchema } from '#shared/contracts/method/cycle-energy';
import { evaluateCycleEnergy } from '#shared/core/road-load/cycle-energy-operation';
import { operation } from '../operation';

export const cycleEnergy = operation(cycleEnergyInputSchema, (input) =>
  evaluateCycleEnergy(input, builtInCycle),
);
