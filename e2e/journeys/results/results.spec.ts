import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { type OwnProgramme, ownProgramme } from '../../fixtures/own-programme';
import { continueAs, programmeNamed } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const heading = (page: Page) => page.getByRole('heading', { level: 1 });
const LIST = 'What evidence do we have, and can it be compared?';

async function openResults(page: Page): Promise<OwnProgramme> {
  const programme = await ownProgramme(page);
  await page.goto(`${programme.address}/results`);
  await expect(heading(page)).toHaveText(LIST);
  await expect(page.getByRole('gridcell').first()).toBeVisible();
  return programme;
}

/** Takes a table through the clipboard, as from a spreadsheet. */
async function pasteInto(page: Page, label: string, text: string): Promise<void> {
  const remark = page.getByLabel('Remark');
  await remark.fill(text);
  await remark.press('ControlOrMeta+a');
  await remark.press('ControlOrMeta+x');
  const cell = page.getByLabel(label, { exact: true }).first();
  await cell.focus();
  await cell.press('ControlOrMeta+v');
}

/** A yaw sweep on the Sport, lower than anything else: once it counts, the Sport leads the ranking. */
async function enterSweep(page: Page, { address }: OwnProgramme, name: string): Promise<void> {
  await page.goto(`${address}/results/new`);
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Variant').selectOption({ label: 'Sport' });
  await page.getByLabel('Facility').selectOption({ label: 'Halmere' });
  await page.getByLabel('Tested on').fill('2026-11-20');
  await page.getByLabel('Area it was formed with').fill('2,086');
  await page.getByLabel('Speed, optional', { exact: true }).fill('38,8889');
  await page.getByLabel('Unit of the speed').selectOption('m/s');
  await page.getByLabel('Temperature').fill('20');
  await page.getByLabel('Static pressure').fill('998,4');
  await page.getByLabel('Relative humidity').fill('45');
  await pasteInto(page, 'Yaw', '-5\t0,259\n0\t0,252\n5\t0,260\n-10\t0,278\n10\t0,279');
}

test('the list tells what can be compared, narrows, remembers and exports', async ({ page }) => {
  test.setTimeout(120_000);
  const { address } = await openResults(page);
  await expectAccessible(page);
  await page.getByRole('button', { name: 'excluded 1' }).click();
  await expect(page).toHaveURL(/check=excluded/);
  await expect(page.getByRole('link', { name: 'J-02' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'J-01' })).toHaveCount(0);
  await page.getByRole('button', { name: 'excluded 1' }).click();

  await page.getByRole('searchbox', { name: 'Search the results' }).fill('Sport');
  await expect(page).toHaveURL(/search=Sport/);
  await expect(page.getByRole('link', { name: 'J-01' })).toHaveCount(0);
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save as CSV' }).click(),
  ]);
  const text = await readFile(await download.path(), 'utf8');
  expect(text).toContain('J-03,Sport,Halmere,2026-06-01,Drag coefficient,0.31,');
  expect(text).not.toContain('J-01');

  await page.getByRole('link', { name: 'J-03' }).click();
  await expect(heading(page)).toHaveText('What does this result say?');
  await expectAccessible(page);
  await page.goBack();
  await expect(page).toHaveURL(`${address}/results?search=Sport`);
  await expect(page.getByRole('searchbox', { name: 'Search the results' })).toHaveValue('Sport');
});

test('why a result stays out is said item by item', async ({ page }) => {
  await openResults(page);
  await page.getByRole('link', { name: 'J-02' }).click();
  await expect(page.getByText('■ excluded')).toBeVisible();
  await expect(page.getByText(/ground fixed floor, not several belts/)).toBeVisible();
  await expect(page.getByRole('row', { name: /^Ground/ })).toContainText('differs');
  await expect(page.getByRole('row', { name: /^Wheels/ })).toContainText('the same');
});

test('by keyboard a result is opened and its figure followed down to the raw value', async ({ page }) => {
  await openResults(page);
  await page.getByRole('gridcell').first().focus();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await expect(heading(page)).toHaveText('What does this result say?');
  await page.getByRole('button', { name: /open its derivation/ }).focus();
  await page.keyboard.press('Enter');
  const sheet = page.getByRole('dialog');
  await expect(sheet).toContainText('Where the uncertainty comes from');
  await expect(sheet.locator('math').first()).toBeVisible();
  await expectAccessible(page);
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: /open its derivation/ })).toBeFocused();
});

test('a yaw sweep typed by hand is previewed, entered, adopted, seen in the ranking, and withdrawn', async ({
  page,
}) => {
  test.setTimeout(120_000);
  const programme = await openResults(page);
  const leader = page.locator('[role=rowheader] .name').first();
  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Hatch');

  await enterSweep(page, programme, 'J-04');
  const preview = page.locator('wl-preview-panel');
  await expect(preview).toContainText('comparable');
  const figure = (await preview.locator('.figure').innerText()).slice(0, 5);
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Enter the result' }).click();
  await expect(heading(page)).toHaveText('What does this result say?');
  await expect(page.getByRole('button', { name: /open its derivation/ })).toContainText(figure);
  await expect(page.getByText('wind-averaged')).toBeVisible();

  // The older result is adopted first, so that the newer one does not count by itself.
  await page.goto(`${programme.address}/results?search=J-03`);
  await page.getByRole('link', { name: 'J-03' }).click();
  await adopt(page, 'First choice.');
  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Hatch');

  await page.goto(`${programme.address}/results?search=J-04`);
  await page.getByRole('link', { name: 'J-04' }).click();
  await adopt(page, 'A sweep, and the newer one.', 'Rests now on J-03, by adoption.');
  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Sport');
  await expect(page.getByRole('row').filter({ hasText: 'Sport' }).first()).toContainText(figure);

  await page.goto(`${programme.address}/results?search=J-04`);
  await page.getByRole('link', { name: 'J-04' }).click();
  await page.getByRole('button', { name: 'Withdraw' }).click();
  const dialog = page.getByRole('alertdialog');
  await expect(dialog).toContainText('takes it out of the adoption');
  await dialog.getByRole('textbox').fill('Entered for practice.');
  await dialog.getByRole('button', { name: 'Withdraw' }).click();
  await expect(page.getByText('Entered for practice.').first()).toBeVisible();
  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Hatch');
});

async function adopt(page: Page, comment: string, expected = ''): Promise<void> {
  await page.getByRole('button', { name: 'Adopt', exact: true }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog).toContainText(expected);
  await dialog.getByRole('textbox').fill(comment);
  await dialog.getByRole('button', { name: 'Adopt' }).click();
  await expect(page.getByText('● adopted')).toBeVisible();
}

test('an adoption that a colleague changed meanwhile is not overwritten unseen', async ({
  page,
  browser,
}) => {
  const programme = await openResults(page);
  await enterSweep(page, programme, 'J-04');
  await page.getByRole('button', { name: 'Enter the result' }).click();
  await page.getByRole('button', { name: 'Adopt', exact: true }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByRole('textbox').fill('Mine.');

  const colleague = await browser.newContext({ baseURL: new URL(page.url()).origin });
  const other = await colleague.newPage();
  await continueAs(other, 'aerodynamicist');
  await other.goto(`${programme.address}/results?search=J-03`);
  await other.getByRole('link', { name: 'J-03' }).click();
  await adopt(other, 'Theirs.');
  await colleague.close();

  await dialog.getByRole('button', { name: 'Adopt' }).click();
  await expect(page.getByRole('alert')).toContainText('changed by someone else');
  await expect(page.getByText('The variant rests on')).toContainText('J-03');
});

test('a bad entry is refused at its fields and kept as typed', async ({ page }) => {
  const programme = await openResults(page);
  await enterSweep(page, programme, 'J-01');
  await page.getByLabel('Quantity').selectOption({ label: 'Coastdown f2' });
  await page.getByRole('button', { name: 'Enter the result' }).click();
  await expect(page.getByText(/A coastdown is driven on a road, and Halmere is none/).first()).toBeVisible();
  await expect(page.getByLabel('Name', { exact: true })).toHaveValue('J-01');

  await page.getByLabel('Quantity').selectOption({ label: 'Drag coefficient' });
  await page.getByRole('button', { name: 'Enter the result' }).click();
  await expect(page.getByLabel('Name', { exact: true })).toHaveAttribute('aria-invalid', 'true');
  await expect(page.getByLabel('Drag coefficient').nth(1)).toHaveValue('0.252');
});

test('a stylist sees no results, not even by their address', async ({ page }) => {
  await continueAs(page, 'stylist');
  const id = await programmeNamed(page, 'Dunlin');
  await page.goto(`/programmes/${id}/results`);
  await expect(heading(page)).toHaveText('Your role does not include this page');
  await page.goto(`/programmes/${id}/variants`);
  await expect(page.getByRole('link', { name: 'Results' })).toHaveCount(0);
});
