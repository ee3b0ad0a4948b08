import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { fingerprint } from './fingerprint.mjs';

let root: string;
const write = (path: string, text: string) => writeFileSync(join(root, path), text);

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'shimlore-sources-'));
  mkdirSync(join(root, 'server/search'), { recursive: true });
  write('server/search/search.ts', 'one');
  write('tsconfig.json', '{}');
});
afterEach(() => {
  rmSync(root, { recursive: true, force: true });
});

describe('the fingerprint of sources', () => {
  const taken = () => fingerprint(root, ['server', 'tsconfig.json', 'not-there']);

  it.each<[string, () => void]>([
    ['a file deep in a folder changes', () => write('server/search/search.ts', 'two')],
    ['a file that was named by itself changes', () => write('tsconfig.json', '{ }')],
    ['a file comes', () => write('server/main.ts', '')],
    [
      'a file gets another name',
      () => renameSync(join(root, 'server/search/search.ts'), join(root, 'server/search/find.ts')),
    ],
  ])('changes when %s', (_what, change) => {
    const before = taken();

    change();

    expect(taken()).not.toBe(before);
  });

  it('stays when only a spec changes, which is not built', () => {
    const before = taken();

    write('server/search/search.spec.ts', 'it()');

    expect(taken()).toBe(before);
  });
});
