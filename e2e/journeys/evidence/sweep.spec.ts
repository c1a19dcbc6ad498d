import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { type OwnProgramme, ownProgramme, postModelResult } from '../../fixtures/own-programme';
import { expect, test } from '../../fixtures/test';

const heading = (page: Page) => page.getByRole('heading', { level: 1 });

async function openResult(page: Page, { address }: OwnProgramme, name: string): Promise<void> {
  await page.goto(`${address}/results?search=${name}`);
  await page.getByRole('link', { name, exact: true }).click();
  await expect(heading(page)).toHaveText('What does this result say?');
}

/** Takes a table through the clipboard, as from a spreadsheet. */
async function paste(page: Page, text: string): Promise<void> {
  const remark = page.getByLabel('Remark');
  await remark.fill(text);
  await remark.press('ControlOrMeta+a');
  await remark.press('ControlOrMeta+x');
  const cell = page.getByLabel('Yaw', { exact: true }).first();
  await cell.focus();
  await cell.press('ControlOrMeta+v');
}

/** Four speeds on the one-fifth model: Re 1.25 to 3.8 million, flat within a few counts. */
async function enterFlatSweep(page: Page, { address }: OwnProgramme, name: string): Promise<void> {
  await page.goto(`${address}/results/new`);
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Variant').selectOption({ label: 'Hatch' });
  await page.getByLabel('Facility').selectOption({ label: 'Halmere' });
  await page.getByLabel('Tested on').fill('2026-07-02');
  await page.getByLabel('Scale', { exact: true }).fill('0.2');
  await page.getByLabel('Area it was formed with').fill('2.168');
  await page.getByLabel('Temperature').fill('20');
  await page.getByLabel('Static pressure').fill('998');
  await page.getByLabel('Relative humidity').fill('45');
  await paste(page, 'yaw\tvalue\tspeed\n0\t0.3055\t80\n0\t0.3052\t120\n0\t0.3050\t180\n0\t0.3048\t240');
  const preview = page.locator('wl-preview-panel');
  await expect(preview).toContainText('the caution about transition is resolved');
  await page.getByRole('button', { name: 'Enter the result' }).click();
  await expect(heading(page)).toHaveText('What does this result say?');
}

test('a sweep that is flat above the minimum resolves the caution, moves the ranking, and is stored', async ({
  page,
}) => {
  test.setTimeout(180_000);
  const programme = await ownProgramme(page);
  await postModelResult(page, programme, 'M-01', '2026-07-01', [{ value: 0.305, speedKmh: 100 }]);
  const leader = page.locator('[role=rowheader] .name').first();

  await openResult(page, programme, 'M-01');
  await expect(page.getByText('▲ caution', { exact: true })).toBeVisible();
  await expect(page.locator('wl-checks')).toContainText('Transition, caution');
  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Hatch');

  await enterFlatSweep(page, programme, 'M-02');

  await openResult(page, programme, 'M-01');
  await page.getByRole('radio', { name: /The sweep of M-02/ }).check();
  await expect(page.locator('wl-sweep-panel')).toContainText('k and its standard error');
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Take this way' }).click();
  await expect(page.getByText('▲ caution', { exact: true })).toHaveCount(0);
  await expect(page.getByText('● comparable')).toBeVisible();

  await page.getByRole('button', { name: 'Adopt' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByRole('textbox').fill('The sweep shows that it is flat.');
  await expect(dialog.getByRole('row', { name: /Hatch/ })).toBeVisible();
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'Adopt' }).click();
  await expect(page.getByText('● adopted')).toBeVisible();
  await expect(page.getByText(/is stored with its inputs and computes to the same figure now/)).toBeVisible();

  await page.getByRole('link', { name: 'Ranking' }).click();
  await expect(leader).toHaveText('Sport');
  const hatch = page.getByRole('grid').getByRole('row').filter({ hasText: 'Hatch' });
  await hatch.getByRole('button').first().click();
  const sheet = page.getByRole('dialog');
  await expect(sheet).toContainText('M-02');
  await expect(sheet).toContainText(/Reynolds/);
});

test('a sweep wholly below the minimum leaves the caution standing', async ({ page }) => {
  const programme = await ownProgramme(page);
  await postModelResult(page, programme, 'M-01', '2026-07-01', [{ value: 0.305, speedKmh: 100 }]);
  await postModelResult(page, programme, 'M-02', '2026-06-30', [
    { value: 0.305, speedKmh: 25 },
    { value: 0.3051, speedKmh: 50 },
    { value: 0.3049, speedKmh: 80 },
    { value: 0.305, speedKmh: 110 },
  ]);
  await openResult(page, programme, 'M-01');
  await page.getByRole('radio', { name: /The sweep of M-02/ }).check();
  await expect(page.locator('wl-sweep-panel')).toContainText('the caution about transition stands');
  await page.getByRole('button', { name: 'Take this way' }).click();
  await expect(page.getByRole('radio', { name: /The sweep of M-02.*holds now/ })).toBeVisible();
  await expect(page.getByText('▲ caution', { exact: true })).toBeVisible();
});
