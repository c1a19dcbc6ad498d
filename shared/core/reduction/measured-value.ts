import { KMH_PER_MS } from '../constants';
import type { PointInput, ResultInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { dragAreaOfF2 } from '../road-load/road-load';
import { dynamicPressureOf, speedOfDynamicPressure } from '../similarity/flow';
import type { PointFlow, ResultParts } from './reduction';
import { needed, neededPositive, quantityOf } from './result-parts';
import { areaAtModelScale } from './scale';

/** A point's value as a drag area at model scale [m²], uncorrected. */
export interface MeasuredDragArea {
  readonly modelDragAreaM2: number;
  /** d(model drag area)/d(value). */
  readonly perValue: number;
  readonly netForceN: number | null;
}

const givenPositive = (value: number | null | undefined, where: string): number | null =>
  value == null ? null : neededPositive(value, where);

/**
 * Speed and dynamic pressure of a point; its own go before the result's. q is the facility's measured one where given, else
 * ½ρU²; where q is measured and U is not, U = √(2q/ρ) (method section 2). Neither is needed where the correlation replaces
 * Reynolds.
 *
 * @throws {Refused} missing-input (neither), not-positive
 */
export function pointFlow(point: PointInput, { result, air, replaced }: ResultParts): PointFlow {
  const speedKmh = givenPositive(point.speedKmh ?? result.speedKmh, 'speedKmh');
  const measuredPa = givenPositive(point.dynamicPressurePa ?? result.dynamicPressurePa, 'dynamicPressurePa');
  if (speedKmh !== null) {
    const speedMs = speedKmh / KMH_PER_MS;
    return {
      speedMs,
      dynamicPressurePa: measuredPa ?? (air === null ? null : dynamicPressureOf(speedMs, air.densityKgM3)),
      dynamicPressureMeasured: measuredPa !== null,
    };
  }
  if (measuredPa === null) {
    if (replaced.reynolds) return { speedMs: null, dynamicPressurePa: null, dynamicPressureMeasured: false };
    refuse('missing-input', 'speedKmh', 'Neither a speed nor a dynamic pressure is given.');
  }
  return {
    speedMs: air === null ? null : speedOfDynamicPressure(measuredPa, air.densityKgM3),
    dynamicPressurePa: measuredPa,
    dynamicPressureMeasured: true,
  };
}

/** Force after tare [N]; a tare is subtracted only if it was not already. */
function netForce(value: number, point: PointInput, result: ResultInput): number {
  if (needed(result.tareAlreadySubtracted, 'tareAlreadySubtracted')) return value;
  return value - needed(point.tareN ?? result.tareN, 'tareN');
}

/** The area that a coefficient was formed with, as the model has it [m²]. */
export function quotedAreaAtModelScale({ result, scale }: ResultParts): number {
  const areaM2 = neededPositive(result.quotedAreaM2, 'quotedAreaM2');
  return areaAtModelScale(areaM2, needed(result.quotedAreaScale, 'quotedAreaScale'), scale);
}

function measured(value: number, point: PointInput, parts: ResultParts, flow: PointFlow): MeasuredDragArea {
  const { result, scale, air } = parts;
  switch (quantityOf(result)) {
    case 'force': {
      const netForceN = netForce(value, point, result);
      const pressurePa = needed(flow.dynamicPressurePa, 'dynamicPressurePa');
      return { modelDragAreaM2: netForceN / pressurePa, perValue: 1 / pressurePa, netForceN };
    }
    case 'coefficient': {
      const areaM2 = quotedAreaAtModelScale(parts);
      return { modelDragAreaM2: value * areaM2, perValue: areaM2, netForceN: null };
    }
    case 'drag-area':
      return { modelDragAreaM2: value * scale * scale, perValue: scale * scale, netForceN: null };
    case 'coastdown-f2': {
      const { densityKgM3 } = needed(air, 'air');
      const perValue = dragAreaOfF2(1, densityKgM3) * scale * scale;
      return {
        modelDragAreaM2: dragAreaOfF2(value, densityKgM3) * scale * scale,
        perValue,
        netForceN: null,
      };
    }
  }
}

/**
 * A point's value as a drag area: F/q after tare, C_D·A_q, C_D·A itself, or 2·3.6²·f2/ρ (method sections 1 to 3).
 *
 * @throws {Refused} missing-input, not-positive, drag-not-positive
 */
export function measuredDragArea(point: PointInput, parts: ResultParts, flow: PointFlow): MeasuredDragArea {
  const found = measured(needed(point.value, 'points.value'), point, parts, flow);
  if (!(found.modelDragAreaM2 > 0)) {
    refuse('drag-not-positive', 'points.value', 'The drag after tare must be above 0.');
  }
  return found;
}
