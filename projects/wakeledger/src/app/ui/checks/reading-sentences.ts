import type { Check } from '#shared/core/checks/check';
import { figuresOf, percent, type CheckLanguage } from './check-figures';

function repeatability(check: Check, { format }: CheckLanguage): string {
  if (check.finding === 'stated-uncertainty') {
    return $localize`The source states its whole uncertainty instead of the scatter of its readings.`;
  }
  const { value, to } = figuresOf(check, (figure) => percent(figure, format, 2));
  const ofFacility = check.finding === 'facility-repeatability';
  if (check.verdict === 'passes') {
    return ofFacility
      ? $localize`Readings of this facility scatter by ${value}:VALUE:, within ${to}:LIMIT:.`
      : $localize`Its readings scatter by ${value}:VALUE:, within ${to}:LIMIT:.`;
  }
  return ofFacility
    ? $localize`Readings of this facility scatter by ${value}:VALUE:, more than ${to}:LIMIT:. State the scatter of this result’s own readings where it is known.`
    : $localize`Its readings scatter by ${value}:VALUE:, more than ${to}:LIMIT:: something moved between them, or the unit of the standard deviation is another.`;
}

function yawCoverage(check: Check, { format }: CheckLanguage): string {
  const { value, from } = figuresOf(check, (figure) => format.text(figure, 'angle'));
  switch (check.finding) {
    case 'zero-yaw-only':
      return $localize`Measured straight ahead only: it counts at zero yaw and has no wind average.`;
    case 'no-wind-average':
      return $localize`The angles, up to ${value}:VALUE:, do not give a wind average; it counts at zero yaw.`;
    default:
      return check.verdict === 'passes'
        ? $localize`The sweep reaches ${value}:VALUE: of yaw, as far as side wind needs.`
        : $localize`The sweep reaches ${value}:VALUE: of yaw, less than ${from}:LIMIT:: the wind average rests on fewer angles than you ask for.`;
  }
}

/** Sentences about the readings themselves. */
export function readingSentence(check: Check, language: CheckLanguage): string {
  switch (check.check) {
    case 'repeatability':
      return repeatability(check, language);
    case 'yaw-coverage':
      return yawCoverage(check, language);
    default:
      return check.verdict === 'passes'
        ? $localize`Wind from the left and from the right were measured alike, or give the same drag.`
        : $localize`Left and right differ, and some angle was measured on one side only: its opposite is missing.`;
  }
}
