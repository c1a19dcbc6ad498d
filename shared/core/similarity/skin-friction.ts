import { SKIN_FRICTION, SKIN_FRICTION_MIN_REYNOLDS } from '../constants';
import { refuse } from '../refusal';

/**
 * c_f(Re) = 0.455/(log10 Re)^2.58, dimensionless: Prandtl–Schlichting, smooth plate, turbulent. Falls as Re grows.
 *
 * @throws {Refused} reynolds-out-of-range (Re ≤ 1000)
 */
export function skinFriction(reynolds: number, where = 'reynolds'): number {
  if (!(reynolds > SKIN_FRICTION_MIN_REYNOLDS)) {
    refuse(
      'reynolds-out-of-range',
      where,
      `A Reynolds number of ${reynolds} is out of range: it must be above ${SKIN_FRICTION_MIN_REYNOLDS}.`,
    );
  }
  return SKIN_FRICTION.factor / Math.log10(reynolds) ** SKIN_FRICTION.exponent;
}

/** The Reynolds number at which c_f has a value above 0: 10^((0.455/c)^(1/2.58)). */
export function reynoldsOfSkinFriction(skinFrictionCoefficient: number): number {
  return 10 ** ((SKIN_FRICTION.factor / skinFrictionCoefficient) ** (1 / SKIN_FRICTION.exponent));
}
