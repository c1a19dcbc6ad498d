import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { post } from '../../fixtures/own-programme';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';
import { planningGround, type PlanningGround } from './planning-ground';

const answer = (page: Page) => page.locator('#plan-answer');
const field = (page: Page, label: string) => page.getByLabel(label, { exact: true });

/** One fifth of a full-size 120 km/h, in standard air. */
async function planOneFifth(page: Page, ground: PlanningGround): Promise<void> {
  await page.goto(`/programmes/${ground.programmeId}/test-plans`);
  await page.getByRole('link', { name: 'Plan a test' }).click();
  await field(page, 'Name of the plan').fill('One fifth in spring');
  await field(page, 'Variant').selectOption({ label: 'Hatch' });
  await expect(field(page, 'Frontal area, full size')).toHaveValue('2.27');
  await field(page, 'Drag coefficient').fill('0.285');
  await field(page, 'Scale').first().fill('0.2');
  await field(page, 'Tunnel').selectOption({ label: ground.tunnel });
  await field(page, 'Air temperature').fill('15');
  await field(page, 'Static pressure').fill('101325');
}

test('600 km/h, Mach 0.49, is refused for one fifth of a full-size 120 km/h, and what to do instead is shown and tried', async ({
  page,
}) => {
  const ground = await planningGround(page);
  await planOneFifth(page, ground);
  await expect(answer(page)).toContainText('It cannot be run like this');
  await expect(answer(page)).toContainText(/asks for 600.km\/h at this scale, Mach 0\.49/);
  await expect(answer(page)).toContainText('Beyond Mach 0.30 the air is squeezed');

  const ways = page.locator('wl-ways-out-list');
  await expect(ways.getByRole('heading', { level: 3 })).toHaveText([
    'A larger model: scale 0.327',
    'More pressure: 165.5 kPa',
    /^A colder gas: air at \d+ K/,
    /^A sweep that shows flatness: up to 6\.29 million/,
    /^Added turbulence or trips: not needed at 6\.29 million/,
  ]);
  await expect(ways).toContainText('as an ideal gas with Sutherland’s viscosity; nothing below 100 K');
  await expect(ways).toContainText('They mimic a higher Reynolds number without matching it');
  await expect(page.getByRole('heading', { name: 'Before anybody runs it' })).toBeVisible();
  await expectAccessible(page);

  await ways.getByRole('button', { name: 'Try scale 0.327' }).click();
  await expect(answer(page)).toBeFocused();
  await expect(answer(page)).toContainText('It can be run, with a caution');
  await expect(field(page, 'Scale').first()).toHaveValue('0.327');
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(field(page, 'Scale').first()).toHaveValue('0.2');
  await ways.getByRole('button', { name: 'Try 165.5 kPa' }).click();
  await expect(field(page, 'Static pressure')).toHaveValue('165500');
  await expect(answer(page)).toContainText('It can be run, with a caution');
});

test('by the keyboard alone the test is moved over the map, saved and made what results are expected to be', async ({
  page,
}) => {
  const ground = await planningGround(page);
  await planOneFifth(page, ground);
  const map = page.locator('wl-speed-scale-map');
  await expect(map).toContainText('At scale 0.200 and 368 km/h not every limit is kept', {
    useInnerText: true,
  });
  await map.getByRole('slider', { name: 'Scale' }).focus();
  for (let step = 0; step < 50; step += 1) await page.keyboard.press('ArrowRight');
  await expect(field(page, 'Scale').first()).toHaveValue('0.45');
  await map.getByRole('slider', { name: 'Speed' }).focus();
  await page.keyboard.press('ArrowRight');
  await expect(field(page, 'Speed settled on, optional')).not.toHaveValue('');
  await expect(map.getByText(/km\/h every limit is kept/)).toBeVisible();
  await map.getByRole('button', { name: 'The figures as a table' }).press('Enter');
  await expect(map.getByRole('row', { name: /^0\.450/ })).toContainText('yes');

  await page.getByRole('button', { name: 'Save the plan' }).press('Enter');
  await expect(page).toHaveURL(/test-plans\/[0-9a-f-]{36}$/);
  await expect(page.getByText('draft', { exact: true })).toBeVisible();
  await page.getByRole('button', { name: 'Expect results from it' }).press('Enter');
  await expect(page.getByText('results expected', { exact: true })).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Did it go as planned?' })).toBeVisible();
  await expectAccessible(page);
});

test('a result is entered from its plan, and where it differs the plan says so', async ({ page }) => {
  const ground = await planningGround(page);
  const plan = await savedPlan(page, ground);
  await page.goto(`/programmes/${ground.programmeId}/test-plans/${plan}`);
  await page.getByRole('button', { name: 'Expect results from it' }).click();
  await page.getByRole('link', { name: 'Enter a result from it' }).click();
  await expect(page.getByText('From a plan')).toBeVisible();
  await expect(page.getByLabel('Facility', { exact: true })).toHaveValue(ground.facilityId);
  await expect(page.getByLabel('Scale', { exact: true })).toHaveValue('0.45');
  await expect(page.getByLabel('Ground')).toHaveValue('one-belt');

  const result = (name: string, speedKmh: number, ground_: string) =>
    post(page, `/api/v1/programmes/${ground.programmeId}/results`, {
      variantId: ground.variantId,
      facilityId: ground.facilityId,
      name,
      testDate: '2026-06-01',
      quantity: 'coefficient',
      scale: 0.45,
      quotedAreaM2: 2.27,
      quotedAreaScale: 'full',
      speedKmh,
      air: { state: 'custom', temperatureC: 15, pressurePa: 101_325, relativeHumidity: 0.4 },
      condition: { ground: ground_, wheels: 'rotating' },
      points: [{ yawDeg: 0, value: 0.285 }],
    });
  await result('P-1', 280, 'one-belt');
  await result('P-2', 210, 'fixed-floor');
  await page.goto(`/programmes/${ground.programmeId}/test-plans/${plan}`);
  const came = page.locator('wl-plan-results');
  await expect(came.getByRole('listitem').filter({ hasText: 'P-1' })).toContainText('as planned');
  const other = came.getByRole('listitem').filter({ hasText: 'P-2' });
  await expect(other).toContainText('differs from the plan');
  await expect(other).toContainText('Ground fixed floor instead of one belt');
});

test('what cannot be is refused where it stands, with what would be accepted, and kept as typed', async ({
  page,
}) => {
  const ground = await planningGround(page);
  await planOneFifth(page, ground);
  const cases = [
    ['Air temperature', '293', 'is it kelvin? 20'],
    ['Static pressure', '1013', 'is it hPa? 101'],
    ['Static pressure', '1.01', 'is it bar? 101'],
    ['Speed settled on, optional', '0', 'A number above 0 is accepted'],
  ] as const;
  for (const [label, typed, words] of cases) {
    const input = field(page, label);
    const before = await input.inputValue();
    await input.fill(typed);
    await input.blur();
    await expect(page.getByText(words)).toBeVisible();
    await expect(input).toHaveAttribute('aria-invalid', 'true');
    await expect(answer(page)).toContainText('Nothing to say yet');
    await page.getByRole('button', { name: 'Save the plan' }).click();
    await expect(input).toBeFocused();
    await expect(input).toHaveValue(typed);
    await input.fill(before);
  }
  const scale = field(page, 'Scale').first();
  for (const [typed, words] of [
    ['0', 'above 0, at most 1'],
    ['1.2', 'above 0, at most 1'],
  ] as const) {
    await scale.fill(typed);
    await scale.blur();
    await expect(page.locator('.error').filter({ hasText: words })).toBeVisible();
  }
  await scale.fill('1');
  await field(page, 'Frontal area, full size').fill('9');
  await expect(page.getByText('The model would be larger than the section')).toBeVisible();
  await expect(page.getByText('A scale up to 0.95 is accepted')).toBeVisible();
});

test('the sheet to hand over prints on one or two pages, and a stylist may read it', async ({ page }) => {
  const ground = await planningGround(page);
  const plan = await savedPlan(page, ground);
  await continueAs(page, 'stylist');
  await page.goto(`/programmes/${ground.programmeId}/test-plans/${plan}`);
  await expect(page.getByRole('button', { name: 'Save the plan' })).toHaveCount(0);
  await page.getByRole('link', { name: 'Sheet to hand over' }).click();
  await expect(page.getByRole('heading', { level: 2 })).toHaveText([
    'What',
    'Where',
    'Condition',
    'Limits',
    'Numbers',
    'Remark',
    'Before anybody runs it',
  ]);
  await expectAccessible(page);
  await page.emulateMedia({ media: 'print' });
  await expect(page.getByRole('button', { name: 'Print' })).toBeHidden();
  await expect(page.getByRole('navigation', { name: 'Sections' })).toBeHidden();
  const pdf = await page.pdf({ format: 'A4' });
  const pages = pdf.toString('latin1').match(/\/Type\s*\/Page[^s]/g)?.length ?? 0;
  expect(pages).toBeGreaterThanOrEqual(1);
  expect(pages).toBeLessThanOrEqual(2);
});

async function savedPlan(
  page: Page,
  { programmeId, variantId, facilityId }: PlanningGround,
): Promise<string> {
  const { id } = await post(page, `/api/v1/programmes/${programmeId}/test-plans`, {
    name: `Nearly half ${randomUUID().slice(0, 6)}`,
    variantId,
    facilityId,
    inputs: {
      scale: 0.45,
      target: { basis: 'reference' },
      speedKmh: 280,
      tunnelTemperatureC: 15,
      tunnelPressurePa: 101_325,
      maximumSpeedKmh: 300,
      maximumForceN: 1500,
      frontalAreaM2: 2.27,
      dragCoefficient: 0.285,
      condition: { ground: 'one-belt', wheels: 'rotating' },
      remark: 'Cooling closed with tape on the inside.',
    },
  });
  return id;
}
