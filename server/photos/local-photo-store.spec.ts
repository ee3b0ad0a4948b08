import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { createLocalPhotoStore } from './local-photo-store.js';

let folder = '';
beforeEach(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'shimlore-store-'));
});
afterEach(() => rm(folder, { recursive: true, force: true }));

test('when a file is put, then it is there whole and nothing is left beside', async () => {
  const store = createLocalPhotoStore(folder);
  await store.put('abc-480.webp', Buffer.from('first'));
  await store.put('abc-480.webp', Buffer.from('first'));
  expect((await store.get('abc-480.webp'))?.toString()).toBe('first');
  expect(await store.has('abc-480.webp')).toBe(true);
  expect(await readdir(path.join(folder, 'incoming'))).toEqual([]);
});

test('when a file is not there, then that is told as such', async () => {
  const store = createLocalPhotoStore(folder);
  expect(await store.get('abc-480.webp')).toBeNull();
  expect(await store.has('abc-480.webp')).toBe(false);
});

test('when a name tries to leave the folder, then nothing outside is read', async () => {
  await writeFile(path.join(folder, 'secret'), 'secret');
  const store = createLocalPhotoStore(path.join(folder, 'photos'));
  expect(await store.get('../secret')).toBeNull();
});

test('when the folder can be written, then the store is healthy; when it cannot, then it says so', async () => {
  expect(await createLocalPhotoStore(folder).health()).toMatchObject({ ok: true });
  await writeFile(path.join(folder, 'file'), '');
  expect(await createLocalPhotoStore(path.join(folder, 'file', 'below')).health()).toMatchObject({
    ok: false,
    detail: expect.stringContaining('ENOTDIR'),
  });
});
