import type { ViewInversion, ViewNotice } from './ranking-view';

/** A notice names this many variants; the rest is counted. */
const NAMED = 3;

/** A variant as two orders see it. */
export interface OrderedVariant {
  readonly variantId: string;
  readonly name: string;
  /** Its figure in the other order. */
  readonly value: number;
  /** What makes the orders differ: frontal area [m²], or mass [kg]; null where it is not known. */
  readonly cause: number | null;
}

/**
 * The cause where it explains the direction, else null. A small area makes a high coefficient, a large mass a high energy:
 * that puts a variant behind; the contrary puts it ahead.
 */
function extremeOf(
  order: ViewNotice['order'],
  behind: boolean,
  variant: OrderedVariant,
  others: readonly OrderedVariant[],
): ViewInversion['extreme'] {
  const causes = others.map(({ cause }) => cause);
  const own = variant.cause;
  if (own === null) return null;
  if ((order === 'own-area') === behind) {
    return causes.every((cause) => cause !== null && own < cause) ? 'smallest' : null;
  }
  return causes.every((cause) => cause !== null && own > cause) ? 'largest' : null;
}

/**
 * Where another order contradicts the order by drag area: the fewest variants, taken one after another by the number of
 * contradictions they are part of, that explain them all.
 *
 * @param byDragArea the variants in the order by drag area
 * @param other their ids in the other order; variants that are not in it are left out
 * @returns null where the orders agree
 */
export function noticeOf(
  order: ViewNotice['order'],
  byDragArea: readonly OrderedVariant[],
  other: readonly string[],
): ViewNotice | null {
  const place = new Map(other.map((id, index) => [id, index]));
  const placed = byDragArea.flatMap((variant) => {
    const at = place.get(variant.variantId);
    return at === undefined ? [] : [{ variant, at }];
  });
  const contradictions = placed.map(() => new Set<number>());
  placed.forEach((first, i) => {
    for (let j = i + 1; j < placed.length; j++) {
      const second = placed[j];
      if (second && second.at < first.at) {
        contradictions[i]?.add(j);
        contradictions[j]?.add(i);
      }
    }
  });
  const inversions: ViewInversion[] = [];
  for (;;) {
    const sizes = contradictions.map(({ size }) => size);
    const most = sizes.reduce((a, b) => Math.max(a, b), 0);
    if (most === 0) break;
    const index = sizes.indexOf(most);
    inversions.push(inversionAt(order, index, placed, contradictions));
  }
  if (inversions.length === 0) return null;
  return { order, inversions: inversions.slice(0, NAMED), more: Math.max(0, inversions.length - NAMED) };
}

/** Takes one variant's contradictions out of the account, as a sentence's worth of data. */
function inversionAt(
  order: ViewNotice['order'],
  index: number,
  placed: readonly { readonly variant: OrderedVariant; readonly at: number }[],
  contradictions: readonly Set<number>[],
): ViewInversion {
  const variant = (placed[index] as { readonly variant: OrderedVariant }).variant;
  const own = contradictions[index] as Set<number>;
  const later = [...own].filter((j) => j > index);
  const earlier = [...own].filter((j) => j < index);
  const behind = later.length >= earlier.length;
  const against = (behind ? later : earlier).sort((a, b) => a - b);
  const others = against.map((j) => (placed[j] as { readonly variant: OrderedVariant }).variant);
  for (const j of against) {
    own.delete(j);
    contradictions[j]?.delete(index);
  }
  return {
    variantId: variant.variantId,
    name: variant.name,
    direction: behind ? 'behind' : 'ahead',
    value: variant.value,
    others: others.map(({ variantId, name, value }) => ({ variantId, name, value })),
    extreme: extremeOf(order, behind, variant, others),
  };
}
