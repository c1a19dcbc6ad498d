import type { Facility } from '#shared/contracts/facilities';
import type { Programme } from '#shared/contracts/programmes';
import type { ResultFields } from '#shared/contracts/results';
import type { FrontalArea, Variant } from '#shared/contracts/variants';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { reduceResults } from '#shared/core/reduction/reduce';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import { Refused, type Refusal } from '#shared/core/refusal';

export type Preview =
  | { readonly kind: 'reduced'; readonly reduction: Reduction; readonly context: ReductionContext }
  | { readonly kind: 'refused'; readonly refusal: Refusal };

export interface PreviewSurroundings {
  readonly programme: Programme;
  readonly variant: Variant;
  readonly facility: Facility;
}

const ID = 'typed';

/** What the result would come to at the programme's reference, by the very functions that rank it once it is saved. */
export function previewOf(fields: ResultFields, surroundings: PreviewSurroundings): Preview {
  try {
    const { context, reductions, refused } = reduceResults(inputOf(fields, surroundings));
    const [reduction] = reductions;
    if (reduction) return { kind: 'reduced', reduction, context };
    const [refusal] = refused;
    if (refusal) return { kind: 'refused', refusal };
    throw new Error('A result is either reduced or refused.');
  } catch (error) {
    if (error instanceof Refused) return { kind: 'refused', refusal: error };
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
  const { programme, variant, facility } = surroundings;
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
      policies: { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 },
    },
    facilities: [facility],
    models: fields.model === undefined ? [] : [{ id: fields.model, name: fields.model }],
    variants: [
      {
        id: variant.id,
        name: variant.name,
        frontalAreaM2: area?.areaM2 ?? Number.NaN,
        frontalAreaUM2: area?.uM2,
      },
    ],
    results: [
      {
        ...fields,
        id: ID,
        sessionId: fields.session,
        installationId: fields.installation,
        modelId: fields.model,
      },
    ],
  };
}
