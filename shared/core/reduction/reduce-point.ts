import type { PointInput } from '../ranking/ranking-input';
import { machNumber, reynoldsNumber } from '../similarity/flow';
import { amount, scaled, type Amount } from '../uncertainty/budget';
import {
  blockageAmount,
  correctForBlockage,
  frontalAreaThroughBlockage,
  type BlockageCorrection,
} from './blockage';
import { measuredDragArea, pointFlow, type MeasuredDragArea } from './measured-value';
import type { ReducedPoint, ReductionContext, ResultParts } from './reduction';
import { repeatabilityOf } from './repeatability';
import { needed } from './result-parts';
import { asBuiltScaleAmount, fullScaleDragArea } from './scale';

/** The source has corrected, or the correlation stands for the correction. */
const notCorrectedHere = ({ result, replaced }: ResultParts): boolean =>
  result.blockageAlreadyCorrectedBy != null || replaced.blockage;

/** The blockage step of a point; outside tunnels, where the source has corrected or a correlation replaces it there is none. */
function blockageStep(modelDragAreaM2: number, parts: ResultParts): BlockageCorrection {
  const { tunnel, facility } = parts;
  if (tunnel === null || notCorrectedHere(parts)) return { modelDragAreaM2, derivative: 1 };
  const method = needed(facility.blockage, 'facility.blockage');
  return correctForBlockage(method, modelDragAreaM2, tunnel.blockageRatio, tunnel.areaM2);
}

/** Amount of an area that is not known exactly, where the result is a coefficient: CdA/A_q·u(A_q), through later steps. */
function statedAreaAmount({ result }: ResultParts, uncorrectedM2: number, derivative: number): Amount[] {
  const { quantity, quotedAreaM2, quotedAreaUM2, id } = result;
  if (quantity !== 'coefficient' || quotedAreaM2 == null || quotedAreaUM2 == null) return [];
  return [amount(`stated-area:${id}`, ((uncorrectedM2 * quotedAreaUM2) / quotedAreaM2) * derivative)];
}

function blockageAmounts(parts: ResultParts, uncorrectedM2: number, correctedM2: number): Amount[] {
  const { tunnel, facility, variant, scale } = parts;
  if (tunnel === null || notCorrectedHere(parts)) return [];
  const method = needed(facility.blockage, 'facility.blockage');
  const throughArea = frontalAreaThroughBlockage(
    method,
    correctedM2,
    scale,
    variant.frontalAreaUM2 ?? 0,
    tunnel.blockageRatio,
    tunnel.areaM2,
  );
  return [
    amount(`blockage-method:${facility.id}`, blockageAmount(method, uncorrectedM2, correctedM2)),
    amount(`frontal-area:${variant.id}`, throughArea),
  ];
}

function scaleAmounts({ model, scale }: ResultParts, dragAreaM2: number): Amount[] {
  if (model === null) return [];
  return [amount(`as-built-scale:${model.id}`, asBuiltScaleAmount(dragAreaM2, scale, model.scaleU ?? 0))];
}

function amountsOf(
  parts: ResultParts,
  measuredArea: MeasuredDragArea,
  blockage: BlockageCorrection,
  dragAreaM2: number,
): Amount[] {
  const uncorrectedM2 = fullScaleDragArea(measuredArea.modelDragAreaM2, parts.scale);
  return [
    ...statedAreaAmount(parts, uncorrectedM2, blockage.derivative),
    ...blockageAmounts(parts, uncorrectedM2, dragAreaM2),
    ...scaleAmounts(parts, dragAreaM2),
  ];
}

/**
 * One point through the steps dynamic pressure, coefficient, blockage and full-scale drag area (method sections 2, 3 and 5),
 * at its own speed.
 *
 * @throws {Refused} the codes of these steps, and repeatability-needs-two
 */
export function reducePoint(point: PointInput, parts: ResultParts, context: ReductionContext): ReducedPoint {
  const { scale, air } = parts;
  const flow = pointFlow(point, parts);
  const measuredArea = measuredDragArea(point, parts, flow);
  const blockage = blockageStep(measuredArea.modelDragAreaM2, parts);
  const dragAreaM2 = fullScaleDragArea(blockage.modelDragAreaM2, scale);
  const perValue = fullScaleDragArea(measuredArea.perValue, scale) * blockage.derivative;
  const { characteristicLengthM } = context.programme;
  const known = air === null || flow.speedMs === null ? null : { air, speedMs: flow.speedMs };
  return {
    yawDeg: point.yawDeg ?? 0,
    value: needed(point.value, 'points.value'),
    netForceN: measuredArea.netForceN,
    flow,
    mach: known === null ? null : machNumber(known.speedMs, known.air.speedOfSoundMs),
    reynolds:
      known === null
        ? null
        : reynoldsNumber(known.speedMs, characteristicLengthM, scale, known.air.kinematicViscosityM2S),
    modelDragAreaM2: measuredArea.modelDragAreaM2,
    blockage,
    uncorrectedDragAreaM2: fullScaleDragArea(measuredArea.modelDragAreaM2, scale),
    dragAreaM2,
    perValue,
    amounts: amountsOf(parts, measuredArea, blockage, dragAreaM2),
    repeatability: repeatabilityOf(point, parts, perValue, dragAreaM2),
  };
}

/** Several points by key: every amount times its point's weight; null: their mean. */
export function weighedAmounts(points: readonly ReducedPoint[], weights: readonly number[] | null): Amount[] {
  return points.flatMap((point, i) =>
    scaled(point.amounts, weights === null ? 1 / points.length : (weights[i] ?? NaN)),
  );
}
