import { DEFAULT_POLICIES } from '../constants';
import { positive } from '../requirement';
import { moveAlongFrictionLine } from './friction-line';

/** Input of the operation `friction-line`. */
export interface FrictionLineInput {
  readonly dragAreaM2: number;
  readonly testReynolds: number;
  readonly referenceReynolds: number;
  readonly frictionShare?: number | null | undefined;
  readonly frictionShareU?: number | null | undefined;
}

export interface FrictionLineOutput {
  readonly dragAreaAtReferenceM2: number;
  readonly derivative: number;
  readonly frictionShareAmountM2: number;
  readonly reynoldsShapeAmountM2: number;
}

/** The operation `friction-line`: one drag area moved, the line switched on. @throws {Refused} reynolds-out-of-range, not-positive */
export function evaluateFrictionLine(input: FrictionLineInput): FrictionLineOutput {
  positive(input.dragAreaM2, 'dragAreaM2');
  const { dragAreaAtReferenceM2, derivative, frictionShareAmountM2, reynoldsShapeAmountM2 } =
    moveAlongFrictionLine(input.dragAreaM2, input.testReynolds, input.referenceReynolds, {
      frictionShare: input.frictionShare ?? DEFAULT_POLICIES.frictionShare,
      frictionShareU: input.frictionShareU ?? DEFAULT_POLICIES.frictionShareU,
    });
  return { dragAreaAtReferenceM2, derivative, frictionShareAmountM2, reynoldsShapeAmountM2 };
}
