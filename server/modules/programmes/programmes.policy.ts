import { KMH_PER_MS } from '#shared/core/constants';
import type { ProgrammeFields } from '#shared/contracts/programmes';
import { airIssues } from '../../rules/air-rules';
import { Issues, repeated, strangers, type Issue } from '../../rules/issue';

/** What a programme points to, as far as it was found in the organisation. */
export interface ProgrammeSurroundings {
  /** Ids of the variants of this programme; none for a programme that is only being opened. */
  readonly variantIds: ReadonlySet<string>;
  readonly facilityIds: ReadonlySet<string>;
  /** Ids of the milestones that the programme has now. */
  readonly milestoneIds: ReadonlySet<string>;
}

/** What is wrong with a programme beyond the form of its fields. */
export function programmeIssues(
  fields: ProgrammeFields,
  surroundings: ProgrammeSurroundings,
): readonly Issue[] {
  const issues = new Issues().add(airIssues(fields.referenceAir, 'referenceAir'));

  for (const position of repeated(fields.milestones.map((milestone) => milestone.name))) {
    issues.when(
      true,
      `milestones.${position}.name`,
      'Another milestone of this programme has this name. Each milestone needs a name of its own.',
    );
  }

  for (const position of strangers(
    fields.milestones.map((milestone) => milestone.id),
    surroundings.milestoneIds,
  )) {
    issues.when(
      true,
      `milestones.${position}.id`,
      'This is not a milestone of this programme. Leave the id out to add a new one.',
    );
  }

  issues.when(
    fields.windSpeedMs >= fields.referenceSpeedKmh / KMH_PER_MS,
    'windSpeedMs',
    `The wind must be slower than the car: less than ${(fields.referenceSpeedKmh / KMH_PER_MS).toFixed(1)} m/s at this reference speed.`,
    'wind-ratio',
  );

  issues.when(
    fields.commonArea?.kind === 'variant' && !surroundings.variantIds.has(fields.commonArea.variantId),
    'commonArea.variantId',
    'There is no such variant in this programme. Choose one of its variants, or type an area.',
  );

  issues.when(
    fields.referenceFacilityId !== undefined && !surroundings.facilityIds.has(fields.referenceFacilityId),
    'referenceFacilityId',
    'There is no such facility. Choose one of the organisation’s facilities, or leave it open.',
  );

  return issues.add(conditionIssues(fields)).list;
}

/** A reference condition that nothing could ever meet would leave every result out. */
function conditionIssues({ referenceCondition }: ProgrammeFields): readonly Issue[] {
  return new Issues().when(
    referenceCondition.ground === 'fixed-floor' && (referenceCondition.beltSpeedRatio ?? 0) > 0,
    'referenceCondition.beltSpeedRatio',
    'A fixed floor has no belt. Leave the belt speed ratio out, or choose a moving ground.',
  ).list;
}
