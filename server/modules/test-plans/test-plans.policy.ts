import { pressureMistypedAs, temperatureMistypedAs } from '#shared/core/air/mistyped-air';
import { speedOfSound } from '#shared/core/air/gas-properties';
import { AIR_LIMITS, CELSIUS_ZERO_K, KMH_PER_MS } from '#shared/core/constants';
import { TUNNEL_KINDS } from '#shared/core/ranking/ranking-input';
import { machNumber } from '#shared/core/similarity/flow';
import type { Facility } from '#shared/contracts/facilities';
import type { TestPlan, TestPlanFields, TestPlanInputs } from '#shared/contracts/test-plans';
import { Issues, type Issue } from '../../rules/issue';

export interface PlanSurroundings {
  /** The variant is one of the programme. */
  readonly variantFound: boolean;
  readonly facility: Facility | undefined;
  /** The result that the target rests on is one of the programme; true where it rests on none. */
  readonly sweepFound: boolean;
}

/** What is wrong with a planned test beyond the form of its fields. */
export function planIssues(fields: TestPlanFields, surroundings: PlanSurroundings): readonly Issue[] {
  const { inputs } = fields;
  return new Issues()
    .when(
      !surroundings.variantFound,
      'variantId',
      'This programme has no such variant. Choose one of its variants.',
    )
    .add(facilityIssues(inputs, surroundings.facility))
    .when(
      !surroundings.sweepFound,
      'inputs.target.resultId',
      'This programme has no such result. Choose a result of its own with a sweep, or type the Reynolds number.',
    )
    .when(
      inputs.speedKmh !== undefined &&
        inputs.maximumSpeedKmh !== undefined &&
        inputs.speedKmh > inputs.maximumSpeedKmh,
      'inputs.speedKmh',
      `The facility reaches ${inputs.maximumSpeedKmh} km/h. A speed up to that is accepted.`,
    )
    .when(
      inputs.condition.ground === 'road',
      'inputs.condition.ground',
      'A road has no tunnel. Choose the ground that the facility has.',
    )
    .add(airIssues(inputs)).list;
}

function facilityIssues(inputs: TestPlanInputs, facility: Facility | undefined): readonly Issue[] {
  const tunnel = TUNNEL_KINDS.some((kind) => kind === facility?.kind);
  const section = facility?.areaM2;
  const modelArea = inputs.scale * inputs.scale * inputs.frontalAreaM2;
  const largest = section === undefined ? 0 : Math.sqrt(section / inputs.frontalAreaM2);
  return new Issues()
    .when(
      facility === undefined || !tunnel || section === undefined,
      'facilityId',
      'A test is planned in a tunnel of the organisation, with its area known. Choose one.',
    )
    .when(
      tunnel && section !== undefined && modelArea >= section,
      'inputs.scale',
      `A model of ${modelArea.toFixed(2)} m² does not fit into a section of ${section} m². A scale below ${largest.toFixed(2)} is accepted.`,
      'model-larger-than-section',
    ).list;
}

function airIssues({ tunnelTemperatureC, tunnelPressurePa }: TestPlanInputs): readonly Issue[] {
  const { minC, maxC, minPa, maxPa } = AIR_LIMITS;
  const kelvin = temperatureMistypedAs(tunnelTemperatureC);
  const pressure = pressureMistypedAs(tunnelPressurePa);
  return new Issues()
    .when(
      tunnelTemperatureC < minC || tunnelTemperatureC > maxC,
      'inputs.tunnelTemperatureC',
      kelvin === undefined
        ? `${tunnelTemperatureC} °C looks mistyped. From −40 to 60 °C is accepted.`
        : `${tunnelTemperatureC} °C: is it kelvin? ${kelvin.converted.toFixed(1)} °C would be accepted.`,
      'temperature-out-of-range',
    )
    .when(
      tunnelPressurePa < minPa || tunnelPressurePa > maxPa,
      'inputs.tunnelPressurePa',
      pressure === undefined
        ? `${tunnelPressurePa} Pa looks mistyped. From 30 000 to 1 000 000 Pa is accepted.`
        : `${tunnelPressurePa} Pa: is it ${pressure.unit}? ${Math.round(pressure.converted)} Pa would be accepted.`,
      'pressure-out-of-range',
    ).list;
}

/**
 * Why results cannot be expected from a plan as it stands; undefined where they can.
 *
 * @param machLimit the highest Mach number that the organisation accepts
 */
export function reasonNotToExpect(plan: TestPlan, machLimit: number): string | undefined {
  if (plan.retiredAt !== undefined) return 'It is retired. Bring it back first.';
  const { speedKmh, tunnelTemperatureC } = plan.inputs;
  if (speedKmh === undefined) {
    return 'No speed has been settled on. Set the speed of the test and save, then results can be expected.';
  }
  const mach = machNumber(speedKmh / KMH_PER_MS, speedOfSound(tunnelTemperatureC + CELSIUS_ZERO_K));
  return mach > machLimit
    ? `${speedKmh} km/h is Mach ${mach.toFixed(2)}. Up to Mach ${machLimit.toFixed(2)} is accepted.`
    : undefined;
}
