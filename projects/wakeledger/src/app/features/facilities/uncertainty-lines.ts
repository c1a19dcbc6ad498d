import type { FacilityForm } from './facility-form';

type Name = keyof FacilityForm['controls'];

interface UncertaintyLine {
  readonly label: string;
  readonly hint: string;
  readonly relative: Name;
  readonly relativeLabel: string;
  readonly m2?: Name;
  readonly m2Label: string;
  readonly degreesOfFreedom?: Name;
  readonly degreesOfFreedomLabel: string;
}

const words = {
  relativeLabel: $localize`Of the drag area`,
  m2Label: $localize`As a drag area`,
  degreesOfFreedomLabel: $localize`Degrees of freedom`,
};

/** The facility's uncertainties in the order in which they cancel between results. */
export const UNCERTAINTY_LINES: readonly UncertaintyLine[] = [
  {
    ...words,
    label: $localize`Bias`,
    hint: $localize`of the facility against the truth, the same in all its results`,
    relative: 'biasURelative',
    m2: 'biasUM2',
  },
  {
    ...words,
    label: $localize`Session`,
    hint: $localize`from one entry in the facility to the next`,
    relative: 'sessionURelative',
    m2: 'sessionUM2',
    degreesOfFreedom: 'sessionDegreesOfFreedom',
  },
  {
    ...words,
    label: $localize`Installation`,
    hint: $localize`from taking the car out and putting it back`,
    relative: 'installationURelative',
    m2: 'installationUM2',
    degreesOfFreedom: 'installationDegreesOfFreedom',
  },
  {
    ...words,
    label: $localize`Repeatability`,
    hint: $localize`of a single reading, where a result states none of its own`,
    relative: 'repeatabilityURelative',
    degreesOfFreedom: 'repeatabilityDegreesOfFreedom',
  },
];
