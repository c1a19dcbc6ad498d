import type { PolicyValues } from '#shared/contracts/policies';
import type { Programme } from '#shared/contracts/programmes';
import type { TestPlanInputs } from '#shared/contracts/test-plans';
import { DEFAULT_POLICIES } from '#shared/core/constants';
import { facilityFields, programmeFields } from '#shared/testing/domain-fields';
import type { Tunnel } from '../app/features/test-plans/planned';

/** A programme at 120 km/h in standard air, with L = 4.5 m: Re 1.03e7, and so 600 km/h for one fifth in the same air. */
export const PLANNED_PROGRAMME: Programme = {
  ...programmeFields({ referenceAir: { state: 'iso-2533-sea-level' } }),
  id: 'dunlin',
  version: 1,
  milestones: [],
};

export const CLOSED_TUNNEL: Tunnel = {
  ...facilityFields({ name: 'Model tunnel' }),
  kind: 'closed',
  areaM2: 8.2,
  id: 'tunnel',
  version: 1,
  versionNumber: 1,
};

const { frictionLine: _frictionLine, ...LIMITS } = DEFAULT_POLICIES;

export const POLICIES_IN_FORCE: PolicyValues = {
  ...LIMITS,
  yawCoverageDeg: 10,
  repeatabilityCaution: 0.01,
  airTemperatureC: { from: 5, to: 40 },
  airPressurePa: { from: 85_000, to: 106_000 },
  frontLiftLimit: 0.3,
  rearLiftLimit: 0.3,
  plausible: [],
};

export const ONE_FIFTH: TestPlanInputs = {
  scale: 0.2,
  target: { basis: 'reference' },
  tunnelTemperatureC: 15,
  tunnelPressurePa: 101_325,
  frontalAreaM2: 2.27,
  dragCoefficient: 0.285,
  condition: {},
};
