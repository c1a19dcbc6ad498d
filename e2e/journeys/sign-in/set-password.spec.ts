import { expectAccessible } from '../../fixtures/accessibility';
import { foundOrganisation } from '../../fixtures/founding';
import { expect, test } from '../../fixtures/test';

const PASSWORD = 'herons wait by the weir';

test('a one-time link leads to a password, into the product, and is worth nothing afterwards', async ({
  page,
}) => {
  const { slug, email, link } = await foundOrganisation();
  await page.goto(link);
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Which password will be yours?');
  await expectAccessible(page);

  const password = page.getByLabel('New password');
  await password.fill('too short');
  await page.getByRole('button', { name: 'Set the password and sign in' }).click();
  await expect(page.getByText('At least 12 characters.', { exact: false }).last()).toBeVisible();
  await expect(password).toHaveValue('too short');
  await expect(password).toBeFocused();
  await page.getByRole('button', { name: 'Show what I type' }).click();
  await expect(password).toHaveAttribute('type', 'text');
  await password.fill(PASSWORD);
  await password.press('Enter');
  await expect(page).toHaveURL('/programmes');
  await expect(page.getByRole('button', { name: 'Ada Birch' })).toBeVisible();

  await page.goto('/sign-in');
  await page.goto(link);
  await page.getByLabel('New password').fill('another good sentence');
  await page.getByRole('button', { name: 'Set the password and sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('has been used or has run out');
  await expectAccessible(page);

  await page.getByRole('link', { name: 'Sign in with the password that you have' }).click();
  await page.getByLabel('Organisation').fill(slug);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page).toHaveURL('/programmes');
});

test('a link that was cut off says so', async ({ page }) => {
  await page.goto('/set-password#abc');
  await expect(page.getByRole('alert')).toContainText('This address is not complete.');
});
