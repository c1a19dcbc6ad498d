import type { Check } from '#shared/core/checks/check';
import { figuresOf, percent, reynoldsWords, type CheckLanguage } from './check-figures';

function machSentence(check: Check, { format }: CheckLanguage): string {
  const { value, to, excludedAbove } = figuresOf(check, (figure) =>
    format.value(figure, 'number', { digits: 2 }),
  );
  switch (check.verdict) {
    case 'passes':
      return $localize`Mach ${value}:MACH: is slow enough: the air is hardly compressed.`;
    case 'caution':
      return $localize`Mach ${value}:MACH: is over ${to}:LIMIT:: the air begins to be compressed, and the drag with it.`;
    case 'excluded':
      return $localize`Mach ${value}:MACH:, over the limit of ${excludedAbove}:LIMIT:: compressed air flows in another way, so the result stays out of the ranking.`;
  }
}

function blockageSentence(check: Check, { format }: CheckLanguage): string {
  const { value, to, excludedAbove } = figuresOf(check, (figure) => percent(figure, format));
  const openJet = check.limit?.to === null;
  switch (check.verdict) {
    case 'passes':
      return openJet
        ? $localize`The model fills ${value}:VALUE: of the nozzle, within the ${excludedAbove}:LIMIT: that are allowed.`
        : $localize`The model fills ${value}:VALUE: of the test section, little enough for the correction to be small.`;
    case 'caution':
      return $localize`The model fills ${value}:VALUE: of the test section, more than ${to}:LIMIT:: the walls squeeze the flow, and the correction is large and uncertain.`;
    case 'excluded':
      return openJet
        ? $localize`Blockage ${value}:VALUE:, over the limit of ${excludedAbove}:LIMIT: of the nozzle: the jet cannot close around the model, so the result stays out of the ranking.`
        : $localize`Blockage ${value}:VALUE:, over the limit of ${excludedAbove}:LIMIT:: no correction can be trusted, so the result stays out of the ranking.`;
  }
}

function transitionSentence(check: Check, { format }: CheckLanguage): string {
  const { value, from } = figuresOf(check, (figure) => reynoldsWords(figure, format));
  if (check.verdict !== 'passes') {
    return $localize`Reynolds number ${value}:REYNOLDS: is under ${from}:LIMIT: and nothing trips the flow: on so small a model it may turn turbulent in another place than on the car.`;
  }
  if (check.finding === 'trips') {
    return $localize`Reynolds number ${value}:REYNOLDS: is under ${from}:LIMIT:, but trips or added turbulence make the flow turbulent early, as on the car.`;
  }
  if (check.finding === 'flat-sweep') {
    return $localize`Reynolds number ${value}:REYNOLDS: is under ${from}:LIMIT:, but a sweep that reaches above it shows that the drag no longer changes.`;
  }
  return $localize`Reynolds number ${value}:REYNOLDS: is high enough for the flow to turn turbulent where it does on the car.`;
}

function reynoldsSentence(check: Check, { format }: CheckLanguage): string {
  const { value, to } = figuresOf(check, (figure) => format.text(figure, 'drag-area'));
  const caution = check.verdict !== 'passes';
  switch (check.finding) {
    case 'own-sweep':
      return $localize`Its own sweep over several speeds brings it to the reference Reynolds number: measured, not estimated.`;
    case 'other-sweep':
      return $localize`A measured sweep of the same shape brings it to the reference Reynolds number.`;
    case 'no-reynolds-correction':
      return caution
        ? $localize`The friction line is off in this programme: an estimated ${value}:VALUE: of Reynolds effect, more than ${to}:LIMIT:, stands in the uncertainty instead. A sweep over several speeds would settle it.`
        : $localize`The friction line is off in this programme; the Reynolds effect left out is small.`;
    default:
      return caution
        ? $localize`The way to the reference Reynolds number is estimated with the friction line, ${value}:VALUE:, more than ${to}:LIMIT:: a sweep over several speeds would settle it.`
        : $localize`The way to the reference Reynolds number is short: ${value}:VALUE: by the friction line.`;
  }
}

/** Sentences about how the air flows around the model. */
export function flowSentence(check: Check, language: CheckLanguage): string {
  switch (check.check) {
    case 'mach':
      return machSentence(check, language);
    case 'blockage':
      return blockageSentence(check, language);
    case 'transition':
      return transitionSentence(check, language);
    default:
      return reynoldsSentence(check, language);
  }
}
