import { continueAs, programmeNamed } from '../fixtures/people';
import { expect, test } from '../fixtures/test';

test('a link from another organisation leads to the same page as a link to nothing', async ({ page }) => {
  await continueAs(page, 'aerodynamicist');
  const foreign = await programmeNamed(page, 'Dunlin');

  await continueAs(page, 'aerodynamicist', 'Velthorpe Coachworks');
  const unknown = '00000000-0000-4000-8000-000000000000';
  const seen: string[] = [];
  for (const programme of [foreign, unknown]) {
    await page.goto(`/programmes/${programme}/ranking`);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(page.getByText('Dunlin')).toHaveCount(0);
    seen.push((await page.locator('main').innerText()).replaceAll(programme, 'id'));
  }
  expect(seen[0]).toBe(seen[1]);
});

test('a supplier sees neither programmes nor rankings of a maker', async ({ page }) => {
  await continueAs(page, 'aerodynamicist');
  const foreign = await programmeNamed(page, 'Dunlin');

  await continueAs(page, 'supplier-engineer', 'Corvane Optics');
  for (const path of [
    '/api/v1/programmes',
    `/api/v1/programmes/${foreign}`,
    `/api/v1/programmes/${foreign}/ranking-inputs`,
    `/api/v1/programmes/${foreign}/ranking-view`,
    '/api/v1/facilities',
  ]) {
    const answer = await page.request.get(path);
    expect(answer.status(), path).toBe(403);
    expect(await answer.text()).not.toContain('Dunlin');
  }
});
