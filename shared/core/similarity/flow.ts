/** Re = U·L·s/ν_k, dimensionless: speed [m/s], characteristic length at full scale [m], scale, kinematic viscosity [m²/s]. */
export function reynoldsNumber(
  speedMs: number,
  characteristicLengthM: number,
  scale: number,
  kinematicViscosityM2S: number,
): number {
  return (speedMs * characteristicLengthM * scale) / kinematicViscosityM2S;
}

/** M = U/a, dimensionless: both in m/s. */
export function machNumber(speedMs: number, speedOfSoundMs: number): number {
  return speedMs / speedOfSoundMs;
}

/** M ≤ 0.2 passes, up to 0.3 is a caution (compressibility), beyond excluded; the limits are policies (method section 4). */
export function machVerdict(
  mach: number,
  limits: { readonly machCaution: number; readonly machExcluded: number },
): 'passes' | 'caution' | 'excluded' {
  if (mach > limits.machExcluded) return 'excluded';
  return mach > limits.machCaution ? 'caution' : 'passes';
}

/** U = √(2q/ρ) [m/s], where the dynamic pressure was measured [Pa] and the speed was not. */
export function speedOfDynamicPressure(dynamicPressurePa: number, densityKgM3: number): number {
  return Math.sqrt((2 * dynamicPressurePa) / densityKgM3);
}

/** q = ½·ρ·U² [Pa]. */
export function dynamicPressureOf(speedMs: number, densityKgM3: number): number {
  return 0.5 * densityKgM3 * speedMs * speedMs;
}
