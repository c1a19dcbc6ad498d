import { refuse } from '../refusal';

/** @throws {Refused} scale-out-of-range unless 0 < s ≤ 1 */
export function checkScale(scale: number, where = 'scale'): void {
  if (!(scale > 0 && scale <= 1)) {
    refuse(
      'scale-out-of-range',
      where,
      `Scale is model length over full length, above 0 and at most 1, not ${scale}.`,
    );
  }
}

/** The quoted area as the model has it [m²]: times s² where it is stated at full scale. */
export function areaAtModelScale(quotedAreaM2: number, statedAt: 'model' | 'full', scale: number): number {
  return statedAt === 'full' ? quotedAreaM2 * scale * scale : quotedAreaM2;
}

/** Drag area at full scale [m²]: CdA = x/s². The area that a coefficient was formed with cancels. */
export function fullScaleDragArea(modelDragAreaM2: number, scale: number): number {
  return modelDragAreaM2 / (scale * scale);
}

/** What the uncertainty of the scale as built adds [m²]: −2·CdA/s·u(s), for models only. */
export function asBuiltScaleAmount(dragAreaM2: number, scale: number, scaleU: number): number {
  return scale < 1 ? ((-2 * dragAreaM2) / scale) * scaleU : 0;
}
