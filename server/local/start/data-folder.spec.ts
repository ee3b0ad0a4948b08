import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { claimDataFolder } from './running.mjs';
import { readSecrets } from './secrets.mjs';

const address = 'http://localhost:4310';
let dataDir: string;

beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'shimlore-data-'));
});
afterEach(() => {
  rmSync(dataDir, { recursive: true, force: true });
});

describe('the secrets', () => {
  it('are made once and stay the same', () => {
    const made = readSecrets(dataDir);

    expect(readSecrets(dataDir)).toEqual(made);
    expect(Object.values(made).every((secret) => secret.length >= 32)).toBe(true);
    expect(new Set(Object.values(made)).size).toBe(5);
  });

  it('can be read by their owner only', () => {
    readSecrets(dataDir);

    expect(statSync(join(dataDir, 'secrets.json')).mode & 0o777).toBe(0o600);
  });

  it('that are damaged end the start instead of locking the database out', () => {
    writeFileSync(join(dataDir, 'secrets.json'), '{"database":');

    expect(() => readSecrets(dataDir)).toThrow('secrets.json cannot be read');
  });
});

describe('the claim on a data folder', () => {
  it('is refused while a launcher that holds it runs, with its address', async () => {
    await claimDataFolder(dataDir, address, () => undefined);

    const second = claimDataFolder(dataDir, address, () => undefined);

    await expect(second).rejects.toThrow(
      `Shimlore is already running at ${address} (process ${process.pid})`,
    );
  });

  it('is given again after it was released', async () => {
    const first = await claimDataFolder(dataDir, address, () => undefined);
    first.release();

    await expect(claimDataFolder(dataDir, address, () => undefined)).resolves.toBeDefined();
  });

  it('taken over from a launcher that was killed ends the children that it left', async () => {
    const child = spawn('sleep', ['600'], { stdio: 'ignore' });
    const ended = once(child, 'exit');
    const before = await claimDataFolder(dataDir, address, () => undefined);
    before.noteChild({ name: 'MariaDB', pid: child.pid! });
    pretendLauncherWasKilled();
    const said: string[] = [];

    await claimDataFolder(dataDir, address, (text) => said.push(text));

    expect(await ended).toEqual([null, 'SIGTERM']);
    expect(said).toEqual(['Ending what an earlier start left running: MariaDB.']);
  });

  it('leaves a later process alone that got the number of a child of old', async () => {
    const child = spawn('sleep', ['600'], { stdio: 'ignore' });
    const before = await claimDataFolder(dataDir, address, () => undefined);
    before.noteChild({ name: 'MariaDB', pid: child.pid! });
    pretendLauncherWasKilled((note) => ({
      ...note,
      children: [{ name: 'MariaDB', pid: child.pid, start: '1' }],
    }));

    await claimDataFolder(dataDir, address, () => undefined);

    expect(child.exitCode ?? child.signalCode).toBeNull();
    child.kill();
    await once(child, 'exit');
  });
});

interface Note {
  launcher: { pid: number; start: string };
  children: unknown[];
}

/** No process starts before the machine does. */
function pretendLauncherWasKilled(change: (note: Note) => Note = (note) => note): void {
  const file = join(dataDir, 'running.json');
  const note = JSON.parse(readFileSync(file, 'utf8')) as Note;
  writeFileSync(file, JSON.stringify(change({ ...note, launcher: { ...note.launcher, start: '0' } })));
}
