import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { post } from '../../fixtures/own-programme';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

/** The limits hold for a whole organisation: this journey tightens those of the one that the others leave alone. */
const ORGANISATION = 'Velthorpe Coachworks';
const CONDITION = { ground: 'several-belts', wheels: 'rotating' };

/** One result that lifts its front axle by 0.12 and passes every limit that the product comes with. */
async function liftingResult(page: Page): Promise<{ readonly address: string; readonly name: string }> {
  const programme = await post(page, '/api/v1/programmes', {
    name: `Limits ${randomUUID().slice(0, 8)}`,
    referenceSpeedKmh: 140,
    referenceAir: { state: 'un-gtr-15' },
    referenceCondition: CONDITION,
    characteristicLengthM: 4.4,
    characteristicLengthName: 'overall length',
    commonArea: { kind: 'fixed', areaM2: 2.2 },
    confidence: 0.95,
    windSpeedMs: 3.12928,
    milestones: [],
  });
  const below = `/api/v1/programmes/${programme.id}`;
  const variant = await post(page, `${below}/variants`, {
    name: 'Saloon',
    bodyShape: 'saloon',
    aliases: [],
    frontalAreas: [{ areaM2: 2.2, uM2: 0.008, method: 'laser', date: '2026-05-01' }],
    configurations: [],
  });
  const facility = await post(page, '/api/v1/facilities', {
    name: `Limits ${randomUUID().slice(0, 8)}`,
    kind: 'open-jet',
    areaM2: 22,
    blockage: { method: 'factor', factor: 1.01 },
    usualCondition: CONDITION,
    repeatabilityURelative: 0.002,
  });
  const name = 'L-01';
  const result = await post(page, `${below}/results`, {
    variantId: variant.id,
    facilityId: facility.id,
    name,
    testDate: '2026-06-01',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaM2: 2.2,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { state: 'custom', temperatureC: 20, pressurePa: 99_800, relativeHumidity: 0.45 },
    condition: CONDITION,
    points: [{ yawDeg: 0, value: 0.26, frontLift: 0.12, rearLift: 0.08 }],
  });
  return { address: `/programmes/${programme.id}/results/${result.id}`, name };
}

test('a limit is tightened: a result is cautioned by it, and the history tells both versions', async ({
  page,
}) => {
  await continueAs(page, 'aerodynamicist', ORGANISATION);
  const result = await liftingResult(page);
  await page.goto(result.address);
  const checks = page.locator('wl-checks');
  await expect(checks.getByText(/^\D*\d+ checks pass$/)).toBeVisible();
  await expect(checks).not.toContainText('caution');

  await page.goto('/policies');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('What do we hold for acceptable?');
  await expectAccessible(page);
  const lift = page.getByRole('group', { name: 'Lift' }).getByLabel('Front, caution above');
  const before = await lift.inputValue();
  await lift.fill('3');
  await page.getByLabel('Why').fill('Our saloons lost their steering feel in the wet');
  await page.getByRole('button', { name: 'Put these limits in force' }).click();
  await expect(lift).toHaveAttribute('aria-invalid', 'true');
  await expect(lift).toHaveValue('3');

  await lift.fill('0,1');
  await expect(
    page.getByRole('status').filter({ hasText: `front, caution above: ${before} → 0.1` }),
  ).toBeVisible();
  await page.getByRole('button', { name: 'Put these limits in force' }).click();
  const newest = page.locator('wl-policy-history ol > li').first();
  await expect(newest).toContainText('in force');
  await expect(newest).toContainText('Our saloons lost their steering feel in the wet');
  await expect(newest).toContainText(`front, caution above: ${before} → 0.1`);
  await expect(page.getByRole('heading', { name: 'Version 0, as the product comes' })).toBeVisible();

  await page.goto(result.address);
  await expect(checks).toContainText('Lift, front, caution');
  await expect(checks).toContainText(
    'A lift coefficient of 0.120 at the front axle is over the limit of 0.100',
  );
  await expectAccessible(page);
});

test('a viewer reads the limits and is offered no change', async ({ page }) => {
  await continueAs(page, 'viewer');
  await page.goto('/policies');
  await expect(page.getByRole('group', { name: 'Mach number' }).getByLabel('Caution above')).toBeDisabled();
  await expect(page.getByRole('button', { name: 'Put these limits in force' })).toHaveCount(0);
  await expectAccessible(page);
});
