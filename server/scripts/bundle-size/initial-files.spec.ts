import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { initialFiles } from './initial-files';

describe('the initial download', () => {
  const folder = mkdtempSync(join(tmpdir(), 'built-'));
  afterAll(() => rmSync(folder, { recursive: true }));

  it('is what the page names and what that imports, but not what is imported later', () => {
    const write = (name: string, text: string): void => writeFileSync(join(folder, name), text);
    write(
      'index.html',
      '<link rel="stylesheet" href="styles-A.css"><script src="main-A.js" type="module"></script>',
    );
    write('styles-A.css', '');
    write(
      'main-A.js',
      'import{a as b}from"./chunk-B.js";import"./chunk-C.js";const p=()=>import("./chunk-LAZY.js");',
    );
    write('chunk-B.js', 'import{c}from"./chunk-C.js";');
    write('chunk-C.js', '');
    write('chunk-LAZY.js', '');
    expect([...initialFiles(folder)].toSorted()).toEqual([
      'chunk-B.js',
      'chunk-C.js',
      'index.html',
      'main-A.js',
      'styles-A.css',
    ]);
  });
});
