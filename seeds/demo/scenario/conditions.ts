import type { Condition } from '#shared/contracts/condition';

/** The programme’s reference: the car as it drives, on belts. */
export const REFERENCE_CONDITION: Condition = {
  ground: 'several-belts',
  wheels: 'rotating',
  cooling: 'open',
  mirrors: 'fitted',
};

/** The old tunnel: the road stands still under the car, and the wheels with it. */
export const FIXED_FLOOR: Condition = {
  ground: 'fixed-floor',
  wheels: 'stationary',
  cooling: 'open',
  mirrors: 'fitted',
};

export const ROAD: Condition = { ground: 'road', wheels: 'rotating', cooling: 'open', mirrors: 'fitted' };
