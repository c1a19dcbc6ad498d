import { COLDEST_PLANNED_GAS_K, SUTHERLAND_AIR, SUTHERLAND_NITROGEN_TEMPERATURE_K } from '../constants';
import type { CoolingGas, PlanningSetting } from './planning-setting';

/** What would bring a Reynolds number within the Mach limit, each by itself. */
export interface WaysOut {
  /** Null where it would be above 1. */
  readonly scaleAtMachLimit: number | null;
  /** Static pressure over the planned one, at the planned temperature. */
  readonly pressureRatioAtMachLimit: number;
  readonly pressureAtMachLimitPa: number;
  readonly coolingGas: CoolingGas;
  /** At the planned pressure [K]; null below 100 K. */
  readonly temperatureAtMachLimitK: number | null;
}

const SUTHERLAND_S: { readonly [gas in CoolingGas]: number } = {
  air: SUTHERLAND_AIR.temperatureK,
  nitrogen: SUTHERLAND_NITROGEN_TEMPERATURE_K,
};

/**
 * The temperature [K] at which a gas, at one Mach number and pressure, has a Reynolds number that is a ratio r > 0 of that at T [K]. At fixed M
 * and p, Re ∝ p/(μ(T)·√T) ∝ (T + S)/T² with Sutherland's μ; the root of T_c²/(T_c + S) = w, w = T²/(T + S)/r, is
 * T_c = (w + √(w² + 4·w·S))/2 (method section 15).
 */
export function temperatureForReynoldsRatio(temperatureK: number, ratio: number, gas: CoolingGas): number {
  const s = SUTHERLAND_S[gas];
  const w = (temperatureK * temperatureK) / (temperatureK + s) / ratio;
  return (w + Math.sqrt(w * w + 4 * w * s)) / 2;
}

/**
 * The ways out of a plan whose required Mach number is above the limit: at the limit a larger model (Re ∝ s), more pressure (Re ∝ p, ideal
 * gas), or a colder gas.
 */
export function waysOutOf(setting: PlanningSetting, mach: number, coolingGas: CoolingGas): WaysOut {
  const ratio = mach / setting.machLimit;
  const scale = setting.scale * ratio;
  const temperatureK = temperatureForReynoldsRatio(setting.temperatureK, ratio, coolingGas);
  return {
    scaleAtMachLimit: scale > 1 ? null : scale,
    pressureRatioAtMachLimit: ratio,
    pressureAtMachLimitPa: setting.pressurePa * ratio,
    coolingGas,
    temperatureAtMachLimitK: temperatureK < COLDEST_PLANNED_GAS_K ? null : temperatureK,
  };
}
