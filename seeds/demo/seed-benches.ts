import type { Knex } from 'knex';
import { insertRows } from './ids.js';
import { demoParts } from './parts.js';
import { pick, seededNumbers, shuffled } from './random.js';
import { type Catalogue, known } from './seed-catalogue.js';

const day = 86_400_000;

/** Benches told by hand: those one signs in to. A part without a letter is one whose revision its owner does not know. */
const told: Record<string, readonly string[]> = {
  owner: [
    'larkfield-wren-60:C',
    'tarn-m1:C',
    'stonebridge-belt-bracket:B',
    'cotterpin-ring-gear-kit:C',
    'hollin-m48-spacer:B',
    'quillback-q16',
    'emberfell-strip-60:B',
  ],
  author: [
    'larkfield-wren-60:D',
    'tarn-m1:D',
    'stonebridge-belt-bracket:C',
    'thornapple-belt-kit-60:B',
    'larkfield-flattener-w1:B',
    'oxbow-ring-clamp',
  ],
  maker: ['tarn-m1:D', 'larkfield-wren-60:B'],
};

/** Inserts the benches: those above, and three to six parts for most of the others. */
export async function seedBenches(
  trx: Knex,
  parts: { accounts: ReadonlyMap<string, number>; catalogue: Catalogue; now: Date },
): Promise<void> {
  const { accounts, catalogue, now } = parts;
  const next = seededNumbers(4_540);
  const rows: object[] = [];
  const add = (account: string, item: string): void => {
    const [part = '', letter] = item.split(':');
    if (!catalogue.parts.has(part)) return;
    rows.push({
      account_id: known(accounts, account),
      part_id: known(catalogue.parts, part),
      revision_id: letter === undefined ? null : known(catalogue.revisions, item),
      created_at: new Date(now.getTime() - Math.floor(next() * 700) * day),
    });
  };
  for (const [account, items] of Object.entries(told)) items.forEach((item) => add(account, item));
  for (const account of accounts.keys()) {
    if (account in told || ['moderator', 'administrator'].includes(account) || next() < 0.15) continue;
    for (const part of shuffled(demoParts, next).slice(0, 3 + Math.floor(next() * 4))) {
      const letter = pick(part.revisions, next).label.replace('Rev ', '');
      add(account, next() < 0.15 ? part.slug : `${part.slug}:${letter}`);
    }
  }
  await insertRows(trx, 'bench_items', rows);
}
