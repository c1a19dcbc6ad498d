import type { Facility } from '#shared/contracts/facilities';
import type { ResultFields } from '#shared/contracts/results';
import type { ExclusionRule, ReductionCaution, ReducedResult } from '#shared/core/ranking/ranking-output';
import { reduceResult } from '#shared/core/reduction/reduce-result';
import type { ReductionContext } from '#shared/core/reduction/reduction';
import { areaAtModelScale } from '#shared/core/reduction/scale';
import { Refused } from '#shared/core/refusal';
import { differingItems } from '#shared/core/similarity/condition';
import type { ImportField } from '#shared/contracts/import-fields';
import type { KnownVariant } from './check-context';

export interface MethodCaution {
  readonly code: string;
  readonly field: ImportField | undefined;
  readonly detail: string;
}

/** Road vehicles, from streamlined record cars to lorries: outside it, a unit or an area is probably wrong. */
const PLAUSIBLE_COEFFICIENT = [0.1, 1.2] as const;
/** A quoted area this far from the variant's frontal area is another area on purpose, or by mistake. */
const PLAUSIBLE_AREA_RATIO = [0.8, 1.25] as const;

const PLACEHOLDER_ID = 'result';

/**
 * What the method would say about a result on the programme's reference: cautions, and whether it would stay out of the
 * ranking. The same functions reduce it later; nothing is judged twice by two rules.
 */
export function methodCautions(
  fields: ResultFields,
  variant: KnownVariant,
  facility: Facility,
  valueField: ImportField,
  reference: ReductionContext,
): readonly MethodCaution[] {
  const cautions = areaCautions(fields, variant);
  try {
    const { output } = reduceResult(
      { ...fields, id: PLACEHOLDER_ID },
      {
        ...reference,
        models: new Map([[fields.model ?? '', { id: fields.model ?? '' }]]),
        facilities: new Map([[facility.id, facility]]),
        variants: new Map([[variant.key, { id: variant.key, frontalAreaM2: variant.frontalAreaM2 }]]),
      },
    );
    return [
      ...cautions,
      ...coefficientCautions(output.zeroYaw.dragAreaM2 / variant.frontalAreaM2, valueField),
      ...output.cautions.flatMap((caution) => cautionOf(caution, output)),
      ...output.excludedBy.map((rule) => exclusionOf(rule, output, fields, reference)),
    ];
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return [
      ...cautions,
      {
        code: `stays-out:${error.code}`,
        field: undefined,
        detail: `It would be stored and stay out of the ranking: ${error.detail}`,
      },
    ];
  }
}

function areaCautions(fields: ResultFields, variant: KnownVariant): readonly MethodCaution[] {
  const { quantity, quotedAreaM2, quotedAreaScale, scale } = fields;
  if (quantity !== 'coefficient' || quotedAreaM2 === undefined || quotedAreaScale === undefined) return [];
  const fullSizeM2 = areaAtModelScale(quotedAreaM2, quotedAreaScale, scale) / (scale * scale);
  const ratio = fullSizeM2 / variant.frontalAreaM2;
  const [low, high] = PLAUSIBLE_AREA_RATIO;
  if (ratio >= low && ratio <= high) return [];
  return [
    {
      code: 'another-area',
      field: 'quotedArea',
      detail: `The coefficient is quoted on ${digits(fullSizeM2)} m² (full size), and the frontal area of ${variant.name} is ${digits(variant.frontalAreaM2)} m². That may be meant; check unit, scale and area.`,
    },
  ];
}

function coefficientCautions(coefficient: number, field: ImportField): readonly MethodCaution[] {
  const [low, high] = PLAUSIBLE_COEFFICIENT;
  if (coefficient >= low && coefficient <= high) return [];
  return [
    {
      code: 'implausible-coefficient',
      field,
      detail: `On the variant’s frontal area this is a drag coefficient of ${digits(coefficient)}; road vehicles lie between ${String(low)} and ${String(high)}. Check value, unit, area and air.`,
    },
  ];
}

function cautionOf(caution: ReductionCaution, output: ReducedResult): readonly MethodCaution[] {
  switch (caution) {
    case 'mach':
      return [
        {
          code: 'mach',
          field: 'speed',
          detail: `Mach number ${digits(output.mach ?? NaN)}: compressibility begins to show.`,
        },
      ];
    case 'blockage':
      return [
        {
          code: 'blockage',
          field: 'scale',
          detail: `Blockage ratio ${digits(output.blockageRatio ?? 0)}: the correction is large and uncertain.`,
        },
      ];
    case 'transition':
      return [
        {
          code: 'transition',
          field: 'speed',
          detail: `Reynolds number ${output.reynolds?.toExponential(1) ?? ''} is low for a model: transition may sit in the wrong place.`,
        },
      ];
    case 'outside-cipm-2007-range':
      return [
        {
          code: 'outside-cipm-2007-range',
          field: 'temperature',
          detail:
            'This air lies outside 15–27 °C or 600–1100 hPa, for which the density formula was made. Check unit and value.',
        },
      ];
    case 'unpaired-yaw-in-unsymmetrical-sweep':
      return [
        {
          code: caution,
          field: 'yaw',
          detail: 'The sweep is not symmetrical and has a yaw angle without its opposite.',
        },
      ];
    case 'included-with-reason':
      return [];
  }
}

function exclusionOf(
  rule: ExclusionRule,
  output: ReducedResult,
  fields: ResultFields,
  reference: ReductionContext,
): MethodCaution {
  const staysOut = 'It would be stored and stay out of the ranking:';
  switch (rule) {
    case 'mach':
      return {
        code: 'stays-out:mach',
        field: 'speed',
        detail: `${staysOut} Mach number ${digits(output.mach ?? NaN)} is above ${String(reference.policies.machExcluded)}.`,
      };
    case 'blockage':
      return {
        code: 'stays-out:blockage',
        field: 'scale',
        detail: `${staysOut} blockage ratio ${digits(output.blockageRatio ?? 0)} is above the limit.`,
      };
    case 'not-comparable': {
      const items = differingItems(reference.referenceCondition, fields.condition);
      const [first] = items;
      return {
        code: 'stays-out:not-comparable',
        field: first === undefined ? undefined : CONDITION_FIELDS[first],
        detail: `${staysOut} its condition differs from the programme’s reference in ${items.map((item) => CONDITION_WORDS[item] ?? item).join(', ')}.`,
      };
    }
  }
}

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
const CONDITION_WORDS: Readonly<Record<string, string>> = {
  ground: 'ground',
  wheels: 'wheels',
  cooling: 'cooling',
  mirrors: 'mirrors',
  rideHeightFrontMm: 'front ride height',
  rideHeightRearMm: 'rear ride height',
  payloadKg: 'payload',
  tyres: 'tyres',
  beltSpeedRatio: 'belt speed ratio',
  wheelVentilationInForce: 'wheel ventilation in the force',
};

const digits = (value: number): string => String(Number(value.toPrecision(3)));
