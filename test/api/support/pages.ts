import type { Agent } from './app.js';

interface Page<Item> {
  readonly items: Item[];
  readonly next: string | null;
}

/** Follows `next` to the end of a list, one item a page; throws where it does not end within a hundred pages. */
export async function throughAllPages<Item>(agent: Agent, path: string, query: object = {}): Promise<Item[]> {
  const items: Item[] = [];
  let cursor: string | undefined;
  for (let pages = 0; pages < 100; pages += 1) {
    const answer = await agent
      .get(path)
      .query({ ...query, limit: 1, ...(cursor ? { cursor } : {}) })
      .expect(200);
    const page: Page<Item> = answer.body;
    items.push(...page.items);
    if (page.next === null) return items;
    cursor = page.next;
  }
  throw new Error(`The list at ${path} does not end.`);
}
