import type { Knex } from 'knex';
import { demoFlags } from './desk-words.js';
import { insertRows } from './ids.js';
import { known } from './seed-catalogue.js';

const hour = 3_600_000;

interface NewestTrial {
  id: number;
  accountId: number;
  title: string;
}

/** What waits at the desk beside editions: what members told it of, first posts of two of them, and a photo with a reading. */
export async function seedDesk(
  trx: Knex,
  demo: { accounts: ReadonlyMap<string, number>; now: Date },
): Promise<void> {
  const { accounts, now } = demo;
  const ago = (hours: number): Date => new Date(now.getTime() - hours * hour);
  const trials = await newestTrials(trx);
  const [first, second, told] = [trials[0]!, trials[1]!, trials[2]!];

  await trx('accounts')
    .whereNotIn('id', [first.accountId, second.accountId])
    .update({
      known_at: trx.ref('created_at'),
    });
  await insertRows(
    trx,
    'first_posts',
    [first, second].map(({ id, accountId, title }, index) => ({
      subject_kind: 'trial',
      subject_id: id,
      title: `Trial on “${title}”`,
      account_id: accountId,
      created_at: ago(5 + index * 21),
    })),
  );
  await seedFlags(trx, told, { accounts, ago });
  await seedPhoto(trx, ago(9));
}

async function seedFlags(
  trx: Knex,
  told: NewestTrial,
  { accounts, ago }: { accounts: ReadonlyMap<string, number>; ago: (hours: number) => Date },
): Promise<void> {
  const writeUp: { id: number; title: string; authorId: number } = await trx('write_ups as w')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .orderBy('w.id')
    .first('w.id', 'e.title', { authorId: 'e.author_id' });
  const things = [
    { kind: 'trial', id: told.id, title: `Trial on “${told.title}”`, writer: told.accountId },
    { kind: 'write-up', id: writeUp.id, title: `Write-up “${writeUp.title}”`, writer: writeUp.authorId },
  ];
  for (const [index, thing] of things.entries()) {
    const flags = demoFlags[index]!;
    const [flaggedId] = await trx('flagged').insert({
      subject_kind: thing.kind,
      subject_id: thing.id,
      title: thing.title,
      writer_id: thing.writer,
      waiting_name: `${thing.kind}:${thing.id}`,
      created_at: ago(flags[0]!.hoursAgo),
    });
    await insertRows(
      trx,
      'flags',
      flags.map((flag) => ({
        flagged_id: flaggedId,
        account_id: known(accounts, flag.by),
        ground: flag.ground,
        line: flag.line,
        created_at: ago(flag.hoursAgo),
      })),
    );
  }
}

/** A photo of a member who also has a reading is shown with it. */
async function seedPhoto(trx: Knex, at: Date): Promise<void> {
  const row: { photoId: number; measurementId: number } | undefined = await trx('photos as p')
    .join('accounts as a', 'a.id', 'p.owner_id')
    .join('measurements as m', 'm.account_id', 'p.owner_id')
    .where('a.role', 'member')
    .whereNull('m.set_aside_at')
    .orderBy(['p.id', 'm.id'])
    .first({ photoId: 'p.id', measurementId: 'm.id' });
  if (!row) return;
  await trx('measurements').where({ id: row.measurementId }).update({ photo_id: row.photoId });
  await trx('photo_looks').insert({ photo_id: row.photoId, created_at: at });
}

/** Of three different people. */
async function newestTrials(trx: Knex): Promise<NewestTrial[]> {
  const rows: NewestTrial[] = await trx('trials as t')
    .join('fixes as f', 'f.id', 't.fix_id')
    .join('write_ups as w', 'w.id', 'f.write_up_id')
    .join('editions as e', 'e.id', 'w.published_edition_id')
    .join('accounts as a', 'a.id', 't.account_id')
    .where('a.role', 'member')
    .orderBy([
      { column: 't.created_at', order: 'desc' },
      { column: 't.id', order: 'desc' },
    ])
    .limit(60)
    .select('t.id', 'e.title', { accountId: 't.account_id' });
  const seen = new Set<number>();
  return rows.filter(({ accountId }) => !seen.has(accountId) && seen.add(accountId)).slice(0, 3);
}
