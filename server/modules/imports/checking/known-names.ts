import type { Facility } from '#shared/contracts/facilities';
import type { ImportMapping } from '#shared/contracts/imports';
import type { Variant } from '#shared/contracts/variants';
import { nameKey, type KnownVariant } from './check-context';

/** The frontal area that counts is the newest; the list comes newest first. */
function known(variant: Variant): KnownVariant {
  return {
    key: variant.id,
    name: variant.name,
    bodyShape: variant.bodyShape,
    frontalAreaM2: variant.frontalAreas[0]?.areaM2 ?? Number.NaN,
  };
}

export const newVariantKey = (text: string): string => `new:${nameKey(text)}`;

/**
 * Which variant a text in the file means: one of that name or alias; else as the person chose. A name that the programme
 * knows goes before a choice, so that nothing is created twice.
 */
export function variantLookup(
  variants: readonly Variant[],
  choices: ImportMapping['variants'],
): (text: string) => KnownVariant | 'skip' | undefined {
  const byName = new Map<string, KnownVariant | 'skip'>();
  const byId = new Map(variants.map((variant) => [variant.id, variant]));
  for (const choice of choices) {
    if (choice.action === 'skip') byName.set(nameKey(choice.text), 'skip');
    else if (choice.action === 'create')
      byName.set(nameKey(choice.text), {
        key: newVariantKey(choice.text),
        name: choice.name,
        bodyShape: choice.bodyShape,
        frontalAreaM2: choice.frontalAreaM2,
      });
    else {
      const variant = byId.get(choice.variantId);
      if (variant !== undefined) byName.set(nameKey(choice.text), known(variant));
    }
  }
  for (const variant of variants) {
    if (variant.retiredAt !== undefined) continue;
    for (const alias of variant.aliases) byName.set(nameKey(alias), known(variant));
  }
  for (const variant of variants)
    if (variant.retiredAt === undefined) byName.set(nameKey(variant.name), known(variant));
  return (text) => byName.get(nameKey(text));
}

export function facilityLookup(
  facilities: readonly Facility[],
  choices: ImportMapping['facilities'],
): (text: string) => Facility | undefined {
  const byId = new Map(facilities.map((facility) => [facility.id, facility]));
  const byName = new Map<string, Facility>();
  for (const { text, facilityId } of choices) {
    const facility = byId.get(facilityId);
    if (facility !== undefined) byName.set(nameKey(text), facility);
  }
  for (const facility of facilities)
    if (facility.retiredAt === undefined) byName.set(nameKey(facility.name), facility);
  return (text) => byName.get(nameKey(text));
}

interface Named {
  readonly id: string;
  readonly name: string;
  readonly aliases?: readonly string[];
  readonly retiredAt?: string | undefined;
}

/** Alike enough to be suggested: half of the letter pairs in common. */
const LIKELY = 0.5;

/** The one that a text most likely means, by the pairs of letters in common (Dice, Ecology 26 (1945) 297). */
export function likeliest(text: string, candidates: readonly Named[]): string | undefined {
  let best: { readonly id: string; readonly likeness: number } | undefined;
  for (const candidate of candidates) {
    if (candidate.retiredAt !== undefined) continue;
    for (const name of [candidate.name, ...(candidate.aliases ?? [])]) {
      const likeness = likenessOf(nameKey(text), nameKey(name));
      if (likeness >= LIKELY && likeness > (best?.likeness ?? 0)) best = { id: candidate.id, likeness };
    }
  }
  return best?.id;
}

function likenessOf(one: string, other: string): number {
  const pairs = (text: string): Set<string> =>
    new Set(Array.from({ length: Math.max(0, text.length - 1) }, (_, i) => text.slice(i, i + 2)));
  const first = pairs(one);
  const second = pairs(other);
  const common = [...first].filter((pair) => second.has(pair)).length;
  return first.size + second.size === 0 ? 0 : (2 * common) / (first.size + second.size);
}
