import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { emptyContent } from '../../shared/contract/edition-content.js';
import type { Draft } from '../../shared/contract/write-ups.js';
import type { MemberAgent } from '../api/support/agents.js';
import { pause, startSite, until, type Site } from './support/site.js';

let site: Site;
let author: MemberAgent;

beforeAll(async () => {
  site = await startSite();
  author = await site.member('member', 'Author');
});
afterAll(() => site.stop());

interface Answer {
  readonly status: number;
  readonly body: Record<string, unknown>;
}

interface Saving {
  /** Number of the last save that was answered with 200. */
  acknowledged(): number;
  /** Resolves with what came instead of 200, and with the number of the save that got it. */
  readonly refused: Promise<{ tried: number; last: Answer | null }>;
}

/** Saves one after the other, each with the next number as its title, until one is not answered with 200. */
function saveOnAndOn(draft: Draft): Saving {
  let acknowledged = 0;
  const run = async (): Promise<{ tried: number; last: Answer | null }> => {
    let { version } = draft;
    for (;;) {
      const tried = acknowledged + 1;
      const answer: Answer | null = await author
        .put(`/api/drafts/${draft.id}`)
        .set('If-Match', `"${version}"`)
        .send({
          content: { ...emptyContent, title: titleOf(tried), cause: 'x'.repeat(4000) },
          changeNote: '',
        })
        .then(
          ({ status, body }) => ({ status, body }),
          () => null,
        );
      if (answer?.status !== 200) return { tried, last: answer };
      acknowledged = tried;
      version = answer.body['version'] as number;
    }
  };
  return { acknowledged: () => acknowledged, refused: run() };
}

async function firstSaveOf(saving: Saving): Promise<void> {
  await until(
    () => Promise.resolve(saving.acknowledged()),
    (count) => count > 0,
  );
}

const titleOf = (number: number): string => `Saved ${number} times`;
const numberOf = (draft: Draft): number => Number(/\d+/.exec(draft.content.title)?.[0] ?? 0);
const read = async (id: number): Promise<Draft> => (await author.get(`/api/drafts/${id}`).expect(200)).body;

describe('a draft that is being saved', () => {
  it.each([0, 40, 150, 600])(
    'is as last acknowledged, or one save further, when the server is killed %i ms after the first save',
    async (milliseconds) => {
      const draft: Draft = (await author.post('/api/write-ups').send({}).expect(201)).body;
      const saving = saveOnAndOn(draft);
      await firstSaveOf(saving);
      await pause(milliseconds);

      await site.killServer();
      const { tried } = await saving.refused;
      await site.startServer();

      const kept = await read(draft.id);
      expect([saving.acknowledged(), tried]).toContain(numberOf(kept));
      expect(kept.content.cause).toHaveLength(4000);
      await author
        .put(`/api/drafts/${draft.id}`)
        .set('If-Match', `"${kept.version}"`)
        .send({ content: { ...kept.content, title: 'Goes on' }, changeNote: '' })
        .expect(200);
    },
  );

  it.each([0, 500])(
    'is as last acknowledged, or one save further, when the database is killed %i ms after the first save, and the server goes on by itself',
    async (milliseconds) => {
      const draft: Draft = (await author.post('/api/write-ups').send({}).expect(201)).body;
      const saving = saveOnAndOn(draft);
      await firstSaveOf(saving);
      await pause(milliseconds);

      await site.killDatabase();
      const { tried, last } = await saving.refused;
      await site.startDatabase();

      expect(last).toMatchObject({
        status: 500,
        body: { type: '/problems/internal', requestId: expect.any(String) },
      });
      expect(JSON.stringify(last?.body)).not.toMatch(/mysql|ECONN|select|update/i);
      const answer = await until(
        () => author.get(`/api/drafts/${draft.id}`),
        ({ status }) => status === 200,
      );
      expect([saving.acknowledged(), tried]).toContain(numberOf(answer.body));
      expect(site.isServerUp()).toBe(true);
    },
  );
});
