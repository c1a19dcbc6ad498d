import { continueAs, programmeNamed } from '../../fixtures/people';
import { expect, test } from '../../fixtures/test';

const FILE = `Run,Variant,Facility,Date,CdA [m²],Scale,Speed [km/h],Air state,U95,k
Mend 1,Dunlin Hatch,Halmere,2026-04-01,0.61,1,140,ISA,0.008,2
Mend 2,Dunlin Hatch,Halmere,2026-04-01,n/a,1,140,ISA,0.008,2
Mend 3,Dunlin Hatch,Halmere,later,0.61,1,140,ISA,0.008,2
Mend 4,Dunlin Hatch,Halmere,later,0.61,1,140,ISA,0.008,2
`;

test('refused rows are mended in place by the keyboard, and many at once; nothing is stored before it is confirmed', async ({
  page,
}) => {
  test.slow();
  await continueAs(page, 'aerodynamicist');
  const programmeId = await programmeNamed(page, 'Dunlin');
  const resultCount = async (): Promise<number> => {
    const answer = await page.request.get(`/api/v1/programmes/${programmeId}/results`);
    return ((await answer.json()) as { readonly results: readonly unknown[] }).results.length;
  };
  const before = await resultCount();
  await page.goto(`/programmes/${programmeId}/import`);
  await page
    .getByLabel('Choose a CSV file')
    .setInputFiles({ name: 'mend.csv', mimeType: 'text/csv', buffer: Buffer.from(FILE) });
  await page.getByRole('button', { name: 'Check the rows' }).press('Enter');
  await expect(page.getByRole('button', { name: /refused 3/ })).toBeVisible();

  // One cell: Enter opens it, typing replaces it, Enter checks it.
  const cell = page.getByRole('gridcell', { name: 'n/a', exact: true });
  await cell.click();
  await page.keyboard.press('Enter');
  await page.keyboard.press('ControlOrMeta+A');
  await page.keyboard.type('0.62');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: /refused 2/ })).toBeVisible();

  // Many: the refused rows alone are shown, and their dates are written at once.
  await page.getByRole('button', { name: /refused 2/ }).press('Enter');
  await expect(page.getByText('2 of 4 rows shown')).toBeVisible();
  await page.getByText('Mend all rows shown at once').press('Enter');
  await page.getByRole('combobox', { name: 'Column', exact: true }).selectOption({ label: 'Date' });
  await page.getByLabel('Text', { exact: true }).fill('2026-04-02');
  await page.getByRole('button', { name: 'Do it in 2 rows' }).press('Enter');
  await expect(page.getByRole('button', { name: /refused 0/ })).toBeVisible();
  await expect(page.getByText('4 results with 4 points.')).toBeVisible();

  // A reload finds the mended rows again; laid aside, nothing of them remains.
  await page.reload();
  await expect(page.getByText('4 results with 4 points.')).toBeVisible();
  expect(await resultCount()).toBe(before);
  await page.getByRole('button', { name: 'Lay this import aside' }).click();
  await page.getByRole('button', { name: 'Lay aside', exact: true }).click();
  await expect(page.getByText('laid aside').first()).toBeVisible();
  expect(await resultCount()).toBe(before);
});
