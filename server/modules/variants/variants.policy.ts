import type { VariantFields } from '#shared/contracts/variants';
import { Issues, repeated, strangers, type Issue } from '../../rules/issue';

/** Sales shares are typed as rounded percentages: three thirds of 0.333 must be mended, 0.9999999 must not. */
const SHARE_TOLERANCE = 1e-6;

export interface VariantSurroundings {
  /** The last day that may be stated as past, `YYYY-MM-DD`. */
  readonly latestPastDay: string;
  /** Names and aliases of the programme's other variants, in lower case, each with the variant that it belongs to. */
  readonly takenNames: ReadonlyMap<string, string>;
  /** Ids of the variant's configurations as they stand; none for a new variant. */
  readonly configurationIds: ReadonlySet<string>;
  /** Whether the picture was found among the organisation's pictures; true where none is stated. */
  readonly pictureFound: boolean;
}

/** What is wrong with a variant beyond the form of its fields. */
export function variantIssues(fields: VariantFields, surroundings: VariantSurroundings): readonly Issue[] {
  return new Issues()
    .add(nameIssues(fields, surroundings.takenNames))
    .add(dimensionIssues(fields))
    .add(frontalAreaIssues(fields, surroundings.latestPastDay))
    .add(configurationIssues(fields, surroundings.configurationIds))
    .add(shareIssues(fields))
    .when(
      !surroundings.pictureFound,
      'pictureAttachmentId',
      'There is no such picture. Bring the picture in first (PNG, JPEG or WebP), or leave it out.',
    ).list;
}

function nameIssues(fields: VariantFields, takenNames: ReadonlyMap<string, string>): readonly Issue[] {
  const issues = new Issues();
  for (const position of repeated([fields.name, ...fields.aliases])) {
    issues.when(
      true,
      `aliases.${position - 1}`,
      'This name stands here already. Each other name is needed once, and not the variant’s own.',
    );
  }
  fields.aliases.forEach((alias, position) => {
    const owner = takenNames.get(alias.trim().toLowerCase());
    issues.when(
      owner !== undefined,
      `aliases.${position}`,
      `“${alias}” means ${owner} already: a file could not tell the two apart. Choose another name.`,
    );
  });
  return issues.list;
}

function dimensionIssues({ lengthMm, wheelbaseMm }: VariantFields): readonly Issue[] {
  return new Issues().when(
    lengthMm !== undefined && wheelbaseMm !== undefined && wheelbaseMm >= lengthMm,
    'wheelbaseMm',
    `The wheelbase must be shorter than the car, which is ${lengthMm} mm long.`,
  ).list;
}

function frontalAreaIssues({ frontalAreas }: VariantFields, latestPastDay: string): readonly Issue[] {
  const issues = new Issues();
  frontalAreas.forEach((area, position) => {
    issues
      .when(
        area.date > latestPastDay,
        `frontalAreas.${position}.date`,
        `${area.date} has not come yet. Give the day on which the area was determined.`,
      )
      .when(
        area.uM2 >= area.areaM2,
        `frontalAreas.${position}.uM2`,
        'The standard uncertainty must be smaller than the area itself; it is given in m².',
      );
  });
  for (const position of repeated(frontalAreas.map((area) => area.date))) {
    issues.when(
      true,
      `frontalAreas.${position}.date`,
      'Two frontal areas have this date, and the newest is the one that counts. Give each a day of its own.',
    );
  }
  return issues.list;
}

function configurationIssues(
  { configurations }: VariantFields,
  configurationIds: ReadonlySet<string>,
): readonly Issue[] {
  const issues = new Issues();
  for (const position of repeated(configurations.map((configuration) => configuration.name))) {
    issues.when(
      true,
      `configurations.${position}.name`,
      'Another configuration of this variant has this name. Each needs a name of its own.',
    );
  }
  for (const position of strangers(
    configurations.map((configuration) => configuration.id),
    configurationIds,
  )) {
    issues.when(
      true,
      `configurations.${position}.id`,
      'This is not a configuration of this variant. Leave the id out to add a new one.',
    );
  }
  configurations.forEach((configuration, position) => {
    const where = `configurations.${position}`;
    const reference = configuration.roadLoadReference;
    issues
      .when(
        configuration.rollingResistance === undefined && reference === undefined,
        `${where}.rollingResistance`,
        'The energy needs the rolling-resistance coefficient, or a measured road load (f0, f1, f2) with its reference.',
        'missing-input',
      )
      .when(
        reference !== undefined && reference.f2NPerKmh2 <= 0,
        `${where}.roadLoadReference.f2NPerKmh2`,
        'f2 holds the air’s resistance and must be above 0, in N/(km/h)².',
      );
  });
  return issues.list;
}

function shareIssues({ configurations }: VariantFields): readonly Issue[] {
  const sum = configurations.reduce((total, configuration) => total + configuration.salesShare, 0);
  const unknown = configurations.every((configuration) => configuration.salesShare === 0);
  return new Issues().when(
    !unknown && Math.abs(sum - 1) > SHARE_TOLERANCE,
    'configurations',
    `The shares of sales sum to ${Number(sum.toFixed(6))}. They must sum to 1, or all be 0 while they are not known.`,
    'shares-not-one',
  ).list;
}
