import { expectAccessible } from '../../fixtures/accessibility';
import { ownProgramme } from '../../fixtures/own-programme';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const FLOOR = 'Both floors were compared in spring: less than a count';

test('a change of judgement is tried, outlives a reload, is proposed, and holds once a colleague accepts it', async ({
  page,
}) => {
  const { address } = await ownProgramme(page);
  await continueAs(page, 'programme-manager');
  await page.goto(`${address}/ranking`);
  await page.getByRole('button', { name: 'Try a change' }).click();
  const panel = page.getByRole('region', { name: 'Try a change' });
  await panel
    .getByRole('combobox', { name: 'Result', exact: true })
    .selectOption({ label: 'Hatch, J-02, 2026-06-01' });
  await panel.getByLabel('Why').fill(FLOOR);
  await panel.getByRole('button', { name: 'Include it all the same' }).click();

  const tried = page.getByRole('region', { name: 'Tried, not saved' });
  await expect(tried.getByText(`J-02 counts although it is not comparable: ${FLOOR}`)).toBeVisible();
  await expect(tried.getByText('J-02 counts for Hatch.')).toBeVisible();
  await tried
    .getByRole('combobox', { name: 'Change', exact: true })
    .selectOption({ label: 'a limit, or the friction line' });
  await tried.getByRole('button', { name: /Try with.* the friction line/ }).click();
  await expect(tried.getByRole('listitem')).toHaveCount(2);
  await expectAccessible(page);

  // The tab remembers; the server knows nothing.
  await page.reload();
  await expect(tried.getByRole('listitem')).toHaveCount(2);
  await tried.getByRole('button', { name: /^Drop: Results without a sweep/ }).click();
  await expect(tried.getByRole('listitem')).toHaveCount(1);
  await tried.getByLabel('Title').fill('Count the fixed-floor run');
  await tried.getByLabel('Why the change is right').fill('The comparison of floors covers this body');
  await tried.getByRole('button', { name: 'Save as a proposal' }).click();

  await expect(page).toHaveURL(/\/proposals\/[0-9a-f-]{36}$/);
  await expect(page.getByText('Somebody else than you accepts it.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Accept all of it' })).toHaveCount(0);
  await expectAccessible(page);
  const proposal = page.url();
  await page.goto(`${address}/ranking`);
  await expect(page.getByRole('grid').getByRole('rowheader').first()).toBeVisible();
  await expect(page.getByText('Tried, not saved')).toHaveCount(0);

  await continueAs(page, 'aerodynamicist');
  await page.goto(`${address}/proposals`);
  await page.getByRole('link', { name: 'Count the fixed-floor run' }).click();
  await expect(page).toHaveURL(proposal);
  await expect(page.getByText('The same, figure by figure.')).toBeVisible();
  await page.getByLabel('Why').fill('Seen in the spring report');
  await page.getByRole('button', { name: 'Accept all of it' }).click();
  await expect(page.getByText(/Accepted: every change holds now/)).toBeVisible();
  await expect(page.getByText('Seen in the spring report')).toBeVisible();

  await page.goto(`${address}/ranking`);
  await expect(page.getByRole('grid').getByRole('rowheader').first()).toBeVisible();
  await expect(page.getByText(/included with a reason/).first()).toBeVisible();
});
