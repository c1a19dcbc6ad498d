import type { VariantFields } from '#shared/contracts/variants';

type Sold = VariantFields['configurations'][number];

/** Electric drive of the platform; the battery is the one thing that differs between bodies. */
export function electric(usableEnergyKWh: number): Sold['electric'] {
  return {
    driveEfficiency: 0.89,
    regenerationEfficiency: 0.62,
    regenerationPowerLimitW: 70_000,
    auxiliaryPowerW: 380,
    chargingEfficiency: 0.89,
    usableEnergyKWh,
  };
}

/** The 1.2-litre petrol engine: a Willans line with overrun cut and stop–start, on petrol with 10 % ethanol. */
export const PETROL: Sold['combustion'] = {
  driveEfficiency: 0.93,
  willansSlopeEfficiency: 0.4,
  zeroOutputPowerW: 6_200,
  overrunCut: true,
  stopStart: true,
  fuel: {
    name: 'Petrol E10',
    heatingValueJPerKg: 41_500_000,
    densityKgPerL: 0.748,
    co2KgPerKg: 3.05,
  },
};
