import { HEAT_CAPACITY_RATIO_AIR, SPECIFIC_GAS_CONSTANT_AIR, SUTHERLAND_AIR } from '../constants';

/** Dynamic viscosity of air [Pa·s] at a temperature [K]: Sutherland, constants of ISO 2533. */
export function dynamicViscosity(temperatureK: number): number {
  return (SUTHERLAND_AIR.beta * Math.pow(temperatureK, 1.5)) / (temperatureK + SUTHERLAND_AIR.temperatureK);
}

/** Speed of sound in air [m/s] at a temperature [K]: √(1.4·287.05287·T), ISO 2533. */
export function speedOfSound(temperatureK: number): number {
  return Math.sqrt(HEAT_CAPACITY_RATIO_AIR * SPECIFIC_GAS_CONSTANT_AIR * temperatureK);
}

/** Density of dry air as an ideal gas [kg/m³]. */
export function dryAirDensity(temperatureK: number, pressurePa: number): number {
  return pressurePa / (SPECIFIC_GAS_CONSTANT_AIR * temperatureK);
}
