import { createRequire } from 'node:module';
import { join } from 'node:path';
import { cruise } from './cruise';

const ROOT = process.cwd();
const FIXTURES = join(ROOT, 'server/scripts/architecture/fixtures');
const { forbidden } = createRequire(join(ROOT, 'package.json'))('./.dependency-cruiser.cjs') as {
  readonly forbidden: readonly { readonly name: string; readonly comment?: string }[];
};

const APP = 'projects/wakeledger/src/app';

/** The one file in the fixtures that each rule must catch. */
const CANARIES: Readonly<Record<string, string>> = {
  'core-imports-nothing': 'shared/core/reaches-out.ts',
  'access-imports-core-only': 'shared/access/reaches-up.ts',
  'contracts-import-core-access-zod': 'shared/contracts/thing.ts',
  'client-not-to-server': `${APP}/core/reaches-server.ts`,
  'server-not-to-client': 'server/reaches-client.ts',
  'e2e-from-outside': 'e2e/looks-inside.ts',
  'module-by-its-front-door': 'server/modules/variants/variants.service.ts',
  'module-by-its-front-door-from-outside': 'server/main.ts',
  'routes-through-service': 'server/modules/results/results.routes.ts',
  'repository-at-the-bottom': 'server/modules/results/results.repository.ts',
  'tables-in-repositories-only': 'server/modules/results/results.service.ts',
  'database-client-in-db-only': 'server/opens-database.ts',
  'ui-presents-only': `${APP}/ui/reads-store.ts`,
  'http-in-api-files-only': `${APP}/features/two/asks-http.ts`,
  'calls-in-api-files-only': `${APP}/features/two/calls-server.ts`,
  'slices-in-data-only': `${APP}/features/two/two.effects.ts`,
  'data-knows-no-feature': `${APP}/data/things/knows-page.ts`,
  'feature-not-to-feature': `${APP}/features/one/one-page.ts`,
  'core-is-feature-blind': `${APP}/core/knows-data.ts`,
  'no-cycles': 'server/cycle-a.ts',
  'nothing-unresolvable': 'server/lost.ts',
};

describe('the architecture’s rules', () => {
  const found = cruise(ROOT, FIXTURES, ['shared', 'server', 'projects', 'e2e']);

  it('each have a canary, so that none can stop matching unnoticed', () => {
    expect(forbidden.map(({ name }) => name).toSorted()).toEqual(Object.keys(CANARIES).toSorted());
  });

  it.each(Object.entries(CANARIES))('%s catches its canary', (name, file) => {
    expect(found.filter(({ rule }) => rule.name === name).map(({ from }) => from)).toContain(file);
  });

  it('each carry a sentence for the person who trips over them', () => {
    for (const { comment } of forbidden) expect(comment).toMatch(/^[A-Z].{15,}\.$/s);
  });
});
