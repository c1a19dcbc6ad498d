import { randomUUID } from 'node:crypto';
import { expectAccessible } from '../../fixtures/accessibility';
import { bareProgramme } from '../../fixtures/bare-programme';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

test('an adjustment brings a fixed-floor result in, and the derivation shows it', async ({ page }) => {
  const programme = await bareProgramme(page);
  const hatch = await programme.variant('Hatch', 'hatch', 2.168);
  const sport = await programme.variant('Sport', 'coupe', 2.086);
  await programme.result({
    variantId: hatch,
    name: 'J-01',
    facility: 'full',
    value: 0.61,
    ground: 'fixed-floor',
  });
  await programme.result({ variantId: sport, name: 'J-02', facility: 'full', value: 0.64 });
  const name = `Coupé floor ${randomUUID().slice(0, 6)}`;
  await page.goto(`${programme.address}/ranking?evidence=newest`);
  await expect(page.getByRole('heading', { name: 'What stayed out' })).toBeVisible();
  await expect(page.getByRole('grid').getByRole('rowheader', { name: /Hatch/ })).toHaveCount(0);
  const remedy = page.getByRole('link', {
    name: 'Add an adjustment for ground, from fixed floor to several belts',
  });
  await remedy.click();
  await expect(page.getByLabel('Measured with')).toHaveValue('fixed-floor');
  await expect(page.getByLabel('Brought to')).toHaveValue('several-belts');

  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Typed in').selectOption({ label: 'counts on a named area' });
  await page.getByLabel('On the area').fill('2.19');
  await page.getByLabel('Added to the result').fill('-6');
  await page.getByLabel('Standard uncertainty u').fill('0');
  await expect(page.getByText('Kept as −0.01314')).toBeVisible();
  await page.getByLabel('What it rests on').fill('Six cars measured both ways in Halmere, report H-114');
  await page.getByRole('checkbox', { name: 'Hatch' }).check();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByText('An uncertainty of zero is never known: nothing').first()).toBeVisible();
  await expect(page.getByLabel('Standard uncertainty u')).toHaveValue('0');
  await page.getByLabel('Standard uncertainty u').fill('2');
  await page.getByRole('button', { name: 'Save' }).click();

  await expect(page.getByRole('heading', { level: 1 })).toHaveText(
    'What is a difference of the test condition worth?',
  );
  const row = page.getByRole('row', { name: new RegExp(name) });
  await expect(row).toContainText('−0.0131');
  await expect(row).toContainText('Hatch');
  await expectAccessible(page);

  await page.goto(`${programme.address}/ranking?evidence=newest`);
  const ranked = page.getByRole('grid').getByRole('row', { name: /Hatch/ });
  await ranked.getByRole('button').first().click();
  const sheet = page.getByRole('dialog', { name: 'Derivation' });
  await expect(sheet.getByText('Condition: adjustment').first()).toBeVisible();
  await expect(sheet.getByText(`the adjustment “${name}” holds for this body`)).toBeVisible();

  // Adjustments belong to the whole organisation: what this journey added goes out of use again.
  await page.goto('/adjustments');
  await page.getByRole('button', { name: `Retire ${name}` }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Retire' }).click();
  await expect(page.getByRole('button', { name: `Bring ${name} back` })).toBeVisible();
});

test('a stylist reads what differences are worth and is offered no change', async ({ page }) => {
  await continueAs(page, 'stylist');
  await page.goto('/adjustments');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(
    'What is a difference of the test condition worth?',
  );
  await expect(page.getByRole('link', { name: 'Add an adjustment' })).toHaveCount(0);
});
