import {
  CELSIUS_ZERO_K,
  MOLAR_GAS_CONSTANT_CIPM_2007,
  MOLAR_MASS_DRY_AIR_KG_PER_MOL,
  MOLAR_MASS_WATER_KG_PER_MOL,
} from '../constants';

/** Saturation vapour pressure of water [Pa] at a temperature [K]: CIPM-2007, equation A1.1. */
function saturationPressurePa(temperatureK: number): number {
  return Math.exp(
    1.2378847e-5 * temperatureK * temperatureK -
      1.9121316e-2 * temperatureK +
      33.93711047 -
      6.3431645e3 / temperatureK,
  );
}

/** Compressibility Z, dimensionless: CIPM-2007, equation A1.4. */
function compressibility(pressurePa: number, temperatureC: number, vapourFraction: number): number {
  const t = temperatureC;
  const x = vapourFraction;
  const pT = pressurePa / (t + CELSIUS_ZERO_K);
  const first =
    1.58123e-6 -
    2.9331e-8 * t +
    1.1043e-10 * t * t +
    (5.707e-6 - 2.051e-8 * t) * x +
    (1.9898e-4 - 2.376e-6 * t) * x * x;
  return 1 - pT * first + pT * pT * (1.83e-11 - 0.765e-8 * x * x);
}

/** Molar fraction of water vapour: x_v = h·f·p_sv/p, with the enhancement factor f of CIPM-2007, equation A1.2. */
export function vapourFraction(temperatureC: number, pressurePa: number, relativeHumidity: number): number {
  const enhancement = 1.00062 + 3.14e-8 * pressurePa + 5.6e-7 * temperatureC * temperatureC;
  return (relativeHumidity * enhancement * saturationPressurePa(temperatureC + CELSIUS_ZERO_K)) / pressurePa;
}

/**
 * Density of moist air [kg/m³] at a temperature [°C], static pressure [Pa] and relative humidity [fraction], with 400 µmol/mol
 * CO2: ρ = p·M_a/(Z·R·T)·(1 − x_v·(1 − M_v/M_a)).
 *
 * Source: CIPM-2007, Picard, Davis, Gläser, Fujii, Metrologia 45 (2008) 149, long form.
 */
export function moistAirDensity(temperatureC: number, pressurePa: number, relativeHumidity: number): number {
  const x = vapourFraction(temperatureC, pressurePa, relativeHumidity);
  const z = compressibility(pressurePa, temperatureC, x);
  const temperatureK = temperatureC + CELSIUS_ZERO_K;
  return (
    ((pressurePa * MOLAR_MASS_DRY_AIR_KG_PER_MOL) / (z * MOLAR_GAS_CONSTANT_CIPM_2007 * temperatureK)) *
    (1 - x * (1 - MOLAR_MASS_WATER_KG_PER_MOL / MOLAR_MASS_DRY_AIR_KG_PER_MOL))
  );
}
