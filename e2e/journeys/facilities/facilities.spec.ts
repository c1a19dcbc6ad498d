import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const heading = (page: Page) => page.getByRole('heading', { level: 1 });
const LIST = 'Where does evidence come from, and how sure is it?';

test('a facility is added with the blockage method that it needs, then retired and brought back', async ({
  page,
}) => {
  await continueAs(page, 'aerodynamicist');
  await page.goto('/facilities');
  await expect(heading(page)).toHaveText(LIST);
  await expectAccessible(page);
  await page.getByRole('link', { name: 'Add a facility' }).click();

  const name = `Ostrey ${randomUUID().slice(0, 6)}`;
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Area of the test section').fill('12,5');
  await page.getByLabel('Method').selectOption({ label: 'Maskell' });
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByLabel('Factor θ')).toBeFocused();
  await page.getByLabel('Factor θ').fill('0,96');
  await page.getByLabel('Ground').selectOption({ label: 'one belt' });
  const bias = page.getByRole('group', { name: 'Bias' });
  await bias.getByLabel('Of the drag area').fill('0,7');
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Save' }).click();

  await expect(heading(page)).toHaveText(LIST);
  const row = page.getByRole('row', { name: new RegExp(name) });
  await expect(row).toContainText('Maskell');
  await expect(row).toContainText('bias 0.70');
  await expect(row).toContainText('ground one belt');

  await row.getByRole('button', { name: `Retire ${name}` }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Retire' }).click();
  await page.getByRole('button', { name: `Bring ${name} back` }).click();
  await expect(row).toBeVisible();
});

test('what the server refuses of a facility stands at its field, and the rest stays as typed', async ({
  page,
}) => {
  await continueAs(page, 'aerodynamicist');
  await page.goto('/facilities/new');
  await page.getByLabel('Name', { exact: true }).fill('Halmere');
  await page.getByLabel('Area of the test section').fill('24');
  await page.getByRole('group', { name: 'Session' }).getByLabel('Degrees of freedom').fill('8');
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByRole('alert').first()).toBeVisible();
  await expect(page.getByRole('group', { name: 'Session' })).toContainText(
    'Degrees of freedom belong to an uncertainty',
  );
  await expect(page.getByLabel('Area of the test section')).toHaveValue('24');
});

test('a viewer reads how sure a facility is and is offered no change', async ({ page }) => {
  await continueAs(page, 'viewer');
  await page.goto('/facilities');
  await page.getByRole('link', { name: 'Halmere' }).click();
  await expect(page.getByLabel('Name', { exact: true })).toBeDisabled();
  await expect(page.getByRole('button', { name: 'Save' })).toHaveCount(0);
});
