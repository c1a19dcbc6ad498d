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

for (const scheme of ['light', 'dark'] as const) {
  test.describe(`in ${scheme}`, () => {
    test.use({ colorScheme: scheme });

    test(`sign-in has nothing that axe objects to, in ${scheme}`, async ({ page }) => {
      await page.goto('/sign-in');
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
      await expectAccessible(page);
    });

    for (const role of ['aerodynamicist', 'stylist', 'administrator'] as const) {
      test(`axe objects to no page that a link leads the ${role} to, in ${scheme}`, async ({ page }) => {
        test.setTimeout(600_000);
        await continueAs(page, role);
        const programme = await programmeNamed(page, 'Dunlin');
        const waiting = ['/programmes', `/programmes/${programme}/ranking`, ...WITHOUT_LINK];
        const seen = new Set<string>();
        for (let path = waiting.shift(); path !== undefined; path = waiting.shift()) {
          if (seen.has(kindOf(path))) continue;
          seen.add(kindOf(path));
          await test.step(kindOf(path), async () => {
            await open(page, path);
            await expectAccessible(page);
            waiting.push(...(await linksOf(page)));
          });
        }
        expect(seen.size, [...seen].join(', ')).toBeGreaterThan(WITHOUT_LINK.length + 2);
      });
    }
  });
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
}

function linksOf(page: Page): Promise<readonly string[]> {
  return page
    .locator('a[href^="/"]')
    .evaluateAll((links) =>
      links.map((link) => link.getAttribute('href') ?? '').filter((href) => !href.startsWith('/api/')),
    );
}
