import type { FacilityFields } from '#shared/contracts/facilities';
import type { ResultFields, ResultPoint } from '#shared/contracts/results';
import { airIssues } from '../../rules/air-rules';
import { Issues, type Issue } from '../../rules/issue';
import { sweepIssues } from './sweep.policy';

/** Angles closer than this are one (method section 7). */
const SAME_ANGLE_DEG = 1e-9;
/** Before this, a date is taken as mistyped: nobody measured the drag of a motor car. */
const EARLIEST_TEST = '1900-01-01';

/** What a result points to, as it was found. */
export interface ResultSurroundings {
  readonly latestPastDay: string;
  readonly facility: Pick<FacilityFields, 'kind' | 'areaM2' | 'name'>;
  /** The newest frontal area of the variant, at full scale. */
  readonly frontalAreaM2: number;
}

/**
 * What makes a result unusable as it stands. A result is never changed later, so whatever the method would refuse for
 * certain is refused here; what is merely doubtful is kept and gets its caution when it is reduced.
 */
export function resultIssues(fields: ResultFields, surroundings: ResultSurroundings): readonly Issue[] {
  return new Issues()
    .add(dateIssues(fields.testDate, surroundings.latestPastDay))
    .add(quotedAreaIssues(fields))
    .add(tareIssues(fields))
    .add(flowIssues(fields))
    .add(placeIssues(fields, surroundings))
    .add(pointIssues(fields))
    .add(zeroYawIssues(fields)).list;
}

function dateIssues(testDate: string, latestPastDay: string): readonly Issue[] {
  return new Issues()
    .when(
      testDate > latestPastDay,
      'testDate',
      `${testDate} has not come yet. Give the day of the test, today at the latest.`,
    )
    .when(
      testDate < EARLIEST_TEST,
      'testDate',
      `${testDate} looks mistyped. Give the day of the test as year-month-day.`,
    ).list;
}

function quotedAreaIssues(fields: ResultFields): readonly Issue[] {
  const isCoefficient = fields.quantity === 'coefficient';
  return new Issues()
    .when(
      isCoefficient && fields.quotedAreaM2 === undefined,
      'quotedAreaM2',
      'A coefficient means nothing without the area that it was formed with. State that area in m².',
      'missing-input',
    )
    .when(
      (isCoefficient || fields.quotedAreaM2 !== undefined) && fields.quotedAreaScale === undefined,
      'quotedAreaScale',
      'Say whether the quoted area is that of the model or that of the full-size car.',
      'missing-input',
    )
    .when(
      fields.quotedAreaUM2 !== undefined && fields.quotedAreaM2 === undefined,
      'quotedAreaUM2',
      'This is the uncertainty of the quoted area, which is not stated. State it, or leave this out.',
    ).list;
}

function tareIssues(fields: ResultFields): readonly Issue[] {
  const tares = [fields.tareN, ...fields.points.map((point) => point.tareN)];
  const someTare = tares.some((tare) => tare !== undefined);
  if (fields.quantity !== 'force') {
    return new Issues().when(
      someTare || fields.tareAlreadySubtracted === false,
      'tareN',
      'A tare is subtracted from a force only. Enter the force, or the figure after the tare was subtracted.',
    ).list;
  }
  const issues = new Issues()
    .when(
      fields.tareAlreadySubtracted === undefined,
      'tareAlreadySubtracted',
      'Say whether the tare is subtracted from this force already.',
      'missing-input',
    )
    .when(
      fields.tareAlreadySubtracted === true && someTare,
      'tareN',
      'The tare is said to be subtracted already, and yet one is stated. Leave it out, or say that it still is in the force.',
    );
  if (fields.tareAlreadySubtracted === false && fields.tareN === undefined) {
    fields.points.forEach((point, position) => {
      issues.when(
        point.tareN === undefined,
        `points.${position}.tareN`,
        'The tare still is in this force: state it in N, here or for the whole result.',
        'missing-input',
      );
    });
  }
  return issues.list;
}

/** Reynolds and Mach number need air and a speed; so does the dynamic pressure where it was not measured. */
function flowIssues(fields: ResultFields): readonly Issue[] {
  const issues = new Issues();
  if (fields.air === undefined) {
    issues.when(
      true,
      'air',
      fields.quantity === 'coastdown-f2'
        ? 'Name the state of the air that this coastdown is corrected to: two common ones are nearly 2 % apart.'
        : 'State the air of the test: a named state, or temperature, static pressure and relative humidity.',
      'missing-input',
    );
  } else {
    issues.add(airIssues(fields.air, 'air'));
  }
  if (fields.speedKmh === undefined && fields.dynamicPressurePa === undefined) {
    fields.points.forEach((point, position) => {
      issues.when(
        point.speedKmh === undefined && point.dynamicPressurePa === undefined,
        `points.${position}.speedKmh`,
        'State the speed in km/h or the dynamic pressure in Pa, here or for the whole result.',
        'missing-input',
      );
    });
  }
  return issues.list;
}

function placeIssues(fields: ResultFields, surroundings: ResultSurroundings): readonly Issue[] {
  const { facility, frontalAreaM2 } = surroundings;
  const isRoad = facility.kind === 'road';
  const blockage = facility.areaM2 === undefined ? 0 : (fields.scale ** 2 * frontalAreaM2) / facility.areaM2;
  return new Issues()
    .when(
      fields.quantity === 'coastdown-f2' && !isRoad,
      'facilityId',
      `A coastdown is driven on a road, and ${facility.name} is none. Choose a proving ground, or another quantity.`,
    )
    .when(
      (isRoad || fields.quantity === 'coastdown-f2') && fields.scale !== 1,
      'scale',
      'On the road the car has its full size: the scale is 1.',
    )
    .when(
      fields.condition.ground !== undefined && (fields.condition.ground === 'road') !== isRoad,
      'condition.ground',
      `This ground does not exist in ${facility.name}. Choose the ground that the car stood on there.`,
    )
    .when(
      fields.condition.ground === 'fixed-floor' && (fields.condition.beltSpeedRatio ?? 0) > 0,
      'condition.beltSpeedRatio',
      'A fixed floor has no belt. Leave the belt speed ratio out, or choose a moving ground.',
    )
    .when(
      blockage >= 1,
      'scale',
      `At this scale the car would fill ${facility.name}, which measures ${facility.areaM2} m². Check scale and facility.`,
      'model-larger-than-section',
    ).list;
}

function pointIssues(fields: ResultFields): readonly Issue[] {
  const issues = new Issues();
  fields.points.forEach((point, position) => {
    const where = `points.${position}`;
    const drag = dragOf(point, fields);
    issues
      .when(
        drag <= 0,
        `${where}.value`,
        drag === point.value
          ? 'Drag along the car’s own axis must be above 0. Check the sign.'
          : `Less its tare this force is ${Number(drag.toPrecision(6))} N, and drag must be above 0. Check force and tare.`,
        'drag-not-positive',
      )
      .when(
        point.s !== undefined && (point.n ?? 1) < 2,
        `${where}.n`,
        'A standard deviation needs at least two readings: state how many, or leave s out.',
        'repeatability-needs-two',
      )
      .when(
        fields.quantity === 'coastdown-f2' &&
          [point.frontLift, point.rearLift, point.sideForce].some((value) => value !== undefined),
        where,
        'A coastdown tells nothing about lift and side force. Leave them out.',
      );
  });
  return issues.list;
}

function dragOf(point: ResultPoint, fields: ResultFields): number {
  const subtract = fields.quantity === 'force' && fields.tareAlreadySubtracted === false;
  return subtract ? point.value - (point.tareN ?? fields.tareN ?? 0) : point.value;
}

/** Everything is compared at zero yaw, so a result has a reading there; repeats are welcome, and so is a Reynolds sweep. */
function zeroYawIssues(fields: ResultFields): readonly Issue[] {
  const atZero = fields.points.filter((point) => Math.abs(point.yawDeg) <= SAME_ANGLE_DEG);
  return new Issues()
    .when(
      atZero.length === 0,
      'points',
      'A result needs a reading at zero yaw, which is what variants are compared by. Add one with yaw 0.',
      'yaw-no-zero',
    )
    .add(sweepIssues(atZero, fields)).list;
}
