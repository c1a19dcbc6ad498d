import { randomUUID } from 'node:crypto';
import { fileURLToPath } from 'node:url';
import type { Page } from '@playwright/test';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { expectAccessible } from '../../fixtures/accessibility';
import { continueAs } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

/**
 * Published drag of the Ahmed body over its slant angle (Ahmed, Ramm and Faltin, SAE 840300), as a user's own file: half of
 * it as forces in another air state, one coefficient quoted on another area.
 */
const FILES = [
  ['ahmed-body.csv', 'with points'],
  ['ahmed-body-decimal-comma.csv', 'with decimal commas and semicolons'],
] as const;
const ORDER = ['12.5', '0', '40', '35', '25', '30'];
/** C_D·A in that order [m²]: 0.230, 0.250, 0.255, 0.260, 0.285, 0.378 times 0.112 m². */
const DRAG_AREAS = [0.02576, 0.028, 0.02856, 0.02912, 0.03192, 0.042336];

/** A programme and a facility of the journey's own, made through the API as a script would. */
async function newProgramme(page: Page, name: string): Promise<string> {
  const origin = new URL((await page.request.get('/healthz')).url()).origin;
  const create = async (path: string, data: object) => {
    const answer = await page.request.post(path, {
      data,
      headers: { origin, 'idempotency-key': randomUUID() },
    });
    return { status: answer.status(), body: (await answer.json()) as { readonly id: string } };
  };
  const programme = await create('/api/v1/programmes', {
    name,
    referenceSpeedKmh: 216,
    referenceAir: { state: 'iso-2533-sea-level' },
    referenceCondition: {},
    characteristicLengthM: 1.044,
    characteristicLengthName: 'overall length',
    commonArea: { kind: 'fixed', areaM2: 0.112 },
    confidence: 0.95,
    windSpeedMs: 3.12928,
    // The published figures are compared as they were printed, at the Reynolds number of their own test.
    frictionLine: 'off',
    milestones: [],
  });
  expect(programme.status).toBe(200);
  const facility = await create('/api/v1/facilities', {
    name: 'Aldwater',
    kind: 'open-jet',
    areaM2: 9,
    blockage: { method: 'none' },
    usualCondition: {},
  });
  // The second journey finds the facility of the first.
  expect([200, 409]).toContain(facility.status);
  return programme.body.id;
}

for (const [file, manner] of FILES) {
  test(`the Ahmed body’s published figures, ${manner}, become a ranking in the published order`, async ({
    page,
  }) => {
    test.slow();
    await continueAs(page, 'aerodynamicist');
    const programmeId = await newProgramme(page, `Ahmed body ${randomUUID().slice(0, 8)}`);
    await page.goto(`/programmes/${programmeId}/import`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Which file do you bring in?');
    await expectAccessible(page);
    await page
      .getByLabel('Choose a CSV file')
      .setInputFiles(fileURLToPath(new URL(`../../fixtures/${file}`, import.meta.url)));

    // Columns: all guessed. The slant itself is nothing that a result holds.
    await expect(page.getByText('Which column holds what?')).toBeVisible();
    await expect(page.getByLabel('What Cd holds')).toHaveValue('dragCoefficient');
    await expect(page.getByLabel('What Drag force [N] holds')).toHaveValue('dragForce');
    await expect(page.getByLabel('What Slant [deg] holds')).toHaveValue('');
    await expect(page.getByLabel('Unit of Speed [m/s]')).toHaveValue('m/s');
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Check the rows' }).click();

    // Names: six bodies that the programme does not know are created.
    await expect(page.getByText('Variants that the programme does not know')).toBeVisible();
    const choices = page.getByLabel(/^What to do with/);
    await expect(choices).toHaveCount(6);
    for (let i = 0; i < 6; i += 1) {
      await choices.nth(i).selectOption('create');
      await page
        .getByLabel('Frontal area, m²')
        .nth(i)
        .fill(i % 2 === 0 ? '0.112' : '0,112');
    }
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Check the rows again' }).click();

    // Rows: all can be stored; the coefficient on another area is pointed out. A reload finds the same step.
    await expect(page.getByRole('button', { name: /accepted 5/ })).toBeVisible();
    await expect(page.getByRole('button', { name: /cautioned 1/ })).toBeVisible();
    await expect(page.getByRole('gridcell', { name: /quoted on 0\.08\sm² \(full size\)/ })).toBeVisible();
    await page.reload();
    await expect(page.getByRole('button', { name: /accepted 5/ })).toBeVisible();
    await expect(page.getByText('6 results with 6 points.')).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('button', { name: 'Store the results' }).click();

    await expect(page.getByText('6 results are in the programme.')).toBeVisible();
    await page.getByRole('link', { name: 'See the ranking' }).click();
    const names = page.locator('[role=rowheader] .name');
    await expect(names).toHaveCount(6);
    const slants = (await names.allInnerTexts()).map((name) =>
      name.replace(/[^\d.,]/g, '').replace(',', '.'),
    );
    expect(slants).toEqual(ORDER);

    const view = (await (
      await page.request.get(`/api/v1/programmes/${programmeId}/ranking-view`)
    ).json()) as RankingView;
    expect(view.referenceReynolds / 1e6).toBeCloseTo(4.29, 2);
    expect(view.rows).toHaveLength(DRAG_AREAS.length);
    view.rows.forEach(({ figure }, rank) => {
      expect(figure.dragAreaM2).toBeCloseTo(DRAG_AREAS[rank] ?? 0, 8);
    });
  });
}
