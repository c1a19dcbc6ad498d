import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** The files that the page itself names: scripts, preloads and style sheets. */
function namedInPage(html: string): string[] {
  return [...html.matchAll(/(?:src|href)="([^":]+\.(?:js|css))"/g)].map((match) => match[1] ?? '');
}

/** The scripts that a script loads before it runs; what it imports later, as a call, is not among them. */
export function staticImports(script: string): string[] {
  return [...script.matchAll(/(?:import|from)\s*"\.\/([^"]+\.js)"/g)].map((match) => match[1] ?? '');
}

/**
 * Every file that a first visitor downloads before the first lazily loaded page, by name within the folder of the
 * built client.
 */
export function initialFiles(folder: string): readonly string[] {
  const waiting = namedInPage(readFileSync(join(folder, 'index.html'), 'utf8'));
  const found = new Set<string>(['index.html']);
  for (let name = waiting.pop(); name !== undefined; name = waiting.pop()) {
    if (found.has(name) || !existsSync(join(folder, name))) continue;
    found.add(name);
    if (name.endsWith('.js')) waiting.push(...staticImports(readFileSync(join(folder, name), 'utf8')));
  }
  return [...found];
}
