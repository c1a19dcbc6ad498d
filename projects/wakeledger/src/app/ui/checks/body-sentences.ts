import type { Check } from '#shared/core/checks/check';
import { figuresOf, isBelow, type CheckFigures, type CheckLanguage } from './check-figures';

function plausible(check: Check, { value, from, to }: CheckFigures): string {
  const passes = check.verdict === 'passes';
  if (check.check === 'drag-coefficient') {
    return passes
      ? $localize`A drag coefficient of ${value}:VALUE: on the frontal area is usual for this body shape.`
      : $localize`A drag coefficient of ${value}:VALUE: on the frontal area is outside the ${from}:FROM: to ${to}:TO: that this body shape usually has. Check value, unit, area and air.`;
  }
  if (check.check === 'frontal-area') {
    return passes
      ? $localize`A frontal area of ${value}:VALUE: is usual for this body shape.`
      : $localize`A frontal area of ${value}:VALUE: is outside the ${from}:FROM: to ${to}:TO: that this body shape usually has. Check the variant’s area.`;
  }
  if (passes)
    return $localize`The coefficient is quoted on ${value}:VALUE: (full size), close to the variant’s frontal area.`;
  return isBelow(check)
    ? $localize`The coefficient is quoted on ${value}:VALUE: (full size), much less than the variant’s frontal area. That may be meant; check unit, scale and area.`
    : $localize`The coefficient is quoted on ${value}:VALUE: (full size), much more than the variant’s frontal area. That may be meant; check unit, scale and area.`;
}

function lift(check: Check, { value, to }: CheckFigures): string {
  const front = check.check === 'front-lift';
  if (check.verdict === 'passes') {
    return front
      ? $localize`A lift coefficient of ${value}:VALUE: at the front axle is within the limit of ${to}:LIMIT:.`
      : $localize`A lift coefficient of ${value}:VALUE: at the rear axle is within the limit of ${to}:LIMIT:.`;
  }
  return front
    ? $localize`A lift coefficient of ${value}:VALUE: at the front axle is over the limit of ${to}:LIMIT:: the car would steer lightly at speed.`
    : $localize`A lift coefficient of ${value}:VALUE: at the rear axle is over the limit of ${to}:LIMIT:: the car would lose stability at speed.`;
}

/** Sentences about the body: its coefficients and areas. */
export function bodySentence(check: Check, { format }: CheckLanguage): string {
  const figures = figuresOf(check, (figure) =>
    check.unit === 'm²'
      ? format.text(figure, 'area', { digits: 2 })
      : format.value(figure, 'coefficient', { digits: 3 }),
  );
  const isLift = check.check === 'front-lift' || check.check === 'rear-lift';
  return isLift ? lift(check, figures) : plausible(check, figures);
}
