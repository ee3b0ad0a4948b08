import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Draft } from '../../shared/contract/write-ups.js';
import type { MemberAgent } from '../api/support/agents.js';
import {
  completeContent,
  insertJoint,
  saveNewDraft,
  submitDraft,
  type TestJoint,
} from '../api/support/write-ups.js';
import { startSite, until, type Site } from './support/site.js';

let site: Site;
let moderator: MemberAgent;
let joint: TestJoint;

beforeAll(async () => {
  site = await startSite();
  moderator = await site.member('moderator', 'Moderator');
  joint = await insertJoint(site.knex);
});
afterAll(() => site.stop());

const publish = (id: number) =>
  moderator
    .post(`/api/desk/editions/${id}/publish`)
    .send({ note: '' })
    .then(
      ({ status }) => status,
      () => null,
    );

/** What of publishing an edition the database holds; all of it or nothing. */
async function tracesOf(id: number): Promise<Record<string, number>> {
  const { knex } = site;
  const count = async (query: PromiseLike<unknown[]>): Promise<number> => (await query).length;
  return {
    published: await count(knex('editions').where({ id, state: 'published' }).select('id')),
    current: await count(knex('write_ups').where({ published_edition_id: id }).select('id')),
    links: Math.min(1, await count(knex('edition_sides').where({ edition_id: id }).select('part_id'))),
    audit: await count(knex('audit_log').where({ action: 'edition-published', subject_id: id }).select('id')),
    happening: await count(
      knex('happenings')
        .where({ event_key: `edition-published:${id}` })
        .select('id'),
    ),
    mail: await count(
      knex('mail_outbox').where('dedupe_key', 'like', `edition-published:${id}:%`).select('id'),
    ),
  };
}

const nothing = { published: 0, current: 0, links: 0, audit: 0, happening: 0, mail: 0 };
const all = { published: 1, current: 1, links: 1, audit: 1, happening: 1, mail: 1 };

describe('editions that are being published', () => {
  it.each(['server', 'database'] as const)(
    'are published whole or not at all when the %s is killed, and each author hears of it once',
    async (what) => {
      const author = await site.member('member', `Author before the ${what} fell`);
      const word = what === 'server' ? 'sprocket' : 'gasket';
      const waiting: Draft[] = [];
      for (let number = 1; number <= 8; number += 1) {
        const content = completeContent(joint, { title: `The ${word} rocks, case ${number}` });
        waiting.push(await submitDraft(author, await saveNewDraft(author, content)));
      }

      const acknowledged: number[] = [];
      let fell: Promise<void> | undefined;
      for (const { id } of waiting) {
        const answer = publish(id);
        // In the middle of the fourth.
        if (acknowledged.length === 3) fell = what === 'server' ? site.killServer() : site.killDatabase();
        if ((await answer) !== 200) break;
        acknowledged.push(id);
        if (fell) break;
      }
      await fell;
      if (what === 'server') await site.startServer();
      else await site.startDatabase();

      expect(acknowledged.length).toBeGreaterThanOrEqual(3);
      for (const { id } of waiting) {
        const traces = await until(
          () => tracesOf(id).catch(() => null),
          (found) => found !== null,
        );
        expect([nothing, all]).toContainEqual(traces);
        if (acknowledged.includes(id)) expect(traces).toEqual(all);
      }

      for (const { id } of waiting)
        if ((await tracesOf(id))['published'] === 0) expect(await publish(id)).toBe(200);
      for (const { id } of waiting) expect(await tracesOf(id)).toEqual(all);
      await leaseIsOver();
      const mails = await until(
        () => site.mailbox.list(author.account.email),
        (found) => found.length >= waiting.length,
      );
      expect(mails.map(({ subject }) => subject).sort()).toEqual(
        waiting.map(({ content }) => `Published: ${content.title}`).sort(),
      );
      const found = await until(
        async () =>
          (await moderator.get('/api/search').query({ q: word, limit: 20 })).body.items?.length ?? 0,
        (count) => count >= waiting.length,
      );
      expect(found).toBe(waiting.length);
    },
  );
});

/** A killed worker's pieces of work are due again when its lease is over; nobody waits for that here. */
async function leaseIsOver(): Promise<void> {
  await site.knex('mail_outbox').whereNull('sent_at').update({ next_try_at: new Date() });
}
