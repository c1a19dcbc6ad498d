import { celsiusOfFahrenheit } from '#shared/core/checks/unit-suspicion';
import { CELSIUS_ZERO_K } from '#shared/core/constants';
import type { Check, CheckFinding } from '#shared/core/checks/check';
import { figuresOf, hectopascals, type CheckLanguage } from './check-figures';

/** What was probably meant, where a value looks like one in another unit. */
function suspicion(
  value: number | null,
  finding: CheckFinding | null,
  { format }: CheckLanguage,
): string | undefined {
  if (value === null) return undefined;
  const typed = format.significant(value, 5);
  const celsius = (degrees: number): string => format.text(degrees, 'temperature');
  switch (finding) {
    case 'kelvin':
      return $localize`It looks like kelvin: ${typed}:TYPED: K is ${celsius(value - CELSIUS_ZERO_K)}:CELSIUS:.`;
    case 'fahrenheit':
      return $localize`It looks like degrees Fahrenheit: ${typed}:TYPED: °F is ${celsius(celsiusOfFahrenheit(value))}:CELSIUS:.`;
    case 'hectopascal':
      return $localize`It looks like hectopascals: ${typed}:TYPED: hPa is ${format.value(value * 100, 'number', { digits: 0 })}:PASCAL: Pa.`;
    case 'kilopascal':
      return $localize`It looks like kilopascals: ${typed}:TYPED: kPa is ${format.value(value * 1000, 'number', { digits: 0 })}:PASCAL: Pa.`;
    case 'bar':
      return $localize`It looks like bar: ${typed}:TYPED: bar is ${format.value(value * 1e5, 'number', { digits: 0 })}:PASCAL: Pa.`;
    case 'percent':
      return $localize`It looks like per cent: ${typed}:TYPED: % is ${format.significant(value / 100, 3)}:FRACTION: as a fraction.`;
    default:
      return undefined;
  }
}

function refusedSentence(check: Check, language: CheckLanguage): string {
  const detail = check.refusal?.detail ?? '';
  const meant = suspicion(check.value, check.finding, language);
  const said = $localize`No drag area can be formed from it: ${detail}:DETAIL:`;
  return meant === undefined ? said : `${said} ${meant}`;
}

function hallSentence(check: Check, language: CheckLanguage): string {
  const { format } = language;
  const byTemperature = check.check === 'hall-temperature';
  const { value, from, to } = figuresOf(check, (figure) =>
    byTemperature ? format.text(figure, 'temperature') : hectopascals(figure, format),
  );
  if (check.verdict === 'passes') return $localize`${value}:VALUE: is usual in a test hall.`;
  const meant = suspicion(check.value, check.finding, language);
  const said = $localize`${value}:VALUE: is unusual in a test hall, which has ${from}:FROM: to ${to}:TO:. Check value and unit.`;
  return meant === undefined ? said : `${said} ${meant}`;
}

function formulaSentence(check: Check, { format }: CheckLanguage): string {
  const byTemperature = check.unit === '°C';
  const { value, from, to } = figuresOf(check, (figure) =>
    byTemperature ? format.text(figure, 'temperature', { digits: 0 }) : hectopascals(figure, format),
  );
  return check.verdict === 'passes'
    ? $localize`The formula for the density of air (CIPM-2007) was made for this air.`
    : $localize`The formula for the density of air (CIPM-2007) was made for ${from}:FROM: to ${to}:TO:, and this air has ${value}:VALUE:. It is used all the same.`;
}

/** Sentences about the air of a run, and about what cannot be used at all (which is often its unit). */
export function airSentence(check: Check, language: CheckLanguage): string {
  switch (check.check) {
    case 'refused':
      return refusedSentence(check, language);
    case 'air-formula':
      return formulaSentence(check, language);
    default:
      return hallSentence(check, language);
  }
}
