import type { ImportDetail, ImportMapping, VariantChoice } from '#shared/contracts/imports';
import type { BODY_SHAPES } from '#shared/contracts/variants';
import { parseTypedNumber } from '../../core/numbers/parse-typed-number';

export type BodyShape = (typeof BODY_SHAPES)[number];

/** One unknown variant as it stands on the screen: numbers are texts until they are sent. */
export interface VariantDraft {
  readonly text: string;
  readonly rows: number;
  readonly action: 'open' | VariantChoice['action'];
  readonly variantId: string;
  readonly name: string;
  readonly bodyShape: BodyShape;
  readonly area: string;
  readonly areaU: string;
  readonly mass: string;
  readonly rolling: string;
}

export interface FacilityDraft {
  readonly text: string;
  readonly rows: number;
  readonly facilityId: string;
}

const same = (one: string, other: string): boolean => one.toLowerCase() === other.toLowerCase();
const shown = (value: number | undefined): string => (value === undefined ? '' : String(value));

export function variantDrafts(detail: ImportDetail): readonly VariantDraft[] {
  return detail.unknownVariants.map(({ text, rows, suggestedId }) => {
    const chosen = detail.mapping.variants.find((choice) => same(choice.text, text));
    const created = chosen?.action === 'create' ? chosen : undefined;
    return {
      text,
      rows,
      action: chosen?.action ?? (suggestedId === undefined ? 'open' : 'match'),
      variantId: chosen?.action === 'match' ? chosen.variantId : (suggestedId ?? ''),
      name: created?.name ?? text,
      bodyShape: created?.bodyShape ?? 'other',
      area: shown(created?.frontalAreaM2),
      areaU: shown(created?.frontalAreaUM2),
      mass: shown(created?.massKg),
      rolling: shown(created?.rollingResistance),
    };
  });
}

export function facilityDrafts(detail: ImportDetail): readonly FacilityDraft[] {
  return detail.unknownFacilities.map(({ text, rows, suggestedId }) => ({
    text,
    rows,
    facilityId:
      detail.mapping.facilities.find((choice) => same(choice.text, text))?.facilityId ?? suggestedId ?? '',
  }));
}

/** What is typed where a number belongs: absent, a number, or neither. */
function numberIn(text: string): number | undefined | 'unreadable' {
  const typed = parseTypedNumber(text, { minimum: 0, maximum: 100_000 });
  if (typed.kind === 'empty') return undefined;
  return typed.kind === 'number' ? typed.value : 'unreadable';
}

/** What is missing or cannot be read in a variant to be created; undefined when all is well. */
export function troubleOf(draft: VariantDraft): string | undefined {
  if (draft.action === 'match' && draft.variantId === '') return $localize`Choose the variant that it is.`;
  if (draft.action !== 'create') return undefined;
  if (draft.name.trim() === '') return $localize`Give the new variant a name.`;
  const area = numberIn(draft.area);
  if (typeof area !== 'number' || area <= 0)
    return $localize`State the frontal area in m², for example 2.17.`;
  const others = [draft.areaU, draft.mass, draft.rolling].map(numberIn);
  if (others.includes('unreadable')) return $localize`Write digits with a comma or a point.`;
  if ((draft.mass.trim() === '') !== (draft.rolling.trim() === ''))
    return $localize`State mass and rolling resistance together, or leave both for later.`;
  return undefined;
}

function optional<K extends string>(key: K, text: string): { [P in K]?: number } {
  const value = numberIn(text);
  return typeof value === 'number' ? ({ [key]: value } as { [P in K]?: number }) : {};
}

function choiceOf(draft: VariantDraft): VariantChoice | undefined {
  const { text, action } = draft;
  if (action === 'skip') return { action, text };
  if (action === 'match') return { action, text, variantId: draft.variantId };
  if (action === 'open') return undefined;
  const area = numberIn(draft.area);
  return {
    action,
    text,
    name: draft.name.trim(),
    bodyShape: draft.bodyShape,
    frontalAreaM2: typeof area === 'number' ? area : 0,
    ...optional('frontalAreaUM2', draft.areaU),
    ...optional('massKg', draft.mass),
    ...optional('rollingResistance', draft.rolling),
  };
}

/** The mapping with these choices; those about names that are no longer in question stay. */
export function withNames(
  mapping: ImportMapping,
  variants: readonly VariantDraft[],
  facilities: readonly FacilityDraft[],
): ImportMapping {
  const keptVariants = mapping.variants.filter(
    ({ text }) => !variants.some((draft) => same(draft.text, text)),
  );
  const keptFacilities = mapping.facilities.filter(
    ({ text }) => !facilities.some((draft) => same(draft.text, text)),
  );
  return {
    ...mapping,
    variants: [...keptVariants, ...variants.flatMap((draft) => choiceOf(draft) ?? [])],
    facilities: [
      ...keptFacilities,
      ...facilities
        .filter(({ facilityId }) => facilityId !== '')
        .map(({ text, facilityId }) => ({ text, facilityId })),
    ],
  };
}
