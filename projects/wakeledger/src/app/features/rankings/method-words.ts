import type { ReductionCaution } from '#shared/core/ranking/ranking-output';
import type { ViewContribution, ViewStep } from '#shared/core/ranking/ranking-view';

const CAUTIONS: Readonly<Record<ReductionCaution, string>> = {
  blockage: $localize`blockage over the limit for caution`,
  'included-with-reason': $localize`included with a reason`,
  mach: $localize`Mach number over 0.2: compressibility`,
  'outside-cipm-2007-range': $localize`air outside the range of CIPM-2007`,
  transition: $localize`low Reynolds number without trips: transition may sit in the wrong place`,
  'unpaired-yaw-in-unsymmetrical-sweep': $localize`a yaw angle without its mirror in a sweep that is not symmetrical`,
};

export const cautionWords = (caution: ReductionCaution): string => CAUTIONS[caution];

const STEPS: Readonly<Record<ViewStep['step'], string>> = {
  'full-scale-drag-area': $localize`Drag area at full scale`,
  reynolds: $localize`Reynolds number`,
  'condition-adjustments': $localize`Condition`,
  'facility-correlation': $localize`Correlation to the reference facility`,
  'yaw-ratio': $localize`Wind average`,
};

export const stepWords = (step: ViewStep['step']): string => STEPS[step];

const KINDS: Readonly<Record<string, string>> = {
  repeatability: $localize`repeatability`,
  installation: $localize`installation`,
  session: $localize`session`,
  'facility-bias': $localize`facility bias`,
  'simulation-bias': $localize`bias of the simulation set-up`,
  'blockage-method': $localize`blockage method`,
  'as-built-scale': $localize`scale as built`,
  'stated-area': $localize`area stated by the source`,
  'frontal-area': $localize`frontal area`,
  'yaw-ratio': $localize`yaw ratio`,
  stated: $localize`stated by the source`,
  'friction-share': $localize`share of friction`,
  'reynolds-shape': $localize`how the body follows the friction line`,
  'sweep-level': $localize`level of the Reynolds sweep`,
  sweep: $localize`slope of the Reynolds sweep`,
  adjustment: $localize`adjustment to the reference condition`,
  'correlation-level': $localize`level of the correlation`,
  'correlation-slope': $localize`slope of the correlation`,
  'correlation-scatter': $localize`scatter between bodies in the correlation`,
};

export function contributionWords({ kind, of }: Pick<ViewContribution, 'kind' | 'of'>): string {
  const words = KINDS[kind] ?? kind;
  return of === '' ? words : `${words}, ${of}`;
}
