import type { Page } from '@playwright/test';
import { foundOrganisation } from '../../fixtures/founding';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const submit = (page: Page) => page.getByRole('button', { name: 'Sign in', exact: true }).click();

async function fillSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('Organisation').fill('aldermere');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
}

async function openPersonMenu(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name }).click();
}

test('a wrong password is refused without saying what was right, and what was typed stays', async ({
  page,
}) => {
  await page.goto('/sign-in');
  await fillSignIn(page, `nobody-${Date.now()}@aldermere.example`, 'not the password');
  await submit(page);
  await expect(page.getByRole('alert')).toContainText(
    'Organisation, e-mail address or password is not right.',
  );
  await expect(page.getByLabel('E-mail address')).toHaveValue(/^nobody-/);
  await expect(page.getByLabel('Password')).toHaveValue('not the password');
});

test('who guesses too often is told how long to wait', async ({ page }) => {
  await page.goto('/sign-in');
  await fillSignIn(page, `guessed-${Date.now()}@aldermere.example`, 'guess');
  for (let guess = 0; guess < 8; guess += 1) {
    const answered = page.waitForResponse('**/api/v1/session/password');
    await submit(page);
    expect((await answered).status()).toBe(401);
  }
  await submit(page);
  await expect(page.getByRole('alert')).toContainText(/Too many attempts\. *Try again in \d+ minutes\./);
});

test('a visitor who asked for a page is signed in and led to it', async ({ page }) => {
  await page.goto('/cycles');
  await expect(page).toHaveURL(/\/sign-in\?return=/);
  await page.getByRole('button', { name: /^Ingrid Falk/ }).click();
  await expect(page).toHaveURL('/cycles');
});

test('who works for two organisations switches between them and sees only the one', async ({ page }) => {
  await continueAs(page, 'aerodynamicist');
  await page.goto('/programmes');
  await expect(page.getByRole('link', { name: 'Dunlin' }).first()).toBeVisible();
  await openPersonMenu(page, 'Ingrid Falk');
  await page.getByRole('button', { name: 'Velthorpe Coachworks' }).click();
  await expect(page.getByRole('link', { name: 'Dunlin' })).toHaveCount(0);
  await openPersonMenu(page, 'Ingrid Falk');
  await expect(page.getByText('Velthorpe Coachworks, reading along')).toBeVisible();
  await page.getByRole('button', { name: 'Aldermere Motors' }).click();
  await expect(page.getByRole('link', { name: 'Dunlin' }).first()).toBeVisible();
});

test('signing out leads to sign-in, and the way back is closed', async ({ page }) => {
  await continueAs(page, 'viewer');
  await page.goto('/programmes');
  await openPersonMenu(page, 'Priya Raman');
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page).toHaveURL('/sign-in');
  await page.goto('/facilities');
  await expect(page).toHaveURL(/\/sign-in/);
});

test('when the session has ended, the next step leads to sign-in and from there back', async ({
  page,
  context,
}) => {
  await continueAs(page, 'aerodynamicist');
  await page.goto('/programmes');
  await expect(page.getByRole('link', { name: 'Dunlin' }).first()).toBeVisible();
  await context.clearCookies();
  await page.getByRole('link', { name: 'Facilities' }).click();
  await expect(page).toHaveURL(/\/sign-in\?return=%2Ffacilities/);
  await page.getByRole('button', { name: /^Ingrid Falk/ }).click();
  await expect(page).toHaveURL('/facilities');
});

test('a founder’s organisation shows nothing of the demo', async ({ page }) => {
  const { link } = await foundOrganisation();
  await page.goto(link);
  await page.getByLabel('New password').fill('a sentence of my own');
  await page.getByRole('button', { name: 'Set the password and sign in' }).click();
  await expect(page).toHaveURL('/programmes');
  await expect(page.getByRole('link', { name: 'Dunlin' })).toHaveCount(0);
});
