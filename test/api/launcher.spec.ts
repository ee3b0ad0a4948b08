import { execFile } from 'node:child_process';
import { rm } from 'node:fs/promises';
import { createServer, type Server } from 'node:net';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { openDatabase } from '../../server/database.js';
import { startMariaDb } from '../../server/local/mariadb.mjs';
import { freePort } from '../../server/local/start/ports.mjs';
import { projectDir } from '../../server/local/start/services.mjs';
import { makeDataFolder } from './support/services.js';

describe('the local MariaDB', () => {
  let dataDir: string;

  beforeEach(async () => {
    dataDir = await makeDataFolder();
  });
  afterEach(async () => {
    await rm(dataDir, { recursive: true, force: true });
  });

  it('killed in the middle of writing has every row after it that was acknowledged before', async () => {
    const port = await freePort();
    const first = await startMariaDb({ dataDir, port });
    let knex = openDatabase(first.url);
    await knex.raw('CREATE TABLE written (number INT PRIMARY KEY)');
    const acknowledged: number[] = [];
    const writing = (async () => {
      for (let number = 1; ; number += 1) {
        await knex('written').insert({ number });
        acknowledged.push(number);
      }
    })().catch(() => undefined);
    while (acknowledged.length < 50) await pause(5);

    process.kill(first.pid!, 'SIGKILL');
    await first.exited;
    await writing;
    await knex.destroy();
    const second = await startMariaDb({ dataDir, port });

    knex = openDatabase(second.url);
    const kept = await knex('written').pluck<number[]>('number');
    await knex.destroy();
    await second.stop();
    expect(acknowledged.length).toBeGreaterThanOrEqual(50);
    expect(kept).toEqual(expect.arrayContaining(acknowledged));
  });

  it('lets nobody in without the password that was made for it', async () => {
    const database = await startMariaDb({ dataDir, port: await freePort() });
    try {
      const root = new URL(database.url);
      root.username = 'root';
      root.password = '';
      root.pathname = '/mysql';
      const knex = openDatabase(root.href);

      const asked = knex.raw('SELECT 1');

      await expect(asked).rejects.toThrow(/Access denied|not allowed/);
      await knex.destroy();
    } finally {
      await database.stop();
    }
  });

  it('that finds its port taken says which, and how to choose another', async () => {
    const { server, port } = await holdPort();
    try {
      await expect(startMariaDb({ dataDir, port })).rejects.toThrow(
        `Port ${port} for MariaDB is in use by another program: stop that program, or set SHIMLORE_DB_PORT to a free port.`,
      );
    } finally {
      server.close();
    }
  });
});

describe('npm start', () => {
  it('refuses a port that is no port in one sentence', async () => {
    const dataDir = await makeDataFolder();

    const { code, said } = await start({ PORT: 'many', SHIMLORE_DATA: dataDir });

    await rm(dataDir, { recursive: true, force: true });
    expect(said.trim()).toBe('PORT is "many": it takes a port number from 1 to 65535.');
    expect(code).toBe(1);
  });
});

async function holdPort(): Promise<{ server: Server; port: number }> {
  const port = await freePort();
  const server = createServer();
  await new Promise<void>((listening) => server.listen(port, '127.0.0.1', listening));
  return { server, port };
}

function start(environment: Record<string, string>): Promise<{ code: number; said: string }> {
  return new Promise((resolve) => {
    execFile(
      process.execPath,
      [join(projectDir, 'server/local/start.mjs')],
      { env: { ...process.env, ...environment } },
      (error, stdout, stderr) => resolve({ code: error ? Number(error.code) : 0, said: stdout + stderr }),
    );
  });
}
