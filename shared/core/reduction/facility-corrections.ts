import type { FacilityInput } from '../ranking/ranking-input';

/** What reductions take from a facility. A facility with another value in one of these reduces to other figures. */
export type FacilityCorrections = Omit<FacilityInput, 'id' | 'name'>;
export type CorrectionField = keyof FacilityCorrections;

const FIELDS: Readonly<Record<CorrectionField, true>> = {
  kind: true,
  areaM2: true,
  blockage: true,
  biasURelative: true,
  biasUM2: true,
  sessionURelative: true,
  sessionUM2: true,
  sessionDegreesOfFreedom: true,
  installationURelative: true,
  installationUM2: true,
  installationDegreesOfFreedom: true,
  repeatabilityURelative: true,
  repeatabilityDegreesOfFreedom: true,
};

/** A value as plain text, in which absent and null are one and the order of an object's fields is none. */
function plain(value: FacilityCorrections[CorrectionField]): string {
  if (value === null || value === undefined) return '';
  if (typeof value !== 'object') return String(value);
  return Object.entries(value)
    .filter(([, inner]) => inner !== null && inner !== undefined)
    .map(([name, inner]) => `${name}=${String(inner)}`)
    .sort()
    .join(';');
}

/** The fields in which figures reduced with the one may differ from figures reduced with the other. */
export function changedCorrections(
  before: FacilityCorrections,
  after: FacilityCorrections,
): readonly CorrectionField[] {
  return (Object.keys(FIELDS) as CorrectionField[]).filter(
    (field) => plain(before[field]) !== plain(after[field]),
  );
}
