import type { CorrelationReplaces } from '#shared/contracts/correlations';

export interface ReplacedWords {
  readonly value: CorrelationReplaces;
  readonly words: string;
  readonly hint: string;
}

/** The steps that a correlation may stand for, and what that means for a figure. */
export const REPLACED_STEPS: readonly ReplacedWords[] = [
  {
    value: 'blockage',
    words: $localize`the blockage correction`,
    hint: $localize`Figures from this facility enter without its blockage correction, for the pairs hold it already; its limits still count.`,
  },
  {
    value: 'reynolds',
    words: $localize`the Reynolds number`,
    hint: $localize`Figures enter as measured, at the Reynolds number of the test; the pairs carry them to that of the reference facility.`,
  },
  {
    value: 'ground-simulation',
    words: $localize`the ground, the wheels and the belt`,
    hint: $localize`Ground, wheels and belt speed are not compared with the programme’s condition and no adjustment is applied for them.`,
  },
];

export function replacedWords(replaces: readonly CorrelationReplaces[]): string {
  const words = REPLACED_STEPS.filter(({ value }) => replaces.includes(value)).map((step) => step.words);
  return words.length === 0 ? $localize`no other step` : words.join(', ');
}

const REFUSALS: Readonly<Record<string, string>> = {
  'correlation-too-few-pairs': $localize`At least two pairs are needed: with fewer, nothing shows whether another geometry would agree.`,
  'correlation-no-spread': $localize`Every pair has the same drag area, so there is no slope in them and the correlation would hold for that one figure only. Take in a geometry with another drag area.`,
  'correlation-negative-slope': $localize`The line falls: more drag in one facility would be less in the other. Look for a pair that does not belong, or for two figures that changed places.`,
  'uncertainty-zero': $localize`A pair has an uncertainty of zero. That is never known, and the pair would outweigh all others: state its u, above 0, or leave the pair out with a reason.`,
};

/** Why no line can be laid through the pairs. */
export const refusalWords = (code: string): string =>
  REFUSALS[code] ?? $localize`No line can be laid through these pairs (${code}:CODE:).`;

const RULES: Readonly<Record<string, string>> = {
  'not-comparable': $localize`not comparable with the programme’s reference condition`,
  mach: $localize`Mach number over the limit`,
  blockage: $localize`blockage over the limit`,
};
const CAUTIONS: Readonly<Record<string, string>> = {
  blockage: $localize`blockage above the caution limit`,
  mach: $localize`Mach number above the caution limit`,
  transition: $localize`low Reynolds number: transition may sit in the wrong place`,
  'included-with-reason': $localize`included with a reason though not comparable`,
  'outside-cipm-2007-range': $localize`air outside the range of the density formula`,
  'unpaired-yaw-in-unsymmetrical-sweep': $localize`a yaw point without its pair`,
};

export const ruleWord = (rule: string): string => RULES[rule] ?? rule;
export const cautionWord = (caution: string): string => CAUTIONS[caution] ?? caution;
