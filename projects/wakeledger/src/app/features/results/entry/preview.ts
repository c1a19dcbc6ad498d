import type { Facility } from '#shared/contracts/facilities';
import type { PolicyVersion } from '#shared/contracts/policies';
import type { Programme } from '#shared/contracts/programmes';
import type { ResultFields } from '#shared/contracts/results';
import type { FrontalArea, Variant } from '#shared/contracts/variants';
import type { Check } from '#shared/core/checks/check';
import { checksOf, checksOfRefused } from '#shared/core/checks/checks-of';
import { policiesInputOf } from '#shared/core/checks/limits';
import { judgedResult } from '#shared/core/ranking/judged-result';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { reduceResults } from '#shared/core/reduction/reduce';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import { Refused, type Refusal } from '#shared/core/refusal';

export type Preview =
  | {
      readonly kind: 'reduced';
      readonly reduction: Reduction;
      readonly context: ReductionContext;
      readonly checks: readonly Check[];
    }
  | { readonly kind: 'refused'; readonly refusal: Refusal; readonly checks: readonly Check[] }
  /** Nothing to do with this result: the programme itself cannot be used. */
  | { readonly kind: 'no-reference'; readonly refusal: Refusal };

export interface PreviewSurroundings {
  readonly programme: Programme;
  readonly variant: Variant;
  readonly facility: Facility;
  /** The limits in force. */
  readonly policies: PolicyVersion;
  /** What the organisation knows beside it: adjustments and correlations; null where the programme has none to hand on yet. */
  readonly document: Pick<RankingInput, 'facilities' | 'adjustments' | 'correlations'> | null;
}

const ID = 'typed';

/** What the result would come to at the programme's reference, and its checks, by the very functions that rank it later. */
export function previewOf(fields: ResultFields, surroundings: PreviewSurroundings): Preview {
  const limits = surroundings.policies.values;
  const { bodyShape } = surroundings.variant;
  try {
    const { context, reductions, refused } = reduceResults(inputOf(fields, surroundings));
    const [reduction] = reductions;
    if (reduction) {
      return {
        kind: 'reduced',
        reduction,
        context,
        checks: checksOf(reduction, { context, limits }, bodyShape),
      };
    }
    const [refusal] = refused;
    if (refusal) return { kind: 'refused', refusal, checks: checksOfRefused(refusal, fields, limits) };
    throw new Error('A result is either reduced or refused.');
  } catch (error) {
    if (error instanceof Refused) return { kind: 'no-reference', refusal: error };
    throw error;
  }
}

function newest(areas: readonly FrontalArea[]): FrontalArea | undefined {
  return areas.reduce<FrontalArea | undefined>(
    (found, area) => (found === undefined || area.date > found.date ? area : found),
    undefined,
  );
}

function inputOf(fields: ResultFields, surroundings: PreviewSurroundings): RankingInput {
  const { programme, variant, facility, policies, document } = surroundings;
  const area = newest(variant.frontalAreas);
  return {
    programme: {
      referenceSpeedKmh: programme.referenceSpeedKmh,
      referenceAir: programme.referenceAir,
      characteristicLengthM: programme.characteristicLengthM,
      commonAreaM2: area?.areaM2 ?? Number.NaN,
      confidence: programme.confidence,
      referenceCondition: programme.referenceCondition,
      windSpeedMs: programme.windSpeedMs,
      referenceFacilityId: programme.referenceFacilityId,
      policies: policiesInputOf(policies.values, policies.number, programme.frictionLine ?? 'on'),
    },
    facilities: [facility, ...(document?.facilities ?? []).filter(({ id }) => id !== facility.id)],
    adjustments: document?.adjustments,
    correlations: document?.correlations,
    models: fields.model === undefined ? [] : [{ id: fields.model, name: fields.model }],
    variants: [
      {
        id: variant.id,
        name: variant.name,
        frontalAreaM2: area?.areaM2 ?? Number.NaN,
        frontalAreaUM2: area?.uM2,
      },
    ],
    // As it will be held until somebody judges it: points at several speeds are a sweep of their own.
    results: [
      judgedResult(
        {
          ...fields,
          id: ID,
          sessionId: fields.session,
          installationId: fields.installation,
          modelId: fields.model,
        },
        undefined,
      ),
    ],
  };
}
