/**
 * Compares the pages that show measurements with 10,000 and with 1,000,000 of them in the database: part, joint, and the
 * readings of one dimension. Prints ratios of the medians; both databases lie in one server and are asked in turns.
 *
 *   npm run bench:measurements
 */
import { rm } from 'node:fs/promises';
import type { Knex } from 'knex';
import { openDatabase } from '../../server/database.js';
import { createJoints } from '../../server/joints/joints.js';
import { startMariaDb } from '../../server/local/mariadb.mjs';
import { freePort } from '../../server/local/start/ports.mjs';
import { createAuditLog } from '../../server/audit/audit.js';
import { createDeskInbox } from '../../server/moderation/desk-inbox.js';
import { createHappenings } from '../../server/watches/happenings.js';
import { createMeasurements } from '../../server/measurements/measurements.js';
import { migrateToLatest } from '../../server/migration-source.js';
import { createHardware } from '../../server/hardware/hardware.js';
import { noRateLimits } from '../../server/http/rate-limits.js';
import type { WriteUpService } from '../../server/write-ups/write-ups.js';
import { makeDataFolder } from '../api/support/services.js';

const parts = 200;
const revisionsEach = 5;
const rounds = 60;
const clock = (): Date => new Date();

/** 200 parts of five revisions with a boss and a recess each, joined in a ring, and so many readings spread over all dimensions. */
async function fill(knex: Knex, readings: number): Promise<void> {
  const sql = (text: string): Promise<unknown> => knex.raw(text) as unknown as Promise<unknown>;
  await sql(
    "INSERT INTO accounts (id, email, display_name, role, password_hash, confirmed_at, created_at) VALUES (1, 'a@b.example', 'Reader', 'member', '', NOW(), NOW())",
  );
  await sql("INSERT INTO makers (id, slug, name, about) VALUES (1, 'maker', 'Maker', '')");
  await sql(
    `INSERT INTO parts (id, slug, maker_id, name, kind, about) SELECT seq, CONCAT('part-', seq), 1, CONCAT('Part ', seq), 'spacer', '' FROM seq_1_to_${parts}`,
  );
  await sql(`INSERT INTO revisions (id, part_id, label, position, how_to_tell, what_changed)
    SELECT p.seq * 10 + r.seq, p.seq, CONCAT('Rev ', r.seq), r.seq, '', '' FROM seq_1_to_${parts} p, seq_1_to_${revisionsEach} r`);
  await sql(`INSERT INTO features (id, part_id, slug, name, kind, process)
    SELECT p.seq * 2 + k.seq, p.seq, IF(k.seq = 1, 'boss', 'recess'), IF(k.seq = 1, 'boss', 'recess'), IF(k.seq = 1, 'boss', 'recess'), 'printed' FROM seq_1_to_${parts} p, seq_1_to_2 k`);
  await sql(`INSERT INTO joints (slug, name, kind, feature_a, feature_b)
    SELECT CONCAT('joint-', seq), CONCAT('Joint ', seq), 'boss-recess', seq * 2 + 1, (seq % ${parts} + 1) * 2 + 2 FROM seq_1_to_${parts}`);
  const places = parts * 2 * 2 * revisionsEach;
  await sql(`INSERT INTO measurements (feature_id, revision_id, dimension, value, uncertainty, entered, unit, instrument, account_id, created_at)
    SELECT p.seq * 2 + k.seq, p.seq * 10 + r.seq, IF(d.seq = 1, 'diameter', IF(k.seq = 1, 'height', 'depth')), IF(d.seq = 1, 20, 2) + (n.seq % 11) / 100, 0.017, '[20]', 'mm', 'caliper', 1, NOW()
    FROM seq_1_to_${Math.round(readings / places)} n, seq_1_to_${parts} p, seq_1_to_${revisionsEach} r, seq_1_to_2 k, seq_1_to_2 d`);
  await sql(`INSERT INTO consensus (feature_id, revision_id, dimension, count, mean, uncertainty, prediction_spread, thin, unit_slips)
    SELECT feature_id, revision_id, dimension, COUNT(*), AVG(value), 0.01, 0.05, 0, 0 FROM measurements GROUP BY feature_id, revision_id, dimension`);
  await sql('ANALYZE TABLE measurements, consensus');
}

interface Pages {
  readonly part: () => Promise<unknown>;
  readonly joint: () => Promise<unknown>;
  readonly dimension: () => Promise<unknown>;
}

function pagesOn(knex: Knex): Pages {
  const deskInbox = createDeskInbox({ clock });
  const measurements = createMeasurements({
    knex,
    clock,
    hardware: createHardware({ knex }).service,
    limits: noRateLimits,
    audit: createAuditLog({ clock }),
    happenings: createHappenings({ clock }),
    deskInbox,
  });
  const nobody = { cautionsOfMany: () => Promise.resolve([]) } as unknown as WriteUpService;
  const joints = createJoints({
    knex,
    clock,
    measurements: measurements.service,
    writeUps: nobody,
    happenings: createHappenings({ clock }),
    deskInbox,
  });
  let turn = 0;
  const next = (): number => (turn = (turn % parts) + 1);
  return {
    part: () => measurements.service.partMeasurements(`part-${next()}`),
    joint: () => joints.service.page(`joint-${next()}`),
    dimension: () => measurements.service.dimensionReadings(`part-${next()}`, 'boss', 'diameter'),
  };
}

async function median(ask: () => Promise<unknown>, times: number[]): Promise<void> {
  const start = performance.now();
  await ask();
  times.push(performance.now() - start);
}

const middle = (times: number[]): number =>
  [...times].sort((one, other) => one - other)[Math.floor(times.length / 2)]!;

const dataDir = await makeDataFolder();
const server = await startMariaDb({ dataDir, port: await freePort() });
try {
  const open = async (schema: string, readings: number): Promise<{ knex: Knex; pages: Pages }> => {
    const root = openDatabase(server.url);
    await root.raw('CREATE DATABASE ??', [schema]);
    await root.destroy();
    const address = new URL(server.url);
    address.pathname = `/${schema}`;
    const knex = openDatabase(address.href);
    await migrateToLatest(knex);
    await fill(knex, readings);
    return { knex, pages: pagesOn(knex) };
  };
  const few = await open('shimlore_few', 10_000);
  const many = await open('shimlore_many', 1_000_000);
  for (const name of ['part', 'joint', 'dimension'] as const) {
    const [withFew, withMany]: [number[], number[]] = [[], []];
    for (let round = 0; round < rounds; round += 1) {
      await median(few.pages[name], withFew);
      await median(many.pages[name], withMany);
    }
    console.log(
      `${name}: with 1,000,000 measurements ${(middle(withMany) / middle(withFew)).toFixed(2)} times as long as with 10,000`,
    );
  }
  await Promise.all([few.knex.destroy(), many.knex.destroy()]);
} finally {
  await server.stop();
  await rm(dataDir, { recursive: true, force: true });
}
