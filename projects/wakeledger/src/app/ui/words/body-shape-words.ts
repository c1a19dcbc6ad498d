import type { BODY_SHAPES } from '#shared/contracts/variants';

/** Body shapes in the words of the trade. */
export const BODY_SHAPE_NAMES: Readonly<Record<(typeof BODY_SHAPES)[number], string>> = {
  hatch: $localize`Hatch`,
  liftback: $localize`Liftback`,
  saloon: $localize`Saloon`,
  estate: $localize`Estate`,
  crossover: $localize`Crossover`,
  coupe: $localize`Coupé`,
  van: $localize`Van`,
  pickup: $localize`Pick-up`,
  other: $localize`Other`,
};
