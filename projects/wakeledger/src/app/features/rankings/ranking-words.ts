import type { RankingView, ViewGroup, ViewInversion, ViewNotice } from '#shared/core/ranking/ranking-view';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

const LIST_END = $localize`:between the last two of a list:and`;

export function listWords(parts: readonly string[]): string {
  if (parts.length < 2) return parts[0] ?? '';
  return `${parts.slice(0, -1).join(', ')} ${LIST_END} ${parts.at(-1)}`;
}

/** A probability as it is read: two digits, and never certainty. */
export function probabilityWords(probability: number, format: QuantityFormat): string {
  if (probability > 0.995) return `> ${format.value(0.99, 'number', { digits: 2 })}`;
  if (probability < 0.005) return `< ${format.value(0.01, 'number', { digits: 2 })}`;
  return format.value(probability, 'number', { digits: 2 });
}

/** `Hatch and Sport: 0.006 m² apart, probability 0.71 that Hatch is lower.` */
export function groupSentence(group: ViewGroup, view: RankingView, format: QuantityFormat): string {
  const names = listWords(group.names);
  const first = group.names[0] ?? '';
  const apart = format.text(group.difference, view.order === 'energy' ? 'energy-per-distance' : 'drag-area');
  const probability = probabilityWords(group.probability, format);
  return group.names.length === 2
    ? $localize`${names}:NAMES:: ${apart}:APART: apart, probability ${probability}:P: that ${first}:FIRST: is lower.`
    : $localize`${names}:NAMES:: no two can be told apart; ${apart}:APART: from first to last, probability ${probability}:P: that ${first}:FIRST: is lower.`;
}

function causeWords(inversion: ViewInversion, order: ViewNotice['order']): string {
  if (inversion.extreme === null) return '';
  if (order === 'own-area') {
    return inversion.extreme === 'smallest'
      ? $localize`its area is the smallest`
      : $localize`its area is the largest`;
  }
  return inversion.extreme === 'smallest' ? $localize`it is the lightest` : $localize`it is the heaviest`;
}

function inversionWords(
  inversion: ViewInversion,
  order: ViewNotice['order'],
  format: QuantityFormat,
): string {
  const kind = order === 'own-area' ? 'coefficient' : 'energy-per-distance';
  const figure = (value: number): string => format.text(value, kind);
  const own = `${inversion.name} (${figure(inversion.value)})`;
  const others = listWords(
    inversion.others.slice(0, 4).map(({ name, value }) => `${name} (${figure(value)})`),
  );
  const words =
    inversion.direction === 'behind'
      ? $localize`${own}:VARIANT: would rank behind ${others}:OTHERS:`
      : $localize`${own}:VARIANT: would rank ahead of ${others}:OTHERS:`;
  const cause = causeWords(inversion, order);
  return cause ? `${words}: ${cause}` : words;
}

/** What a notice says, naming the variants with their numbers. */
export function noticeSentence(notice: ViewNotice, view: RankingView, format: QuantityFormat): string {
  const inversions = notice.inversions.map((each) => inversionWords(each, notice.order, format)).join('; ');
  const more = notice.more > 0 ? $localize`; and ${notice.more}:COUNT: more` : '';
  return notice.order === 'own-area'
    ? $localize`On each variant’s own frontal area, ${inversions}:INVERSIONS:${more}:MORE:. Drag area is what the road feels.`
    : $localize`By energy on ${view.cycle?.name ?? ''}:CYCLE:, ${inversions}:INVERSIONS:${more}:MORE:. Mass and rolling resistance count there too.`;
}

const IGNORED: Readonly<Record<RankingView['ignored'][number], string>> = {
  area: $localize`the reference area in the address belongs to no variant of this programme`,
  air: $localize`the air in the address is outside what the method takes`,
  cycle: $localize`the cycle in the address does not exist here`,
  configuration: $localize`no variant has the configuration in the address`,
  order: $localize`no variant has what the order by energy needs`,
};

/** What in the address did not fit and was left at its default. */
export function ignoredSentences(view: RankingView): readonly string[] {
  return view.ignored.map((choice) => IGNORED[choice]);
}
