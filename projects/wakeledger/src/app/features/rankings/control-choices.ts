import { AIR_STATES } from '#shared/contracts/condition';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { AIR_STATE_WORDS } from '../../ui/words/evidence-words';

/** One thing that a control offers: the text that stands in the address, and the words for a person. */
export interface Offer {
  readonly value: string;
  readonly words: string;
}

export const ORDER_OFFERS: readonly Offer[] = [
  { value: 'drag-area', words: $localize`Drag area` },
  { value: 'energy', words: $localize`Energy` },
];

export const BASIS_OFFERS: readonly Offer[] = [
  { value: 'zero-yaw', words: $localize`Zero yaw` },
  { value: 'wind-averaged', words: $localize`Wind-averaged` },
];

export const EVIDENCE_OFFERS: readonly Offer[] = [
  { value: 'adopted', words: $localize`Adopted` },
  { value: 'newest', words: $localize`Newest` },
];

/** Offered beside whatever stands in the address. */
const CONFIDENCES = [0.8, 0.9, 0.95, 0.99];

export const TYPED_AREA = 'typed';
export const CUSTOM_AIR = 'custom';
export const CONSTANT_SPEED = 'constant';

type Offers = RankingView['offers'];

export function areaOffers(offers: Offers, format: QuantityFormat): readonly Offer[] {
  const area = (areaM2: number): string => format.text(areaM2, 'area');
  const own = offers.programmeAreaOf ?? $localize`the programme’s`;
  return [
    { value: 'programme', words: `${area(offers.programmeAreaM2)}, ${own}` },
    ...offers.areas
      .filter(({ name }) => name !== offers.programmeAreaOf)
      .map(({ variantId, name, areaM2 }) => ({
        value: `variant:${variantId}`,
        words: `${area(areaM2)}, ${name}`,
      })),
    { value: TYPED_AREA, words: $localize`another area …` },
  ];
}

function programmeAirWords(air: Offers['programmeAir'], format: QuantityFormat): string {
  const named = AIR_STATES.find((state) => state === air.state);
  if (named) return AIR_STATE_WORDS[named];
  const temperature = format.text(air.temperatureC ?? 0, 'temperature');
  return `${temperature}, ${format.text(air.pressurePa ?? 0, 'pressure', { digits: 0 })}`;
}

export function airOffers(offers: Offers, format: QuantityFormat): readonly Offer[] {
  const own = programmeAirWords(offers.programmeAir, format);
  return [
    { value: 'programme', words: $localize`the programme’s: ${own}:AIR:` },
    ...AIR_STATES.filter((state) => state !== offers.programmeAir.state).map((state) => ({
      value: state,
      words: AIR_STATE_WORDS[state],
    })),
    { value: CUSTOM_AIR, words: $localize`another air …` },
  ];
}

export function configurationOffers(offers: Offers): readonly Offer[] {
  return [
    { value: 'base', words: $localize`Base` },
    ...offers.configurations.map((name) => ({ value: name, words: name })),
  ];
}

export function cycleOffers(offers: Offers): readonly Offer[] {
  return [
    ...offers.cycles.map(({ key, name }) => ({ value: key, words: name })),
    { value: CONSTANT_SPEED, words: $localize`a constant speed …` },
  ];
}

export function confidenceOffers(offers: Offers, chosen: number, format: QuantityFormat): readonly Offer[] {
  const all = new Set([...CONFIDENCES, offers.programmeConfidence, chosen]);
  return [...all]
    .sort((a, b) => a - b)
    .map((confidence) => ({
      value: String(confidence),
      words: format.text(confidence * 100, 'percent', {
        digits: Number.isInteger(Number((confidence * 100).toPrecision(9))) ? 0 : 1,
      }),
    }));
}
