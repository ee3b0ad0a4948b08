import type { Knex } from 'knex';
import type { Happening } from './happenings.js';

const longestTitle = 200;

/** Adds it unless one of that key is there. */
export async function addHappening(trx: Knex, happening: Happening, at: Date): Promise<void> {
  const known: { id: number } | undefined = await trx('happenings')
    .where({ event_key: happening.key })
    .first('id');
  if (known) return;
  const [id] = await trx('happenings').insert({
    kind: happening.kind,
    event_key: happening.key,
    title: oneLine(happening.title),
    text: happening.text ?? '',
    path: happening.path,
    actor_id: happening.actorId,
    at,
  });
  const subjects = subjectsOf(happening.about).map((subject) => ({ happening_id: id, ...subject }));
  if (subjects.length > 0) await trx('happening_subjects').insert(subjects);
  const people = new Map<number, boolean>();
  for (const { accountId, atOnce } of happening.people ?? [])
    people.set(accountId, atOnce || (people.get(accountId) ?? false));
  if (people.size > 0) {
    await trx('happening_people').insert(
      [...people].map(([account, atOnce]) => ({ happening_id: id, account_id: account, at_once: atOnce })),
    );
  }
}

function oneLine(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.length <= longestTitle ? line : `${line.slice(0, longestTitle - 1)}…`;
}

function subjectsOf(about: Happening['about']): { subject: string; subject_id: number }[] {
  const named = [
    ['part', about.parts],
    ['revision', about.revisions],
    ['joint', about.joints],
    ['write-up', about.writeUps],
    ['question', about.questions],
  ] as const;
  return named.flatMap(([subject, ids = []]) => [...new Set(ids)].map((id) => ({ subject, subject_id: id })));
}
