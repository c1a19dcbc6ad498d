import type { Page } from '@playwright/test';
import { expectAccessible } from '../fixtures/accessibility';
import { continueAs, programmeNamed } from '../fixtures/people';
import { expect, test } from '../fixtures/test';

/** Pages that no link leads to, or that only a person with nothing yet would see. */
const WITHOUT_LINK = [
  '/unavailable',
  '/not-yours',
  '/there/is/nothing/here',
  '/set-password#a-token-of-this-length',
];

const ID = /[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}/g;
/** One page of each kind is enough: five variants share one page. */
const kindOf = (path: string) => path.replace(ID, ':id').replace(/[?#].*$/, '');

test('sign-in has nothing that axe objects to, in light and dark', async ({ page }) => {
  await page.goto('/sign-in');
  await expectAccessibleInBothSchemes(page);
});

for (const role of ['aerodynamicist', 'stylist', 'administrator'] as const) {
  test(`axe objects to no page that a link leads the ${role} to, in light and dark`, async ({ page }) => {
    test.setTimeout(1_200_000);
    await continueAs(page, role);
    const programme = await programmeNamed(page, 'Dunlin');
    const waiting = ['/programmes', `/programmes/${programme}/ranking`, ...WITHOUT_LINK];
    const seen = new Set<string>();
    for (let path = waiting.shift(); path !== undefined; path = waiting.shift()) {
      if (seen.has(kindOf(path))) continue;
      seen.add(kindOf(path));
      await test.step(kindOf(path), async () => {
        await page.goto(path);
        await expectAccessibleInBothSchemes(page);
        waiting.push(...(await linksOf(page)));
      });
    }
    expect(seen.size, [...seen].join(', ')).toBeGreaterThan(WITHOUT_LINK.length + 2);
  });
}

/** The page as it has settled, once in light and once in dark; a person's system may change while the page is open. */
async function expectAccessibleInBothSchemes(page: Page): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
    await test.step(colorScheme, () => expectAccessible(page));
  }
}

function linksOf(page: Page): Promise<readonly string[]> {
  return page
    .locator('a[href^="/"]')
    .evaluateAll((links) =>
      links.map((link) => link.getAttribute('href') ?? '').filter((href) => !href.startsWith('/api/')),
    );
}
