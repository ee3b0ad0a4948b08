import { randomUUID } from 'node:crypto';
import { access, mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import type { Readable } from 'node:stream';
import type { PhotoStore } from './photo-store.js';

/**
 * Photo files in a folder of this machine, spread over 256 folders by the first two digits of their name. A file is
 * written beside, forced to the disk and then renamed, so that nobody ever reads half of one.
 */
export function createLocalPhotoStore(folder: string): PhotoStore {
  const placeOf = (name: string): string => {
    const file = path.basename(name);
    return path.join(folder, file.slice(0, 2), file);
  };
  const beside = path.join(folder, 'incoming');

  async function put(name: string, bytes: Buffer): Promise<void> {
    const place = placeOf(name);
    const temporary = path.join(beside, randomUUID());
    await mkdir(beside, { recursive: true });
    await mkdir(path.dirname(place), { recursive: true });
    try {
      const file = await open(temporary, 'wx', 0o644);
      try {
        await file.writeFile(bytes);
        await file.sync();
      } finally {
        await file.close();
      }
      await rename(temporary, place);
    } catch (error) {
      await rm(temporary, { force: true });
      throw error;
    }
    await syncFolder(path.dirname(place));
  }

  async function get(name: string): Promise<Buffer | null> {
    try {
      return await readFile(placeOf(name));
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
      throw error;
    }
  }

  async function has(name: string): Promise<boolean> {
    return access(placeOf(name)).then(
      () => true,
      () => false,
    );
  }

  async function openFile(name: string): Promise<Readable | null> {
    try {
      return (await open(placeOf(name))).createReadStream();
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
      throw error;
    }
  }

  async function remove(name: string): Promise<void> {
    await rm(placeOf(name), { force: true });
  }

  async function health(): Promise<{ ok: boolean; detail: string }> {
    const probe = path.join(beside, `probe-${randomUUID()}`);
    try {
      await mkdir(beside, { recursive: true });
      const file = await open(probe, 'wx');
      await file.close();
      return { ok: true, detail: 'photo folder can be written' };
    } catch (error) {
      return {
        ok: false,
        detail: `photo folder cannot be written: ${(error as NodeJS.ErrnoException).code ?? 'unknown'}`,
      };
    } finally {
      await rm(probe, { force: true }).catch(() => undefined);
    }
  }

  return { put, get, has, open: openFile, remove, health };
}

/** A rename is only safe from a power cut once the folder itself is on the disk. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
