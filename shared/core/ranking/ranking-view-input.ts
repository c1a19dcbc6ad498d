import { airOf } from '../air/air';
import type { AirInput } from '../air/air-input';
import { Refused } from '../refusal';
import type { AirChoice, AreaChoice, EvidenceBasis } from './ranking-choices';
import type {
  ContextAdoption,
  ContextConfiguration,
  ContextVariant,
  RankingContext,
} from './ranking-context';
import type { ResultInput, VariantInput } from './ranking-input';

/** The common area of a choice, and whose it is. Null where the variant meant is not in the programme (any more). */
export function chosenArea(
  choice: AreaChoice,
  programme: { readonly areaM2: number; readonly variantName: string | null },
  variants: readonly VariantInput[],
): { readonly areaM2: number; readonly of: string | null } | null {
  if (choice.kind === 'programme') return { areaM2: programme.areaM2, of: programme.variantName };
  if (choice.kind === 'typed') return { areaM2: choice.areaM2, of: null };
  const variant = variants.find(({ id }) => id === choice.variantId);
  return variant ? { areaM2: variant.frontalAreaM2, of: variant.name ?? variant.id } : null;
}

/** The air of a choice. Null where its numbers are outside what the method takes. */
export function chosenAir(choice: AirChoice, programmeAir: AirInput): AirInput | null {
  if (choice.kind === 'programme') return programmeAir;
  try {
    airOf(choice.air);
    return choice.air;
  } catch (error) {
    if (error instanceof Refused) return null;
    throw error;
  }
}

/** A variant as a configuration makes it. */
export interface ConfiguredVariant {
  readonly input: VariantInput;
  /** Null where the variant has none. */
  readonly configuration: ContextConfiguration | null;
  readonly baseStandsIn: boolean;
}

/** Every variant with the mass and road load of the configuration of that name, else of its base. */
export function configuredVariants(
  variants: readonly VariantInput[],
  context: readonly ContextVariant[],
  configuration: string | null,
): readonly ConfiguredVariant[] {
  const contextOf = new Map(context.map((variant) => [variant.id, variant]));
  return variants.map((variant) => {
    const offered = contextOf.get(variant.id)?.configurations ?? [];
    const named = configuration === null ? undefined : offered.find(({ name }) => name === configuration);
    const chosen = named ?? offered[0];
    return {
      input: {
        ...variant,
        massKg: chosen?.massKg,
        rollingResistance: chosen?.rollingResistance,
        roadLoadReference: chosen?.roadLoadReference,
      },
      configuration: chosen ?? null,
      baseStandsIn: configuration !== null && named === undefined,
    };
  });
}

/** Names of all configurations, each once, in the order in which the variants bring them. */
export function configurationNames(context: readonly ContextVariant[]): readonly string[] {
  return [...new Set(context.flatMap(({ configurations }) => configurations.map(({ name }) => name)))];
}

/** Whether the variant's energy can be computed: form (b) with a measured road load, form (a) with a rolling resistance. */
export function hasRoadLoad(variant: VariantInput): boolean {
  return variant.massKg != null && (variant.rollingResistance != null || variant.roadLoadReference != null);
}

/** What each variant rests on by adoption, those set aside left out: with none left, its newest result counts again. */
export function standingAdoptions({
  adoptions,
  setAside,
}: Pick<RankingContext, 'adoptions' | 'setAside'>): ReadonlyMap<string, ContextAdoption> {
  const aside = new Set(setAside.map(({ resultId }) => resultId));
  return new Map(
    adoptions.flatMap((adoption): readonly (readonly [string, ContextAdoption])[] => {
      const resultIds = adoption.resultIds.filter((id) => !aside.has(id));
      return resultIds.length === 0 ? [] : [[adoption.variantId, { ...adoption, resultIds }]];
    }),
  );
}

/** Which results of a programme are handed on: `all` keeps those set aside, for trying what bringing them back does. */
export type ConsideredEvidence = EvidenceBasis | 'all';

/**
 * The results that may be evidence: all that are not set aside, or, on the adopted basis, of a variant with an adoption
 * the adopted ones alone.
 */
export function consideredResults(
  results: readonly ResultInput[],
  context: Pick<RankingContext, 'adoptions' | 'setAside'>,
  evidence: ConsideredEvidence,
): readonly ResultInput[] {
  if (evidence === 'all') return results;
  const aside = new Set(context.setAside.map(({ resultId }) => resultId));
  const counting = results.filter(({ id }) => !aside.has(id));
  if (evidence === 'newest') return counting;
  const standing = standingAdoptions(context);
  return counting.filter(({ id, variantId }) => standing.get(variantId)?.resultIds.includes(id) ?? true);
}

/** Variants with the rule that their adopted evidence is formed by; on the newest basis every one has the newest. */
export function ruledVariants(
  variants: readonly VariantInput[],
  context: Pick<RankingContext, 'adoptions' | 'setAside'>,
  evidence: EvidenceBasis,
): readonly VariantInput[] {
  const standing = standingAdoptions(context);
  return variants.map((variant) => ({
    ...variant,
    evidence: (evidence === 'adopted' ? standing.get(variant.id)?.rule : null) ?? 'newest',
  }));
}
