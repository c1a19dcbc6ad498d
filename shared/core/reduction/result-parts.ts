import { airOf, type Air } from '../air/air';
import {
  QUANTITIES,
  type FacilityInput,
  type ModelInput,
  type Quantity,
  type ResultInput,
  type TunnelKind,
  type VariantInput,
} from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { blockageRatio } from './blockage';
import type { ReductionContext, ReplacedSteps, ResultParts, TunnelParts } from './reduction';
import { checkScale } from './scale';

/** @throws {Refused} missing-input where there is nothing */
export function needed<T>(value: T | null | undefined, where: string): T {
  return value ?? refuse('missing-input', where, `${where} is missing.`);
}

/** @throws {Refused} missing-input, not-positive */
export function neededPositive(value: number | null | undefined, where: string): number {
  const given = needed(value, where);
  if (!(given > 0)) refuse('not-positive', where, `${where} must be above 0, not ${given}.`);
  return given;
}

export function isTunnel(kind: FacilityInput['kind']): kind is TunnelKind {
  return kind !== 'road' && kind !== 'simulation';
}

const KNOWN_QUANTITIES: ReadonlySet<string> = new Set(QUANTITIES);

const isQuantity = (quantity: string): quantity is Quantity => KNOWN_QUANTITIES.has(quantity);

/** @throws {Refused} missing-input, unknown-quantity */
export function quantityOf(result: ResultInput): Quantity {
  const quantity = needed(result.quantity, 'quantity');
  if (isQuantity(quantity)) return quantity;
  return refuse('unknown-quantity', 'quantity', `There is no quantity “${quantity}”.`);
}

function modelOf(result: ResultInput, context: ReductionContext): ModelInput | null {
  if (result.modelId == null) return null;
  return (
    context.models.get(result.modelId) ??
    refuse('unknown-model', 'modelId', `There is no model “${result.modelId}”.`)
  );
}

function tunnelOf(facility: FacilityInput, variant: VariantInput, scale: number): TunnelParts | null {
  if (!isTunnel(facility.kind)) return null;
  const areaM2 = neededPositive(facility.areaM2, 'facility.areaM2');
  return { areaM2, blockageRatio: blockageRatio(scale, variant.frontalAreaM2, areaM2) };
}

/** Air is needed for the Reynolds number above all; where a correlation stands for that, it may be unknown. */
function resultAir(result: ResultInput, replaced: ReplacedSteps): Air | null {
  if (result.air == null && replaced.reynolds) return null;
  return airOf(needed(result.air, 'air'), 'air');
}

const NOTHING_REPLACED: ReplacedSteps = { blockage: false, reynolds: false, groundSimulation: false };

/**
 * Finds what a result names and checks what it must state.
 *
 * @throws {Refused} unknown-variant, unknown-facility, unknown-model, unknown-quantity, missing-input, scale-out-of-range,
 *   not-positive, model-larger-than-section, and the codes of air
 */
export function resultPartsOf(result: ResultInput, context: ReductionContext): ResultParts {
  const variant =
    context.variants.get(result.variantId) ??
    refuse('unknown-variant', 'variantId', `There is no variant “${result.variantId}”.`);
  const facility =
    context.facilities.get(result.facilityId) ??
    refuse('unknown-facility', 'facilityId', `There is no facility “${result.facilityId}”.`);
  const model = modelOf(result, context);
  const correlation = context.correlations.get(facility.id) ?? null;
  const replaced = correlation?.replaces ?? NOTHING_REPLACED;
  needed(result.testDate, 'testDate');
  quantityOf(result);
  const scale = needed(result.scale, 'scale');
  checkScale(scale);
  return {
    result,
    variant,
    facility,
    model,
    air: resultAir(result, replaced),
    correlation,
    replaced,
    scale,
    tunnel: tunnelOf(facility, variant, scale),
  };
}
