import type { Remedy, ViewExclusion, ViewExclusionRule } from '#shared/core/ranking/ranking-view';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords, isConditionItem } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { listWords } from './ranking-words';

type Item = ViewExclusionRule['items'][number];

/** `ground fixed floor, not one belt` */
function itemWords({ item, reference, stated }: Item, locale: NumberLocale): string {
  if (!isConditionItem(item)) return item;
  const words = conditionItemWord(item).toLocaleLowerCase();
  const wanted = conditionValueWords(item, reference as never, locale);
  if (stated === null) return $localize`${words}:ITEM: is not stated`;
  return $localize`${words}:ITEM: ${conditionValueWords(item, stated as never, locale)}:STATED:, not ${wanted}:WANTED:`;
}

const WIND_AVERAGE: Readonly<Record<string, string>> = {
  'yaw-too-few-angles': $localize`fewer than three yaw angles`,
  'yaw-no-zero': $localize`no point at zero yaw`,
  'yaw-extrapolation': $localize`the yaw sweep does not reach far enough for the wind`,
  'yaw-mixed-speeds': $localize`the yaw sweep was run at several speeds`,
  'wind-ratio': $localize`the wind is not slower than the reference speed`,
  'missing-input': $localize`the yaw points have no uncertainty`,
};

/** Why one rule keeps a result out. */
export function ruleWords(rule: ViewExclusionRule, format: QuantityFormat, locale: NumberLocale): string {
  if (rule.rule === 'not-comparable') {
    const items = listWords(rule.items.map((item) => itemWords(item, locale)));
    return $localize`not comparable with the reference condition: ${items}:ITEMS:`;
  }
  if (rule.rule === 'set-aside') {
    return rule.detail === null
      ? $localize`set aside by judgement`
      : $localize`set aside: ${rule.detail}:REASON:`;
  }
  if (rule.rule === 'mach') {
    const [value, limit] = [rule.value, rule.limit].map((number) =>
      format.value(number ?? 0, 'number', { digits: 2 }),
    );
    return $localize`Mach ${value}:VALUE:, over the limit of ${limit}:LIMIT:`;
  }
  if (rule.rule === 'blockage') {
    const [value, limit] = [rule.value, rule.limit].map((number) =>
      format.text(100 * (number ?? 0), 'percent', { digits: 1 }),
    );
    return $localize`blockage ${value}:VALUE:, over the limit of ${limit}:LIMIT:`;
  }
  const code = rule.rule.slice(rule.rule.indexOf(':') + 1);
  if (rule.rule.startsWith('no-wind-average')) {
    return $localize`no wind average: ${WIND_AVERAGE[code] ?? code}:REASON:`;
  }
  return rule.detail ?? $localize`the method refused it (${code}:CODE:)`;
}

/** Why a rule keeps results out, without what it found in one of them. */
export function ruleTitle(rule: ViewExclusionRule, format: QuantityFormat, locale: NumberLocale): string {
  if (rule.rule === 'not-comparable') return $localize`not comparable with the reference condition`;
  if (rule.rule === 'mach') {
    const limit = format.value(rule.limit ?? 0, 'number', { digits: 2 });
    return $localize`Mach number over the limit of ${limit}:LIMIT:`;
  }
  if (rule.rule === 'blockage') {
    const limit = format.text(100 * (rule.limit ?? 0), 'percent', { digits: 1 });
    return $localize`blockage over the limit of ${limit}:LIMIT:`;
  }
  return ruleWords({ ...rule, detail: null }, format, locale);
}

const REMEDIES: Readonly<Record<Remedy, string>> = {
  'include-with-reason': $localize`An aerodynamicist may include it with a written reason; an adjustment for what differs brings it in without one.`,
  'change-policy': $localize`The limit is a policy of the organisation; a programme manager or aerodynamicist may ask for another.`,
  'enter-anew': $localize`An aerodynamicist may withdraw it and enter it anew.`,
  'measure-yaw': $localize`It counts at zero yaw; a yaw sweep would bring it in here.`,
  'bring-back': $localize`An aerodynamicist may bring it back.`,
};

export const remedyWords = (remedy: Remedy): string => REMEDIES[remedy];

/** `Crossback, B-2603-05, Burnholt fixed floor, 2026-03-03` */
export function exclusionName({ variantName, name, facilityName, testDate }: ViewExclusion): string {
  return [variantName, name, facilityName, testDate].filter(Boolean).join(', ');
}

/** Every reason why a result stayed out. */
export function exclusionReasons(
  exclusion: ViewExclusion,
  format: QuantityFormat,
  locale: NumberLocale,
): string {
  return listWords(exclusion.rules.map((rule) => ruleWords(rule, format, locale)));
}
