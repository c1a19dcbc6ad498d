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
import { stepOf, type Derivation, type DerivationStep } from './derivation';
import { ENERGY_METHODS as METHODS } from './energy-methods';
import { inValues } from './in-values';
import type { KeyNames } from './key-labels';
import { budgetShares } from './trace-of-figure';

function roadLoadStep(candidate: EnergyCandidate, airDensityKgM3: number): DerivationStep {
  const { variant, zeroYaw } = candidate;
  const { load, massKg } = loadedVehicle(candidate, airDensityKgM3);
  const { roadLoadReference: reference, rollingResistance } = variant;
  const air = inValues`ρ = ${airDensityKgM3} kg/m³, C_D·A = ${zeroYaw.dragAreaM2} m², m = ${massKg} kg`;
  const rolling = rollingResistance == null ? null : inValues`, C_rr = ${rollingResistance}`;
  const found = inValues`f_0 = ${load.f0N} N, f_1 = ${load.f1NPerKmh} N/(km/h), f_2 = ${load.f2NPerKmh2} N/(km/h)²`;
  const outcome = { value: load.f2NPerKmh2, unit: 'N/(km/h)²' };
  if (reference == null) {
    return stepOf(METHODS.builtUpRoadLoad, {
      ...outcome,
      values: inValues`${air}${rolling}: ${found}`,
      assumed: ['rolling resistance does not depend on speed'],
    });
  }
  return stepOf(METHODS.measuredRoadLoad, {
    ...outcome,
    values: inValues`${air}${rolling}; measured: f_0 = ${reference.f0N} N, f_1 = ${reference.f1NPerKmh} N/(km/h), f_2 = ${reference.f2NPerKmh2} N/(km/h)² at ${reference.dragAreaM2} m², ${reference.massKg} kg, ${reference.airDensityKgM3} kg/m³: ${found}`,
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
        values: inValues`${cycle.steps} steps, ${distanceM} m, ${cycle.durationS} s, k = ${rotatingFactor}: ${energy.wheelEnergyWhPerKm} Wh/km`,
        value: wheelEnergyJ,
        unit: 'J',
      }),
      stepOf(METHODS.exchangeRate, {
        values: inValues`at C_D·A = ${candidate.zeroYaw.dragAreaM2} ± ${EXCHANGE_RATE_STEP_M2} m²`,
        value: exchangeRateJPerM2,
        unit: 'J/m²',
      }),
      stepOf(METHODS.energyUncertainty, {
        values: inValues`${Math.abs(exchangeRateJPerM2)} J/m² × ${figure.standardUncertaintyM2} m²`,
        value: standardUncertaintyJ,
        unit: 'J',
        assumed: ['mass and rolling resistance are exactly known'],
      }),
    ],
    budget: budgetShares(figure.contributions, names, exchangeRateJPerM2),
  };
}
