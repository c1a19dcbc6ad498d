import { spawnSync } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import { resolve } from 'node:path';
import { expectAccessible } from '../../fixtures/accessibility';
import { continueAs, programmeNamed } from '../../fixtures/people';
import type { Page } from '@playwright/test';
import { expect, test } from '../../fixtures/test';

const ROOT = resolve(import.meta.dirname, '../../..');
const ORDER = ['Dunlin Liftback', 'Dunlin Hatch', 'Dunlin Sport', 'Dunlin Tourer', 'Dunlin Crossback'];

async function openRanking(page: Page, role: string, query = ''): Promise<string> {
  await continueAs(page, role);
  const id = await programmeNamed(page, 'Dunlin');
  await page.goto(`/programmes/${id}/ranking${query}`);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Which variant drags most?');
  await expect(page.getByRole('grid').getByRole('rowheader').first()).toBeVisible();
  return id;
}

/** Names in the order of the rows. */
const order = (page: Page) => page.locator('[role=rowheader] .name').allInnerTexts();

test('the demo is ranked and understood by the keyboard alone', async ({ page }) => {
  const id = await openRanking(page, 'aerodynamicist');
  expect(await order(page)).toEqual(ORDER);
  await expect(page.getByText(/Sport \(0\.28\d\) would rank behind .*Tourer \(0\.28\d\)/)).toBeVisible();
  await expect(page.getByText(/Dunlin Hatch and Dunlin Sport: 0\.00\d.m² apart/)).toBeVisible();

  // By energy: the control is reached and moved by keys, the address follows, no request leaves.
  const requests: string[] = [];
  page.on('request', (request) => {
    if (request.url().includes('/api/')) requests.push(request.url());
  });
  await page.getByLabel('Order by').focus();
  await page.keyboard.press('ArrowDown');
  await expect(page).toHaveURL(/order=energy/);
  await expect.poll(() => order(page)).not.toEqual(ORDER);
  await page.keyboard.press('ArrowUp');
  await expect(page).toHaveURL(new RegExp(`/programmes/${id}/ranking$`));
  await expect.poll(() => order(page)).toEqual(ORDER);
  expect(requests).toEqual([]);

  // One tab stop for the table; arrows go from figure to figure; Enter opens, Escape closes and gives the place back.
  const grid = page.getByRole('grid');
  await grid.locator('[data-stop][tabindex="0"]').focus();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowRight');
  const figure = grid.getByRole('row').nth(2).getByRole('button').first();
  await expect(figure).toBeFocused();
  await page.keyboard.press('Enter');
  const sheet = page.getByRole('dialog', { name: 'Derivation' });
  await expect(sheet).toBeVisible();
  await expect(sheet.locator('math').first()).toBeAttached();
  // Down to the raw value, with formula in values, its source and the budget.
  await expect(sheet.getByText('CIPM-2007', { exact: false }).first()).toBeVisible();
  await expect(sheet.getByText(/^\d+(\.\d+)?.*(N|kg\/m³)/).first()).toBeVisible();
  await expect(sheet.getByText(/facility bias, Halmere/)).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(sheet).toBeHidden();
  await expect(figure).toBeFocused();
});

test('the choices stand in the address and come back with it', async ({ page }) => {
  await openRanking(page, 'aerodynamicist', '?area=2.5&basis=wind-averaged&confidence=0.8');
  await expect(page.getByLabel('Basis')).toHaveValue('wind-averaged');
  await expect(page.getByLabel('Confidence')).toHaveValue('0.8');
  await expect(page.getByLabel('Reference area in m²')).toHaveValue('2.5');
  await expect(page.getByRole('columnheader', { name: /2\.500/ })).toBeVisible();
  await page.getByLabel('Basis').selectOption('zero-yaw');
  await expect(page).toHaveURL(/\?area=2\.5&confidence=0\.8$/);
  await page.goBack();
  await expect(page.getByLabel('Basis')).toHaveValue('wind-averaged');
});

test('what is shown can be taken along: table as CSV, chart as PNG and SVG', async ({ page }) => {
  await openRanking(page, 'programme-manager');
  const csv = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Save the table as CSV' }).click();
  const text = await readFile((await (await csv).path()) ?? '', 'utf8');
  const [head, ...rows] = text.trim().split('\r\n');
  expect(head).toContain('drag area in m²');
  expect(rows).toHaveLength(ORDER.length);
  expect(rows[0]).toMatch(/^1,Dunlin Liftback,0\.5\d+,/);

  await page.getByRole('button', { name: 'Show as a chart' }).click();
  await expect(page.locator('wl-ranking-chart svg')).toBeVisible();
  for (const [name, ending] of [
    ['Save as SVG', '.svg'],
    ['Save as PNG', '.png'],
  ] as const) {
    const saved = page.waitForEvent('download');
    await page.getByRole('button', { name }).click();
    expect((await saved).suggestedFilename()).toContain(ending);
  }
});

interface Ranked {
  readonly variantId: string;
  readonly dragAreaM2: number;
  readonly expandedUncertaintyM2: number;
  readonly coefficientOnOwnArea: number;
}

test('screen, API and machine entry give the same ranking', async ({ page }) => {
  const id = await openRanking(page, 'aerodynamicist');
  const inputs: unknown = await (
    await page.request.get(`/api/v1/programmes/${id}/ranking-inputs?evidence=adopted`)
  ).json();
  const machine = spawnSync('npm', ['run', '-s', 'method', '--', 'rank'], {
    cwd: ROOT,
    input: JSON.stringify({ ...(inputs as object), request: { cycle: 'wltc-class-3b' } }),
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  expect(machine.stderr).toBe('');
  const answered = JSON.parse(machine.stdout) as {
    readonly ranking: readonly Ranked[];
    readonly energy: readonly { readonly variantId: string; readonly wheelEnergyWhPerKm: number }[];
    readonly probabilityLowest: Readonly<Record<string, number>>;
  };
  // What the screen shows, with every digit, is what it exports.
  await expect(page.getByRole('gridcell', { name: '…' })).toHaveCount(0);
  const csv = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Save the table as CSV' }).click();
  const rows = (await readFile((await (await csv).path()) ?? '', 'utf8'))
    .trim()
    .split('\r\n')
    .slice(1)
    .map((row) => row.split(','));
  expect(rows).toHaveLength(answered.ranking.length);
  answered.ranking.forEach((ranked, index) => {
    const row = rows[index] ?? [];
    const energy = answered.energy.find(({ variantId }) => variantId === ranked.variantId);
    const close = (column: number, expected: number) =>
      expect(Math.abs(Number(row[column]) / expected - 1)).toBeLessThan(1e-12);
    close(2, ranked.dragAreaM2);
    close(3, ranked.expandedUncertaintyM2);
    close(8, ranked.coefficientOnOwnArea);
    close(11, energy?.wheelEnergyWhPerKm ?? 0);
    expect(Number(row[17])).toBe(answered.probabilityLowest[ranked.variantId]);
  });
});

test('a stylist is given the ranking without the raw evidence', async ({ page }) => {
  const inputs: string[] = [];
  page.on('request', (request) => {
    if (/ranking-(inputs|context)/.test(request.url())) inputs.push(request.url());
  });
  await openRanking(page, 'stylist');
  expect(await order(page)).toEqual(ORDER);
  await page.getByLabel('Order by').selectOption('energy');
  await expect.poll(() => order(page)).not.toEqual(ORDER);
  const figureOf = (variant: string) =>
    page.getByRole('grid').getByRole('row').filter({ hasText: variant }).getByRole('button').first();
  await figureOf('Dunlin Hatch').click();
  const sheet = page.getByRole('dialog', { name: 'Derivation' });
  await expect(sheet.getByText('Drag area at full scale')).toBeVisible();
  await expect(sheet.getByText(/raw readings are kept/).first()).toBeVisible();
  await page.keyboard.press('Escape');
  await figureOf('Dunlin Liftback').click();
  await expect(sheet.getByText('Weighted mean of 2 results')).toBeVisible();
  await expect(sheet.getByText(/Birge ratio/).first()).toBeVisible();
  expect(inputs).toEqual([]);
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`nothing stands in anybody’s way, ${colorScheme}`, async ({ page }) => {
    // Axe looks at everything twice here, which takes its time on a busy machine.
    test.slow();
    await page.emulateMedia({ colorScheme });
    await openRanking(page, 'aerodynamicist');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Compare the orders' }).first().click();
    await page.getByRole('grid').getByRole('row').nth(1).getByRole('button').first().click();
    await expect(page.getByRole('dialog', { name: 'Derivation' })).toBeVisible();
    await expectAccessible(page);
  });
}

test('the page reflows at 400 % and on a narrow screen', async ({ page }) => {
  await page.setViewportSize({ width: 320, height: 640 });
  await openRanking(page, 'aerodynamicist');
  const overflow = await page.evaluate(
    'document.documentElement.scrollWidth - document.documentElement.clientWidth',
  );
  expect(overflow).toBeLessThanOrEqual(0);
  await expectAccessible(page);
});
