import type { Facility } from '#shared/contracts/facilities';
import type { ImportField } from '#shared/contracts/import-fields';
import type { ResultFields } from '#shared/contracts/results';
import type { Check, CheckName } from '#shared/core/checks/check';
import { checksOf, checksOfRefused, type CheckSurroundings } from '#shared/core/checks/checks-of';
import { reduceResult } from '#shared/core/reduction/reduce-result';
import { Refused } from '#shared/core/refusal';
import type { KnownVariant } from './check-context';

const PLACEHOLDER_ID = 'result';

/**
 * The checks of a result on the programme's reference that somebody should look at. The same functions reduce it later;
 * nothing is judged twice by two rules.
 */
export function methodChecks(
  fields: ResultFields,
  variant: KnownVariant,
  facility: Facility,
  { context, limits }: CheckSurroundings,
): readonly Check[] {
  const { model } = fields;
  try {
    const reduction = reduceResult(
      { ...fields, id: PLACEHOLDER_ID, variantId: variant.key, modelId: model },
      {
        ...context,
        models: new Map(model === undefined ? [] : [[model, { id: model }]]),
        facilities: context.facilities.has(facility.id)
          ? context.facilities
          : new Map([...context.facilities, [facility.id, facility]]),
        variants: new Map([[variant.key, { id: variant.key, frontalAreaM2: variant.frontalAreaM2 }]]),
      },
    );
    return checksOf(reduction, { context, limits }, variant.bodyShape).filter(
      ({ verdict }) => verdict !== 'passes',
    );
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return checksOfRefused(error, fields, limits);
  }
}

const FIELDS: Partial<Readonly<Record<CheckName, ImportField>>> = {
  mach: 'speed',
  reynolds: 'speed',
  transition: 'speed',
  blockage: 'scale',
  'frontal-area': 'variant',
  'quoted-area': 'quotedArea',
  repeatability: 's',
  'yaw-coverage': 'yaw',
  'yaw-pairs': 'yaw',
  'hall-temperature': 'temperature',
  'hall-pressure': 'pressure',
  'air-formula': 'temperature',
  'front-lift': 'frontLift',
  'rear-lift': 'rearLift',
};
const CONDITION_FIELDS: Readonly<Record<string, ImportField>> = {
  ground: 'ground',
  wheels: 'wheels',
  cooling: 'cooling',
  mirrors: 'mirrors',
  rideHeightFrontMm: 'rideHeightFront',
  rideHeightRearMm: 'rideHeightRear',
  payloadKg: 'payload',
  tyres: 'tyres',
  beltSpeedRatio: 'beltSpeedRatio',
  wheelVentilationInForce: 'wheelVentilationInForce',
};

/** The field of the file that a check speaks of: the value's own for what is formed from it. */
export function fieldOfCheck(
  { check, unit, items }: Check,
  valueField: ImportField,
): ImportField | undefined {
  if (check === 'drag-coefficient') return valueField;
  if (check === 'air-formula' && unit === 'Pa') return 'pressure';
  const [item] = items;
  return item === undefined ? FIELDS[check] : CONDITION_FIELDS[item.item];
}
