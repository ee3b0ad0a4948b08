import type { Knex } from 'knex';
import { insertRows } from './ids.js';
import { announcedRevision, makerAnswers } from './maker-words.js';
import { known, type Catalogue } from './seed-catalogue.js';

const day = 86_400_000;

/** Who speaks for Tarn Motion, what it says on write-ups and what it has announced; and somebody who asks the desk. */
export async function seedMakerWords(
  trx: Knex,
  demo: { accounts: ReadonlyMap<string, number>; catalogue: Catalogue; now: Date },
): Promise<void> {
  const { accounts, catalogue, now } = demo;
  const ago = (days: number): Date => new Date(now.getTime() - days * day);
  const makers = new Map<string, number>(
    (await trx('makers').select('id', 'slug')).map(({ id, slug }) => [slug, id]),
  );
  const speaker = known(accounts, 'maker');
  const tarn = known(makers, 'tarn-motion');
  await seedRequests(trx, {
    speaker,
    tarn,
    asker: known(accounts, 'stellan'),
    asked: known(makers, 'hollin-turning'),
    moderator: known(accounts, 'moderator'),
    ago,
  });
  await seedAnswers(trx, { speaker, maker: tarn, ago });

  const { part, label, announcedDaysAgo, soldInDays, whatChanges, howToTell } = announcedRevision;
  const partId = known(catalogue.parts, part);
  const last = await trx('revisions').where('part_id', partId).max({ at: 'position' }).first();
  await trx('revisions').insert({
    part_id: partId,
    label,
    position: Number(last?.at ?? -1) + 1,
    state: 'announced',
    announced_at: ago(announcedDaysAgo),
    sold_from: ago(-soldInDays).toISOString().slice(0, 10),
    what_changed: whatChanges,
    how_to_tell: howToTell,
  });
}

async function seedRequests(
  trx: Knex,
  people: {
    speaker: number;
    tarn: number;
    asker: number;
    asked: number;
    moderator: number;
    ago: (days: number) => Date;
  },
): Promise<void> {
  const { speaker, tarn, asker, asked, moderator, ago } = people;
  await trx('maker_members').insert({ account_id: speaker, maker_id: tarn, since: ago(640) });
  await trx('maker_requests').insert({
    account_id: speaker,
    maker_id: tarn,
    state: 'granted',
    how: 'desk',
    note: 'I own the workshop. Call the number on our labels and ask for me.',
    reason: 'Called the workshop; she answered.',
    decided_by: moderator,
    decided_at: ago(640),
    created_at: ago(642),
  });
  await trx('maker_requests').insert({
    account_id: asker,
    maker_id: asked,
    state: 'waiting',
    how: 'desk',
    note: 'I turn the spacers at Hollin Turning. Our shop has no mail of its own; the number engraved in the lid of every ring box reaches me.',
    created_at: ago(2),
  });
}

async function seedAnswers(
  trx: Knex,
  of: { speaker: number; maker: number; ago: (days: number) => Date },
): Promise<void> {
  const { speaker, maker, ago } = of;
  const writeUps = new Map<string, number>(
    (await trx('write_ups').whereIn('slug', Object.keys(makerAnswers)).select('id', 'slug')).map(
      ({ id, slug }) => [slug, id],
    ),
  );
  const answers = Object.entries(makerAnswers).map(([slug, texts]) => ({
    maker_id: maker,
    write_up_id: known(writeUps, slug),
    source: texts.at(-1)!.text,
    account_id: speaker,
    created_at: ago(texts[0]!.daysAgo),
    changed_at: ago(texts.at(-1)!.daysAgo),
  }));
  await insertRows(trx, 'maker_answers', answers);
  const ids = new Map<number, number>(
    (await trx('maker_answers').where('maker_id', maker).select('id', 'write_up_id')).map((row) => [
      row.write_up_id,
      row.id,
    ]),
  );
  await insertRows(
    trx,
    'maker_answer_texts',
    Object.entries(makerAnswers).flatMap(([slug, texts]) =>
      texts.slice(0, -1).map((text, index) => ({
        answer_id: ids.get(known(writeUps, slug)),
        source: text.text,
        account_id: speaker,
        said_from: ago(text.daysAgo),
        said_to: ago(texts[index + 1]!.daysAgo),
      })),
    ),
  );
}
