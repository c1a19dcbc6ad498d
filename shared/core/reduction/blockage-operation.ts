import type { BlockageMethodInput, TunnelKind } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { positive } from '../requirement';
import { blockageRatio, blockageVerdict, correctForBlockage } from './blockage';
import { areaAtModelScale, checkScale, fullScaleDragArea } from './scale';

/** Input of the operation `blockage`. */
export interface BlockageInput {
  readonly facility: {
    readonly id?: string | null | undefined;
    readonly name?: string | null | undefined;
    readonly kind: TunnelKind;
    readonly areaM2: number;
    readonly blockage: BlockageMethodInput;
  };
  readonly scale?: number | null | undefined;
  readonly frontalAreaM2: number;
  readonly coefficient: number;
  readonly quotedAreaM2: number;
  readonly quotedAreaScale: 'model' | 'full';
}

export interface BlockageOutput {
  readonly blockageRatio: number;
  readonly verdict: 'passes' | 'caution';
  readonly coefficientCorrected: number;
  readonly dragAreaFullScaleM2: number;
  readonly derivativeOfCorrection: number;
}

/**
 * The operation `blockage`: one coefficient corrected by a facility's method and brought to full scale.
 *
 * @throws {Refused} scale-out-of-range, not-positive, model-larger-than-section, blockage (beyond its limit), unknown-method,
 *   missing-input
 */
export function evaluateBlockage(input: BlockageInput): BlockageOutput {
  const { facility } = input;
  const scale = input.scale ?? 1;
  checkScale(scale);
  positive(facility.areaM2, 'facility.areaM2');
  positive(input.frontalAreaM2, 'frontalAreaM2');
  positive(input.coefficient, 'coefficient');
  positive(input.quotedAreaM2, 'quotedAreaM2');
  const ratio = blockageRatio(scale, input.frontalAreaM2, facility.areaM2);
  const verdict = blockageVerdict(facility.kind, ratio);
  if (verdict === 'excluded') {
    refuse(
      'blockage',
      'facility',
      `The blockage ratio ${ratio.toFixed(3)} is above the limit of this kind of section.`,
    );
  }
  const modelDragAreaM2 =
    input.coefficient * areaAtModelScale(input.quotedAreaM2, input.quotedAreaScale, scale);
  const corrected = correctForBlockage(facility.blockage, modelDragAreaM2, ratio, facility.areaM2);
  return {
    blockageRatio: ratio,
    verdict,
    coefficientCorrected: input.coefficient * (corrected.modelDragAreaM2 / modelDragAreaM2),
    dragAreaFullScaleM2: fullScaleDragArea(corrected.modelDragAreaM2, scale),
    derivativeOfCorrection: corrected.derivative,
  };
}
