import { join } from 'node:path';
import { ESLint } from 'eslint';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '../..');
// The typed rules need files that exist; the directions do not.
const eslint = new ESLint({
  cwd: root,
  overrideConfig: {
    languageOptions: { parserOptions: { project: null } },
    rules: {
      '@typescript-eslint/no-floating-promises': 'off',
      '@typescript-eslint/no-misused-promises': 'off',
      '@typescript-eslint/await-thenable': 'off',
    },
  },
});

async function complaints(file: string, source: string): Promise<string[]> {
  const [result] = await eslint.lintText(source, { filePath: join(root, file) });
  return (result?.messages ?? [])
    .filter((message) => message.ruleId !== '@typescript-eslint/no-unused-vars')
    .map((message) => message.message);
}

describe('the lint rule for import directions', () => {
  it.each([
    [
      'shared',
      'server',
      'shared/fit/sample.ts',
      "export { openDatabase } from '../../server/database.js';\n",
    ],
    ['shared', 'src', 'shared/fit/sample.ts', "export * from '../../src/app/app.js';\n"],
    ['server', 'src', 'server/search/sample.ts', "export * from '../../src/app/app.js';\n"],
    ['server', 'seeds', 'server/search/sample.ts', "export * from '../../seeds/demo.js';\n"],
    [
      'src',
      'server',
      'src/app/core/sample.ts',
      "export const later = import('../../../server/config.js');\n",
    ],
    ['migrations', 'shared', 'migrations/sample.ts', "export * from '../shared/contract/routes.js';\n"],
  ])('does not let %s import from %s', async (from, to, file, source) => {
    expect(await complaints(file, source)).toEqual([
      expect.stringMatching(new RegExp(`^Files of ${from}/ .* not from ${to}/`)),
    ]);
  });

  it("does not let a feature import another feature's store", async () => {
    const source = "export * from '../write-ups/draft.store.js';\n";

    expect(await complaints('server/moderation/sample.service.ts', source)).toEqual([
      "The store of write-ups is its own: ask write-ups's service.",
    ]);
  });

  it('does not let shared code lean on what only one side has', async () => {
    expect(
      await complaints('shared/fit/sample.ts', "export { readFile } from 'node:fs/promises';\n"),
    ).toEqual([expect.stringContaining('runs on both')]);
  });

  it.each([
    ['a feature its own store', 'server/write-ups/sample.service.ts', "export * from './draft.store.js';\n"],
    [
      "a feature another's service",
      'server/moderation/sample.service.ts',
      "export * from '../write-ups/write-ups.service.js';\n",
    ],
    ['the composition a store', 'server/sample.ts', "export * from './search/search-outbox.store.js';\n"],
    [
      'the server what is shared',
      'server/search/sample.ts',
      "export * from '../../shared/contract/routes.js';\n",
    ],
    ['the seeding of the demo the demo', 'server/local/sample.ts', "export * from '../../seeds/demo.js';\n"],
    ['a page what is shared', 'src/app/core/sample.ts', "export * from '../../../shared/contract/routes';\n"],
  ])('lets %s be imported', async (_what, file, source) => {
    expect(await complaints(file, source)).toEqual([]);
  });
});
