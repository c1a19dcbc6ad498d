import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { Locator, Page } from '@playwright/test';
import { strFromU8, unzipSync } from 'fflate';
import { expectAccessible } from '../../fixtures/accessibility';
import { ownProgramme } from '../../fixtures/own-programme';
import { expect, test } from '../../fixtures/test';

/** Written by XlsxWriter 3.2.9: three sheets, merged cells, formulas with their values, dates as numbers. */
const WORKBOOK = fileURLToPath(new URL('../../fixtures/runs-of-may.xlsx', import.meta.url));

/** What a button saves: the file, and its sheets as XML by their place. */
async function saved(
  page: Page,
  button: Locator,
): Promise<{ readonly path: string; readonly sheets: readonly string[] }> {
  const [download] = await Promise.all([page.waitForEvent('download'), button.click()]);
  expect(download.suggestedFilename()).toMatch(/\.xlsx$/);
  const path = await download.path();
  const parts = unzipSync(await readFile(path));
  const names = Object.keys(parts).filter((name) => name.startsWith('xl/worksheets/'));
  return { path, sheets: names.sort().map((name) => strFromU8(parts[name] ?? new Uint8Array())) };
}

test('a workbook is brought in by one of its sheets, and what is shown is taken along as one', async ({
  page,
}) => {
  test.slow();
  const { address } = await ownProgramme(page);
  await page.goto(`${address}/import`);
  await page.getByLabel('Choose a CSV file or a workbook').setInputFiles(WORKBOOK);

  // The first sheet with a table is proposed; another one is chosen.
  const sheet = page.getByLabel('Sheet of the workbook');
  await expect(sheet.locator('option:checked')).toHaveText('Runs of April (2 filled rows)');
  await expect(sheet.getByRole('option', { name: 'Read me (no table)' })).toBeDisabled();
  await sheet.selectOption({ label: 'Runs of May (6 filled rows)' });
  await expect(page.getByText('2 cells hold formulas (F3, F6)')).toBeVisible();
  await expect(page.getByText('Merged cells: the value of an area’s first cell')).toBeVisible();
  await expect(page.getByText('One cell holds an error instead of a value (F6).')).toBeVisible();
  await expect(page.getByLabel('What CdA [m²] holds')).toHaveValue('dragArea');
  await expect(page.getByLabel('Decimal sign of the numbers')).toHaveValue('point');
  await expectAccessible(page);

  await page.getByRole('button', { name: 'Check the rows' }).click();
  await expect(page.getByRole('button', { name: /refused 1/ })).toBeVisible();
  await expect(page.getByText('2 results with 4 points.')).toBeVisible();
  await page.getByRole('button', { name: 'Store the results' }).click();
  await page.getByRole('button', { name: 'Store 2 results' }).click();
  await expect(page.getByText('2 results are in the programme.')).toBeVisible();

  // Results, ranking and derivation go along as workbooks: numbers as numbers, nothing as a formula.
  await page.goto(`${address}/results`);
  await page.getByRole('searchbox', { name: 'Search the results' }).fill('W-');
  await expect(page.getByRole('link', { name: 'W-2' })).toBeVisible();
  const results = await saved(page, page.getByRole('button', { name: 'Save as XLSX' }));
  expect(results.sheets[0]).toContain('<v>0.594</v>');
  expect(results.sheets[0]).not.toContain('J-01');

  await page.goto(`${address}/ranking`);
  const ranking = await saved(page, page.getByRole('button', { name: 'Save the table as XLSX' }));
  expect(ranking.sheets[0]).toMatch(/<c r="A2"><v>1<\/v><\/c>.*Hatch/);
  await page.getByRole('grid').getByRole('row').nth(1).getByRole('button').first().click();
  const sheetOfSteps = page.getByRole('dialog', { name: 'Derivation' });
  const derivation = await saved(page, sheetOfSteps.getByRole('button', { name: 'Save as XLSX' }));
  expect(derivation.sheets).toHaveLength(3);
  for (const xml of [...results.sheets, ...ranking.sheets, ...derivation.sheets])
    expect(xml).not.toMatch(/<f[ >]/);

  // What was taken along can be brought in again.
  await page.goto(`${address}/import`);
  await page.getByLabel('Choose a CSV file or a workbook').setInputFiles(results.path);
  await expect(page.getByText('Read from the sheet “Results” of a workbook.')).toBeVisible();
  await expect(page.getByLabel('What Speed in km/h holds')).toHaveValue('speed');
});
