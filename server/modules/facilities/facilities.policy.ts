import { TUNNEL_KINDS } from '#shared/core/ranking/ranking-input';
import { changedCorrections } from '#shared/core/reduction/facility-corrections';
import type { Facility, FacilityFields } from '#shared/contracts/facilities';
import { Issues, type Issue } from '../../rules/issue';

export function isTunnel(kind: FacilityFields['kind']): boolean {
  return TUNNEL_KINDS.some((tunnel) => tunnel === kind);
}

/** What is wrong with a facility beyond the form of its fields. */
export function facilityIssues(fields: FacilityFields): readonly Issue[] {
  return new Issues()
    .add(isTunnel(fields.kind) ? tunnelIssues(fields) : openAirIssues(fields))
    .add(blockageIssues(fields))
    .add(uncertaintyIssues(fields))
    .when(
      (fields.usualCondition.ground === 'road') !== (fields.kind === 'road') &&
        fields.usualCondition.ground !== undefined,
      'usualCondition.ground',
      'The road belongs to proving grounds and to nothing else. Choose the ground that this facility has.',
    )
    .when(
      fields.usualCondition.ground === 'fixed-floor' && (fields.usualCondition.beltSpeedRatio ?? 0) > 0,
      'usualCondition.beltSpeedRatio',
      'A fixed floor has no belt. Leave the belt speed ratio out, or choose a moving ground.',
    ).list;
}

function tunnelIssues({ areaM2, blockage, kind }: FacilityFields): readonly Issue[] {
  const section = kind === 'open-jet' ? 'nozzle' : 'test-section';
  return new Issues()
    .when(
      areaM2 === undefined,
      'areaM2',
      `A tunnel needs its ${section} area in m², from which the blockage follows.`,
      'missing-input',
    )
    .when(
      blockage === undefined,
      'blockage',
      'Say how this tunnel corrects for blockage: none, area-ratio, maskell or factor.',
      'missing-input',
    ).list;
}

function openAirIssues({ areaM2, blockage }: FacilityFields): readonly Issue[] {
  return new Issues()
    .when(
      areaM2 !== undefined,
      'areaM2',
      'Only tunnels have a test section or nozzle. Leave the area out, or choose a kind of tunnel.',
    )
    .when(
      blockage !== undefined,
      'blockage',
      'Only tunnels correct for blockage. Leave it out, or choose a kind of tunnel.',
    ).list;
}

function blockageIssues({ blockage }: FacilityFields): readonly Issue[] {
  if (blockage === undefined) return [];
  const { method, theta, factor, uFractionOfCorrection, uRelative } = blockage;
  return new Issues()
    .when(
      method === 'maskell' && theta === undefined,
      'blockage.theta',
      'Maskell’s correction needs the factor θ of this facility, above 0; there is no default.',
      'missing-input',
    )
    .when(
      method !== 'maskell' && theta !== undefined,
      'blockage.theta',
      'θ is used by Maskell’s correction only. Leave it out, or choose maskell.',
    )
    .when(
      method === 'factor' && factor === undefined,
      'blockage.factor',
      'The factor k = q_c/q from the facility’s own calibration is needed, above 0; there is no default.',
      'missing-input',
    )
    .when(
      method !== 'factor' && factor !== undefined,
      'blockage.factor',
      'A factor is used by the method “factor” only. Leave it out, or choose that method.',
    )
    .when(
      method === 'none' && uFractionOfCorrection !== undefined,
      'blockage.uFractionOfCorrection',
      'Without a correction there is nothing to take a fraction of. State the uncertainty relative to the drag area.',
    )
    .when(
      method !== 'none' && uRelative !== undefined,
      'blockage.uRelative',
      'With a correction the uncertainty is stated as a fraction of it. Leave this one out.',
    ).list;
}

/** Degrees of freedom without the uncertainty that they belong to point to a field left empty by mistake. */
function uncertaintyIssues(fields: FacilityFields): readonly Issue[] {
  const groups = [
    [
      'session',
      fields.sessionDegreesOfFreedom,
      fields.sessionURelative ?? fields.sessionUM2,
      'sessionURelative or sessionUM2',
    ],
    [
      'installation',
      fields.installationDegreesOfFreedom,
      fields.installationURelative ?? fields.installationUM2,
      'installationURelative or installationUM2',
    ],
    [
      'repeatability',
      fields.repeatabilityDegreesOfFreedom,
      fields.repeatabilityURelative,
      'repeatabilityURelative',
    ],
  ] as const;
  const issues = new Issues();
  for (const [group, degreesOfFreedom, amount, fieldNames] of groups) {
    issues.when(
      degreesOfFreedom !== undefined && amount === undefined,
      `${group}DegreesOfFreedom`,
      `Degrees of freedom belong to an uncertainty: state ${fieldNames} as well, or leave them out.`,
    );
  }
  return issues.list;
}

/** What a person types of a facility, without what the product keeps beside it. */
export function fieldsOfFacility(facility: Facility): FacilityFields {
  const { id: _id, version: _version, versionNumber: _number, retiredAt: _retiredAt, ...fields } = facility;
  return fields;
}

export interface FacilityChangeFacts {
  readonly before: Facility;
  readonly fields: FacilityFields;
  readonly comment: string | undefined;
  readonly hasResults: boolean;
}

/** What is wrong with changing a facility in this way. */
export function changeIssues({ before, fields, comment, hasResults }: FacilityChangeFacts): readonly Issue[] {
  return new Issues()
    .when(
      before.kind !== fields.kind && hasResults,
      'kind',
      'Results were entered for this facility, and they were measured in the kind of facility that it is. Add another facility for the other kind.',
      'kind-with-results',
    )
    .when(
      comment === undefined && changedCorrections(before, fields).length > 0,
      'comment',
      'Corrections or uncertainties change, and with them every figure from here. Say why, so that it can be read with the version.',
      'missing-input',
    ).list;
}
