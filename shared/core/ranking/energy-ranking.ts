import { DEFAULT_ROTATING_FACTOR } from '../constants';
import type { PreparedCycle } from '../cycles/cycle';
import { refuse } from '../refusal';
import { whPerKm } from '../road-load/cycle-energy';
import { energiesOnCycle, type LoadedVehicle } from '../road-load/energies-on-cycle';
import { roadLoadOf } from '../road-load/road-load';
import { standardUncertainty, type KeyedFigure } from '../uncertainty/budget';
import { comparablesOf, inseparableGroups, neighbourProbabilities, type Comparables } from './comparables';
import { ascending } from './drag-ranking';
import type { VariantInput } from './ranking-input';
import type { EnergyRanking, VariantEnergy } from './ranking-output';

/** A variant and the zero-yaw figure that its energy comes from. */
export interface EnergyCandidate {
  readonly variant: VariantInput;
  readonly zeroYaw: KeyedFigure;
}

export interface EnergyConditions {
  readonly cycle: PreparedCycle;
  readonly airDensityKgM3: number;
  readonly rotatingFactor?: number | null | undefined;
}

/**
 * A variant as the cycle sees it.
 *
 * @throws {Refused} missing-input (mass, or rolling resistance without a measured road load)
 */
export function loadedVehicle({ variant, zeroYaw }: EnergyCandidate, airDensityKgM3: number): LoadedVehicle {
  const { id, massKg, rollingResistance, roadLoadReference } = variant;
  if (massKg == null) refuse('missing-input', `variant:${id}.massKg`, `The variant “${id}” has no mass.`);
  if (roadLoadReference == null && rollingResistance == null) {
    refuse(
      'missing-input',
      `variant:${id}.rollingResistance`,
      `The variant “${id}” has neither a rolling resistance nor a measured road load.`,
    );
  }
  const load = roadLoadOf(
    { massKg, rollingResistance, roadLoadReference },
    zeroYaw.dragAreaM2,
    airDensityKgM3,
  );
  return { load, massKg };
}

/**
 * Wheel energy of each variant on the cycle from its zero-yaw drag area, in the order given; its uncertainty is that of the
 * drag area times dE/dCdA (method section 13).
 *
 * @throws {Refused} missing-input
 */
export function variantEnergies(
  candidates: readonly EnergyCandidate[],
  { cycle, airDensityKgM3, rotatingFactor }: EnergyConditions,
): VariantEnergy[] {
  const vehicles = candidates.map((candidate) => loadedVehicle(candidate, airDensityKgM3));
  const energies = energiesOnCycle(
    cycle,
    vehicles,
    airDensityKgM3,
    rotatingFactor ?? DEFAULT_ROTATING_FACTOR,
  );
  return candidates.map(({ variant, zeroYaw }, i) => {
    const { load } = vehicles[i] as LoadedVehicle;
    const wheelEnergyJ = energies.wheelEnergyJ[i] as number;
    const exchangeRateJPerM2 = energies.exchangeRateJPerM2[i] as number;
    return {
      variantId: variant.id,
      f0N: load.f0N,
      f1NPerKmh: load.f1NPerKmh,
      f2NPerKmh2: load.f2NPerKmh2,
      wheelEnergyJ,
      brakingEnergyJ: energies.brakingEnergyJ[i] as number,
      distanceM: energies.distanceM,
      wheelEnergyWhPerKm: whPerKm(wheelEnergyJ, energies.distanceM),
      exchangeRateJPerM2,
      standardUncertaintyJ: Math.abs(exchangeRateJPerM2) * standardUncertainty(zeroYaw.budget),
    };
  });
}

/** Energies with the amounts of their drag areas times dE/dCdA, laid out for comparisons in the order given. */
export function energyComparables(
  energies: readonly VariantEnergy[],
  zeroYawOf: ReadonlyMap<string, KeyedFigure>,
): Comparables {
  return comparablesOf(
    energies.map(({ variantId, wheelEnergyJ, exchangeRateJPerM2 }) => ({
      id: variantId,
      value: wheelEnergyJ,
      budget: zeroYawOf.get(variantId)?.budget ?? [],
      rate: exchangeRateJPerM2,
    })),
  );
}

function sameOrder(a: readonly string[], b: readonly string[]): boolean {
  return a.every((id, i) => id === b[i]);
}

/**
 * The ranking by wheel energy on a cycle, and whether it disagrees with the order of the zero-yaw drag areas.
 *
 * @throws {Refused} missing-input
 */
export function rankByEnergy(
  candidates: readonly EnergyCandidate[],
  conditions: EnergyConditions,
  confidence: number,
): EnergyRanking {
  const energy = ascending(
    variantEnergies(candidates, conditions),
    (row) => row.wheelEnergyJ,
    (row) => row.variantId,
  );
  const zeroYawOf = new Map(candidates.map(({ variant, zeroYaw }) => [variant.id, zeroYaw]));
  const set = energyComparables(energy, zeroYawOf);
  const orderByEnergy = energy.map((row) => row.variantId);
  const orderByZeroYaw = ascending(
    candidates,
    ({ zeroYaw }) => zeroYaw.dragAreaM2,
    ({ variant }) => variant.id,
  ).map(({ variant }) => variant.id);
  return {
    energy,
    orderByEnergy,
    energyOrderDisagrees: !sameOrder(orderByEnergy, orderByZeroYaw),
    inseparableGroupsByEnergy: inseparableGroups(set, confidence),
    energyProbabilityLowerThanNext: neighbourProbabilities(set),
  };
}
