import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { ownProgramme } from '../../fixtures/own-programme';
import { continueAs, programmeNamed } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const heading = (page: Page) => page.getByRole('heading', { level: 1 });
const inOneWord = (name: string) => `${name} ${randomUUID().slice(0, 6)}`;

async function openVariants(page: Page): Promise<string> {
  const { address } = await ownProgramme(page);
  await page.goto(`${address}/variants`);
  await expect(heading(page)).toHaveText('Which variants does this programme compare?');
  return `${address}/variants`;
}

/** A variant of the journey's own, typed in the form. */
async function addVariant(page: Page, name: string): Promise<void> {
  await page.getByRole('link', { name: 'Add a variant' }).click();
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Area', { exact: true }).fill('2,21');
  await page.getByLabel('Standard uncertainty u').fill('0.008');
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(heading(page)).toHaveText('Which variants does this programme compare?');
  await expect(page.getByRole('link', { name })).toBeVisible();
}

test('a variant is added with a decimal comma, edited, retired and brought back by undo', async ({
  page,
}) => {
  await openVariants(page);
  const name = inOneWord('Dunlin Van');
  await addVariant(page, name);
  await expectAccessible(page);

  await page.getByRole('link', { name }).click();
  await page.getByLabel('Length, optional').fill('4650');
  await page.getByRole('button', { name: 'Add a configuration' }).click();
  const configuration = page.getByRole('listitem').filter({ has: page.getByLabel('Test mass') });
  await configuration.getByLabel('Name', { exact: true }).fill('Electric');
  await configuration.getByLabel('Test mass').fill('1 820');
  await configuration.getByLabel('Rolling-resistance coefficient, optional').fill('0.009');
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Save' }).click();
  const row = page.getByRole('listitem').filter({ has: page.getByRole('link', { name }) });
  await expect(row).toContainText('2.210');
  await expect(row).toContainText('Electric, 1820');

  await row.getByRole('button', { name: `Retire ${name}` }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Retire' }).click();
  await expect(page.getByRole('list', { name: 'Retired variants' })).toContainText(name);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('list', { name: 'Variants', exact: true })).toContainText(name);
});

test('what cannot be used is refused at its field, and what was typed stays', async ({ page }) => {
  await openVariants(page);
  await page.getByRole('link', { name: 'Add a variant' }).click();
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByLabel('Name', { exact: true })).toBeFocused();
  await expect(page.getByText('A number is needed here.').first()).toBeVisible();

  await page.getByLabel('Name', { exact: true }).fill('Hatch');
  await page.getByLabel('Area', { exact: true }).fill('two');
  await page.getByLabel('Standard uncertainty u').fill('0,01');
  await expect(page.getByText('“two” is not a number.')).toBeVisible();
  await expect(page.getByLabel('Area', { exact: true })).toHaveValue('two');

  await page.getByLabel('Area', { exact: true }).fill('2,2');
  await page.getByRole('button', { name: 'Save' }).click();
  await expect(page.getByRole('alert').first()).toContainText('There is one of this name already');
  await expect(page.getByLabel('Name', { exact: true })).toHaveAttribute('aria-invalid', 'true');
  await expect(page.getByLabel('Name', { exact: true })).toHaveValue('Hatch');

  await page.getByRole('link', { name: 'All variants' }).click();
  await page.getByRole('button', { name: 'Stay here' }).click();
  await expect(page.getByLabel('Name', { exact: true })).toHaveValue('Hatch');
});

test('a colleague’s edit meanwhile is shown field by field, and mine is not lost', async ({
  page,
  browser,
}) => {
  const list = await openVariants(page);
  const name = inOneWord('Dunlin Pick-up');
  await addVariant(page, name);
  await page.getByRole('link', { name }).click();
  await page.getByLabel('Height, optional').fill('1 640');

  const colleague = await browser.newContext({ baseURL: new URL(page.url()).origin });
  const other = await colleague.newPage();
  await continueAs(other, 'programme-manager');
  await other.goto(list);
  await other.getByRole('link', { name }).click();
  await other.getByLabel('Width, optional').fill('1 905');
  await other.getByRole('button', { name: 'Save' }).click();
  await expect(heading(other)).toHaveText('Which variants does this programme compare?');
  await colleague.close();

  await page.getByRole('button', { name: 'Save' }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog).toContainText('A colleague changed');
  await expect(dialog.getByRole('row', { name: /^Height/ })).toContainText('1640');
  await expect(dialog.getByRole('row', { name: /^Width/ })).toContainText('1905');
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'Save mine over theirs' }).click();
  await expect(heading(page)).toHaveText('Which variants does this programme compare?');
  await page.getByRole('link', { name }).click();
  await expect(page.getByLabel('Height, optional')).toHaveValue('1640');
});

test('a stylist reads the variants and is offered no change', async ({ page }) => {
  await continueAs(page, 'stylist');
  await page.goto(`/programmes/${await programmeNamed(page, 'Dunlin')}/variants`);
  await expect(page.getByRole('link', { name: 'Dunlin Hatch' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'Add a variant' })).toHaveCount(0);
  await page.getByRole('link', { name: 'Dunlin Hatch' }).click();
  await expect(page.getByLabel('Name', { exact: true }).first()).toBeDisabled();
  await expect(page.getByRole('button', { name: 'Save' })).toHaveCount(0);
});
