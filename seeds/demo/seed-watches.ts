import type { Knex } from 'knex';
import { insertRows, idsFrom } from './ids.js';
import { type Catalogue, known } from './seed-catalogue.js';

const day = 86_400_000;

interface Told {
  readonly kind: string;
  readonly title: string;
  readonly text: string;
  readonly path: string;
  readonly daysAgo: number;
  /** What the owner is told of it for: a part they watch or have, or the fix they tried. */
  readonly because: 'watch' | 'bench' | 'person';
  readonly part: string | null;
  readonly safety?: boolean;
  readonly read: boolean;
}

/** What the owner was told, the oldest first. */
const told: readonly Told[] = [
  {
    kind: 'edition-published',
    title: 'Edition 4: Belt bracket: the lip does not enter the M1 recess',
    text: 'Says for which revisions the disc is thick enough.',
    path: '/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess',
    daysAgo: 9,
    because: 'bench',
    part: 'stonebridge-belt-bracket',
    read: true,
  },
  ...[1, 2, 3].map((count): Told => ({
    kind: 'reading-recorded',
    title: 'Reading: depth of Recess on M1',
    text: '',
    path: '/parts/tarn-m1',
    daysAgo: 4 - count * 0.01,
    because: 'watch',
    part: 'tarn-m1',
    read: true,
  })),
  {
    kind: 'trial-reported',
    title: 'Trial of a fix on the belt bracket: held',
    text: 'Sits flat since the disc is in; nothing rocks.',
    path: '/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess',
    daysAgo: 2,
    because: 'bench',
    part: 'stonebridge-belt-bracket',
    read: false,
  },
  {
    kind: 'caution-changed',
    title: 'WARNING: rotary tool near optics',
    text: 'Swarf in the focuser scratches glass. Take the optics out before you trim, and clean every thread after it.',
    path: '/write-ups/belt-bracket-lip-does-not-enter-the-m1-recess',
    daysAgo: 1,
    because: 'person',
    part: null,
    safety: true,
    read: false,
  },
  {
    kind: 'revision-added',
    title: 'In the catalogue: a revision of the Wren 60',
    text: 'The collar is 0.2 mm lower than before.',
    path: '/parts/larkfield-wren-60',
    daysAgo: 0.3,
    because: 'watch',
    part: 'larkfield-wren-60',
    read: false,
  },
];

/** Inserts what owner and author watch, and what the owner was told, some of it read. */
export async function seedWatches(
  trx: Knex,
  parts: { accounts: ReadonlyMap<string, number>; catalogue: Catalogue; now: Date },
): Promise<void> {
  const { accounts, catalogue, now } = parts;
  const owner = known(accounts, 'owner');
  const ago = (days: number): Date => new Date(now.getTime() - days * day);
  await trx('accounts').where({ id: owner }).update({ bench_watch: true, mail_rhythm: 'daily' });
  const watch = (account: string, subject: string, id: number, days: number) => ({
    account_id: known(accounts, account),
    subject,
    subject_id: id,
    created_at: ago(days),
  });
  const writeUp: { id: number } | undefined = await trx('write_ups')
    .where({ slug: 'belt-bracket-lip-does-not-enter-the-m1-recess' })
    .first('id');
  await insertRows(trx, 'watches', [
    watch('owner', 'part', known(catalogue.parts, 'tarn-m1'), 210),
    watch('owner', 'part', known(catalogue.parts, 'larkfield-wren-60'), 180),
    watch('owner', 'revision', known(catalogue.revisions, 'stonebridge-belt-bracket:B'), 90),
    watch('author', 'part', known(catalogue.parts, 'stonebridge-belt-bracket'), 300),
    ...(writeUp ? [watch('owner', 'write-up', writeUp.id, 60)] : []),
  ]);
  const nextId = await idsFrom(trx, 'happenings');
  const rows = told.map((one) => ({ id: nextId(), one }));
  await insertRows(
    trx,
    'happenings',
    rows.map(({ id, one }) => ({
      id,
      kind: one.kind,
      event_key: `demo:${id}`,
      title: one.title,
      text: one.text,
      path: one.path,
      at: ago(one.daysAgo),
      told_at: ago(one.daysAgo),
    })),
  );
  await insertRows(
    trx,
    'notices',
    rows.map(({ id, one }) => ({
      happening_id: id,
      account_id: owner,
      at: ago(one.daysAgo),
      at_once: one.safety ?? false,
      because: one.because,
      subject: one.part === null ? null : 'part',
      subject_id: one.part === null ? null : known(catalogue.parts, one.part),
      // What the demo tells of is past; no mail of it goes out now.
      mail: 'none',
      read_at: one.read ? ago(one.daysAgo - 0.2) : null,
    })),
  );
}
