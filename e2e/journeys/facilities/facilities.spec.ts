import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { expectAccessible } from '../../fixtures/accessibility';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const heading = (page: Page) => page.getByRole('heading', { level: 1 });
const LIST = 'Where does evidence come from, and how sure is it?';
const PAGE = 'How sure is what this facility says?';

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

  await expect(heading(page)).toHaveText(PAGE);
  await expect(page.getByText('Corrections, version 1')).toBeVisible();
  await page.getByRole('link', { name: 'All facilities' }).click();
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
  await expect(heading(page)).toHaveText(PAGE);
  await expect(page.getByText('Corrections, version 1')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Change the facility' })).toHaveCount(0);
  await expect(page.getByRole('button', { name: 'Add a session' })).toHaveCount(0);
  await expectAccessible(page);
});

test('a section smaller than what stood in it is warned of, with the results named', async ({ page }) => {
  await continueAs(page, 'aerodynamicist');
  await page.goto('/facilities');
  await page.getByRole('link', { name: 'Halmere' }).click();
  await page.getByRole('link', { name: 'Change the facility' }).click();
  await page.getByLabel('Area of the nozzle').fill('1,5');
  const warning = page.getByRole('status').filter({ hasText: 'Smaller than what stood in it' });
  await expect(warning.getByRole('link').first()).toBeVisible();
  await expect(page.getByLabel('Why it changes')).toBeVisible();
  await page.getByRole('link', { name: 'Cancel' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Leave' }).click();
  await expect(heading(page)).toHaveText(PAGE);
});

test('the check body is measured session by session, drift is warned of, and its scatter becomes a version', async ({
  page,
}) => {
  // Six entries by hand, each as a person types it.
  test.setTimeout(360_000);
  await continueAs(page, 'aerodynamicist');
  await page.goto('/facilities/new');
  await page.getByLabel('Name', { exact: true }).fill(`Corrow ${randomUUID().slice(0, 6)}`);
  await page.getByLabel('Kind').selectOption({ label: 'Tunnel, open jet' });
  await page.getByLabel('Area of the nozzle').fill('22');
  await page.getByRole('button', { name: 'Save' }).click();

  await test.step('the empty page says what to do first', async () => {
    await expect(page.getByText('No check body yet')).toBeVisible();
    await page.getByRole('link', { name: 'Name a check body' }).click();
    await page.getByLabel('Name of the body').fill('Grey box');
    await page.getByRole('button', { name: 'Save' }).click();
    await expect(page.getByText('Add a session below first')).toBeVisible();
  });

  const means = ['0.6120', '0.6128', '0.6115', '0.6123', '0.6118', '0.6190'];
  for (const [index, mean] of means.entries()) {
    await test.step(`session ${index + 1}`, () => measureSession(page, index, mean));
  }

  await test.step('the newest lies beyond the limits that the others set', async () => {
    const verdict = page.getByRole('status').filter({ hasText: 'Drift' });
    await expect(verdict).toContainText('Entry 6 is beyond the action limit');
    await page.getByRole('button', { name: 'The figures as a table' }).click();
    await expect(page.getByRole('row', { name: /Entry 6.*beyond the action limit/ })).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('struck out with a reason, it counts no more', async () => {
    await page.getByRole('button', { name: /^Strike out Entry 6/ }).click();
    const dialog = page.getByRole('alertdialog');
    await dialog.getByLabel('Why it does not count').fill('A panel had come loose');
    await dialog.getByRole('button', { name: 'Strike out' }).click();
    await expect(page.getByText('A panel had come loose')).toBeVisible();
    await expect(page.getByRole('status').filter({ hasText: 'Steady' })).toBeVisible();
  });

  await test.step('its session scatter is taken over, with a comment, as version 2', async () => {
    await page.getByRole('link', { name: 'Take over as the facility’s session scatter' }).click();
    await expect(page.getByRole('status').filter({ hasText: 'Taken over' })).toBeVisible();
    const session = page.getByRole('group', { name: 'Session' });
    await expect(session.getByLabel('Of the drag area')).not.toHaveValue('');
    await expect(page.getByLabel('Why it changes')).toHaveValue(/sessions of the check body Grey box/);
    await page.getByRole('button', { name: 'Save' }).click();
    await expect(page.getByText('Corrections, version 2')).toBeVisible();
    await expect(page.getByRole('listitem').filter({ hasText: 'Session: nothing →' }).first()).toBeVisible();
  });
});

/** One entry in the facility with one measurement of its check body, as a person types it. */
async function measureSession(page: Page, index: number, mean: string): Promise<void> {
  const name = `Entry ${index + 1}`;
  const day = `2026-0${index + 1}-12`;
  await page.getByRole('button', { name: 'Add a session' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill(name);
  await dialog.getByLabel('First day').fill(day);
  await dialog.getByRole('button', { name: 'Save' }).click();
  await expect(
    page
      .getByRole('cell', { name: new RegExp(`^${name}`) })
      .or(page.getByRole('rowheader', { name }))
      .first(),
  ).toBeVisible();

  const entry = page.getByRole('group', { name: 'Enter a measurement' });
  await entry.getByLabel('Session').selectOption({ label: name });
  await entry.getByLabel('Measured on').fill(day);
  await entry.getByLabel('Drag area').fill(mean);
  await entry.getByLabel('s of one reading').fill('0.0003');
  await entry.getByLabel('Readings').fill('5');
  await entry.getByRole('button', { name: 'Enter' }).click();
  await expect(page.getByRole('row', { name: new RegExp(`${name} ${mean}`) })).toBeVisible();
}
