import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { bareProgramme, type BareProgramme } from '../../fixtures/bare-programme';
import { expect, test } from '../../fixtures/test';

const BODIES = [
  ['Hatch', 'hatch', 0.6],
  ['Estate', 'estate', 0.64],
  ['Crossover', 'crossover', 0.72],
  ['Coupé', 'coupe', 0.55],
  ['Van', 'van', 0.85],
] as const;

/** Five bodies measured in both, the model tunnel's figures a little high, and one measured in the model tunnel alone. */
async function measured(page: Page): Promise<BareProgramme> {
  const programme = await bareProgramme(page);
  for (const [index, [name, shape, value]] of BODIES.entries()) {
    const variantId = await programme.variant(name, shape, 2.2);
    const off = 0.012 + (index % 2) * 0.004;
    await programme.result({ variantId, name: `M-${name}`, facility: 'model', value: value + off });
    if (name !== 'Hatch') await programme.result({ variantId, name: `F-${name}`, facility: 'full', value });
  }
  return programme;
}

async function chooseFacilities(page: Page, { facilities }: BareProgramme): Promise<void> {
  await page.goto('/correlations/new');
  await page.getByLabel('Name', { exact: true }).fill(`${facilities.model} to ${facilities.full}`);
  await page.getByLabel('Facility or simulation set-up').selectOption({ label: facilities.model });
  await page.getByLabel('Reference facility', { exact: true }).selectOption({ label: facilities.full });
}

async function typePair(page: Page, geometry: string, figures: readonly [string, string, string, string]) {
  const typed = page.getByRole('group', { name: 'A pair typed by hand' });
  await typed.getByLabel('Geometry').fill(geometry);
  for (const [index, figure] of figures.entries()) {
    await typed.locator('wl-number-field input').nth(index).fill(figure);
  }
  await typed.getByRole('button', { name: 'Add this pair' }).click();
}

test('pairs are proposed, a line is fitted, adopted, and shown in a derivation', async ({ page }) => {
  const programme = await measured(page);
  await chooseFacilities(page, programme);
  await page.getByRole('checkbox', { name: 'the blockage correction' }).check();
  const pairs = page.getByRole('region', { name: 'Pairs', exact: true });
  await expect(pairs.getByRole('checkbox')).toHaveCount(4);
  await expect(page.getByText('1: under five pairs only the offset is fitted')).toBeVisible();

  // A fifth body that no programme ranks: now there is a slope.
  await page.getByText('Type a pair by hand').click();
  await typePair(page, 'Grey box', ['0.506', '0.004', '0.495', '0.003']);
  await expect(pairs.getByRole('checkbox')).toHaveCount(5);
  await expect(page.getByText(/5, 3 degrees of freedom/)).toBeVisible();
  await expect(page.getByRole('figure').first()).toBeVisible();
  await expectAccessible(page);

  // Leaving a proposed pair out needs a reason, which stays with the version.
  await pairs.getByLabel('Take Van in').uncheck();
  await page.getByLabel('Comment').fill('Four bodies and the grey box');
  await page.getByRole('button', { name: 'Save as a version' }).click();
  await expect(pairs.getByText('Say why, in a few words')).toBeVisible();
  await pairs.getByLabel('Why Van is left out').fill('Another roof rail was fitted');
  await page.getByRole('button', { name: 'Save as a version' }).click();

  await expect(page.getByRole('heading', { level: 1 })).toContainText('since when is it used?');
  await expect(page.getByText('No version is in use today')).toBeVisible();
  await expect(page.getByText('Van: Another roof rail was fitted')).toBeVisible();
  await expectAccessible(page);

  await page.getByLabel('From this date on').fill('2026-06-15');
  await page.getByLabel('Comment on its use').fill('Agreed in the tunnel meeting');
  await page.getByRole('button', { name: 'Adopt version 1' }).click();
  await expect(page.getByText('Version 1 is in use since 2026-06-15').first()).toBeVisible();

  // The body that only the model tunnel has seen is carried to the reference facility.
  await page.goto(`${programme.address}/ranking?evidence=newest`);
  const hatch = page.getByRole('grid').getByRole('row', { name: /Hatch/ });
  await hatch.getByRole('button').first().click();
  const sheet = page.getByRole('dialog', { name: 'Derivation' });
  await expect(sheet.getByText('Correlation to the reference facility').first()).toBeVisible();
  await expect(
    sheet.getByText(/Corrie .* to Langdale .*, version 1, in use since 2026-06-15/).first(),
  ).toBeVisible();
  await expect(sheet.getByText('the correlation stands for the blockage correction')).toBeVisible();
});

test('a falling line, a figure known exactly and two equal drag areas are refused before anything is saved', async ({
  page,
}) => {
  const programme = await bareProgramme(page);
  await chooseFacilities(page, programme);
  await page.getByText('Type a pair by hand').click();
  await typePair(page, 'Zero', ['0.6', '0', '0.61', '0.003']);
  await expect(page.getByText(/Accepted: 0\.00001 to 1/)).toBeVisible();

  await typePair(page, 'One', ['0.6', '0.004', '0.61', '0.003']);
  await expect(page.getByText('At least two pairs are needed')).toBeVisible();
  await typePair(page, 'Two', ['0.6', '0.004', '0.62', '0.003']);
  await expect(page.getByText('Every pair has the same drag area')).toBeVisible();
  for (const [index, x] of ['0.65', '0.7', '0.75', '0.8'].entries()) {
    await typePair(page, `Falling ${index}`, [x, '0.004', String(0.56 - index * 0.06), '0.003']);
  }
  await expect(page.getByText('The line falls: more drag in one facility would be less')).toBeVisible();
  await page.getByLabel('Comment').fill('Tried');
  await page.getByRole('button', { name: 'Save as a version' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(
    'Which pairs bring one facility to another?',
  );
  await expectAccessible(page);
});
