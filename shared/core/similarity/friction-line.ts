import { skinFriction } from './skin-friction';

/** A drag area moved along the friction line. */
export interface FrictionLineMove {
  /** R = c_f(Re_test)/c_f(Re_ref) − 1, dimensionless. */
  readonly frictionChange: number;
  /** CdA_ref = CdA/B, B = 1 + φR [m²]. */
  readonly dragAreaAtReferenceM2: number;
  /** 1/B: what every earlier amount is multiplied by. */
  readonly derivative: number;
  /** −CdA·R/B²·u(φ) [m²], signed: shared by all that the same policy moves. */
  readonly frictionShareAmountM2: number;
  /** (CdA_ref − CdA)/2 [m²], signed: a variant's own, because bodies of other shape follow the line less well. */
  readonly reynoldsShapeAmountM2: number;
}

/**
 * Moves a drag area [m²] from the Reynolds number of its test to that of the reference, as if a share φ ± u(φ) of it were
 * skin friction (method section 6; φ is memory). For results without a sweep.
 *
 * @throws {Refused} reynolds-out-of-range (Re ≤ 1000)
 */
export function moveAlongFrictionLine(
  dragAreaM2: number,
  testReynolds: number,
  referenceReynolds: number,
  { frictionShare, frictionShareU }: { readonly frictionShare: number; readonly frictionShareU: number },
): FrictionLineMove {
  const frictionChange =
    skinFriction(testReynolds, 'testReynolds') / skinFriction(referenceReynolds, 'referenceReynolds') - 1;
  const bracket = 1 + frictionShare * frictionChange;
  const dragAreaAtReferenceM2 = dragAreaM2 / bracket;
  return {
    frictionChange,
    dragAreaAtReferenceM2,
    derivative: 1 / bracket,
    frictionShareAmountM2: ((-dragAreaM2 * frictionChange) / bracket ** 2) * frictionShareU,
    reynoldsShapeAmountM2: (dragAreaAtReferenceM2 - dragAreaM2) / 2,
  };
}
