import { mkdtempSync, mkdirSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildServer, serverBundleIsFresh } from './server-bundle';

let root: string;
beforeAll(async () => {
  root = mkdtempSync(join(tmpdir(), 'wakeledger-bundle-'));
  mkdirSync(join(root, 'server'));
  writeFileSync(join(root, 'tsconfig.json'), '{}');
  writeFileSync(join(root, 'package.json'), '{}');
  writeFileSync(join(root, 'server/part.ts'), 'export const part: number = 1;');
  writeFileSync(
    join(root, 'server/main.ts'),
    `import { part } from './part';\nprocess.stdout.write(String(part));`,
  );
});
afterAll(() => rmSync(root, { recursive: true }));

test('a clone without a bundle has none that is fresh', () => {
  expect(serverBundleIsFresh(root)).toBe(false);
});

test.each(['server/part.ts', 'server/main.ts', 'package.json'])(
  'the bundle is fresh until %s changes, and again once it has been made anew',
  async (path) => {
    await buildServer(root);
    expect(serverBundleIsFresh(root)).toBe(true);
    utimesSync(join(root, path), new Date(), new Date(Date.now() + 5000));
    expect(serverBundleIsFresh(root)).toBe(false);
    await buildServer(root);
    expect(serverBundleIsFresh(root)).toBe(true);
  },
);

test('the bundle is not fresh once a file of it is gone', async () => {
  await buildServer(root);
  rmSync(join(root, 'server/part.ts'));
  expect(serverBundleIsFresh(root)).toBe(false);
});
