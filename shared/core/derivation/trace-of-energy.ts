import { DEFAULT_ROTATING_FACTOR, EXCHANGE_RATE_STEP_M2 } from '../constants';
import {
  loadedVehicle,
  variantEnergies,
  type EnergyCandidate,
  type EnergyConditions,
} from '../ranking/energy-ranking';
import { refuse } from '../refusal';
import { cycleEnergy } from '../road-load/cycle-energy';
import { figureOf } from '../uncertainty/budget';
import { plain, stepOf, type Derivation, type DerivationStep } from './derivation';
import { ENERGY_METHODS as METHODS } from './energy-methods';
import type { KeyNames } from './key-labels';
import { budgetShares } from './trace-of-figure';

function roadLoadStep(candidate: EnergyCandidate, airDensityKgM3: number): DerivationStep {
  const { variant, zeroYaw } = candidate;
  const { load, massKg } = loadedVehicle(candidate, airDensityKgM3);
  const { roadLoadReference: reference, rollingResistance } = variant;
  const air = `ρ = ${plain(airDensityKgM3)} kg/m³, C_D·A = ${plain(zeroYaw.dragAreaM2)} m², m = ${plain(massKg)} kg`;
  const rolling = rollingResistance == null ? '' : `, C_rr = ${rollingResistance}`;
  const found = `f0 = ${plain(load.f0N)} N, f1 = ${plain(load.f1NPerKmh)} N/(km/h), f2 = ${plain(load.f2NPerKmh2)} N/(km/h)²`;
  const outcome = { value: load.f2NPerKmh2, unit: 'N/(km/h)²' };
  if (reference == null) {
    return stepOf(METHODS.builtUpRoadLoad, {
      ...outcome,
      values: `${air}${rolling}: ${found}`,
      assumed: ['rolling resistance does not depend on speed'],
    });
  }
  return stepOf(METHODS.measuredRoadLoad, {
    ...outcome,
    values: `${air}${rolling}; measured: f0 = ${reference.f0N} N, f1 = ${reference.f1NPerKmh} N/(km/h), f2 = ${reference.f2NPerKmh2} N/(km/h)² at ${reference.dragAreaM2} m², ${reference.massKg} kg, ${reference.airDensityKgM3} kg/m³: ${found}`,
    assumed: rollingResistance == null ? ['f0 grows with mass in proportion'] : [],
  });
}

/**
 * How the wheel energy of a variant on a cycle came about from its zero-yaw drag area, by the same functions that the ranking
 * uses. Values in J.
 *
 * @throws {Refused} missing-input
 */
export function traceOfEnergy(
  candidate: EnergyCandidate,
  conditions: EnergyConditions,
  names: KeyNames = new Map(),
): Derivation {
  const { cycle, airDensityKgM3 } = conditions;
  const rotatingFactor = conditions.rotatingFactor ?? DEFAULT_ROTATING_FACTOR;
  const { load, massKg } = loadedVehicle(candidate, airDensityKgM3);
  const { wheelEnergyJ, distanceM } = cycleEnergy(cycle, load, massKg, rotatingFactor);
  const [energy] = variantEnergies([candidate], conditions);
  if (energy === undefined) return refuse('missing-input', 'variant', 'There is no variant.');
  const figure = figureOf(candidate.zeroYaw);
  const { exchangeRateJPerM2, standardUncertaintyJ } = energy;
  const { id, name } = candidate.variant;
  return {
    title: `Wheel energy of ${name ?? id}`,
    value: wheelEnergyJ,
    unit: 'J',
    standardUncertainty: standardUncertaintyJ,
    expandedUncertainty: figure.coverageFactor * standardUncertaintyJ,
    coverageFactor: figure.coverageFactor,
    steps: [
      roadLoadStep(candidate, airDensityKgM3),
      stepOf(METHODS.cycleEnergy, {
        values: `${cycle.steps} steps, ${plain(distanceM)} m, ${plain(cycle.durationS)} s, k = ${plain(rotatingFactor)}: ${plain(energy.wheelEnergyWhPerKm)} Wh/km`,
        value: wheelEnergyJ,
        unit: 'J',
      }),
      stepOf(METHODS.exchangeRate, {
        values: `at C_D·A = ${plain(candidate.zeroYaw.dragAreaM2)} ± ${EXCHANGE_RATE_STEP_M2} m²`,
        value: exchangeRateJPerM2,
        unit: 'J/m²',
      }),
      stepOf(METHODS.energyUncertainty, {
        values: `${plain(Math.abs(exchangeRateJPerM2))} J/m²·${plain(figure.standardUncertaintyM2)} m²`,
        value: standardUncertaintyJ,
        unit: 'J',
        assumed: ['mass and rolling resistance are exactly known'],
      }),
    ],
    budget: budgetShares(figure.contributions, names, exchangeRateJPerM2),
  };
}
