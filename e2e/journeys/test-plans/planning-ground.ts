import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { post } from '../../fixtures/own-programme';
import { continueAs } from '../../fixtures/people';

export interface PlanningGround {
  readonly programmeId: string;
  readonly variantId: string;
  readonly tunnel: string;
  readonly facilityId: string;
}

/** A programme of this journey alone, at 120 km/h in standard air, with one variant and a closed tunnel of 8.2 m². */
export async function planningGround(page: Page): Promise<PlanningGround> {
  await continueAs(page, 'aerodynamicist');
  const own = randomUUID().slice(0, 8);
  const { id: programmeId } = await post(page, '/api/v1/programmes', {
    name: `Planning ${own}`,
    referenceSpeedKmh: 120,
    referenceAir: { state: 'iso-2533-sea-level' },
    referenceCondition: { ground: 'several-belts', wheels: 'rotating' },
    characteristicLengthM: 4.5,
    characteristicLengthName: 'overall length',
    commonArea: { kind: 'fixed', areaM2: 2.27 },
    confidence: 0.95,
    windSpeedMs: 3.12928,
    milestones: [],
  });
  const { id: variantId } = await post(page, `/api/v1/programmes/${programmeId}/variants`, {
    name: 'Hatch',
    bodyShape: 'hatch',
    aliases: [],
    frontalAreas: [{ areaM2: 2.27, uM2: 0.008, method: 'laser', date: '2026-05-01' }],
    configurations: [],
  });
  const tunnel = `Model tunnel ${own}`;
  const { id: facilityId } = await post(page, '/api/v1/facilities', {
    name: tunnel,
    kind: 'closed',
    areaM2: 8.2,
    blockage: { method: 'area-ratio', uFractionOfCorrection: 0.5 },
    usualCondition: { ground: 'one-belt', wheels: 'rotating' },
    repeatabilityURelative: 0.003,
  });
  return { programmeId, variantId, tunnel, facilityId };
}
