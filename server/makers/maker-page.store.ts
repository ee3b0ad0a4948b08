import type { Knex } from 'knex';
import type { MakerPage } from '../../shared/contract/makers.js';
import { toRevisionRef } from '../revision-ref.js';

/** Read model of the maker's page: what it answered and what it made right. */
export const makerPageStore = {
  /** On write-ups that are published, the latest first. */
  async answers(db: Knex, makerId: number): Promise<{ slug: string; title: string; changedAt: Date }[]> {
    return db('maker_answers as n')
      .join('write_ups as w', 'w.id', 'n.write_up_id')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .where('n.maker_id', makerId)
      .whereNull('n.taken_back_at')
      .orderBy('n.changed_at', 'desc')
      .select('w.slug', 'e.title', { changedAt: 'n.changed_at' });
  },

  async madeRight(db: Knex, makerId: number): Promise<MakerPage['madeRight']> {
    const rows: {
      slug: string;
      title: string;
      id: number;
      partId: number;
      label: string;
      partName: string;
    }[] = await db('fixes as f')
      .join('revisions as r', 'r.id', 'f.made_right_from')
      .join('parts as p', 'p.id', 'r.part_id')
      .join('write_ups as w', 'w.id', 'f.write_up_id')
      .join('editions as e', 'e.id', 'w.published_edition_id')
      .where('p.maker_id', makerId)
      .distinct('w.slug', 'e.title', 'r.id', 'r.label', { partId: 'r.part_id', partName: 'p.name' })
      .orderBy('e.title');
    return rows.map(({ slug, title, ...from }) => ({ slug, title, from }));
  },

  async partIds(db: Knex, makerId: number): Promise<number[]> {
    return db('parts').where('maker_id', makerId).orderBy(['name', 'id']).pluck('id');
  },

  async announced(db: Knex, makerId: number): Promise<MakerPage['announced']> {
    const rows: {
      slug: string;
      name: string;
      id: number;
      partId: number;
      label: string;
      soldFrom: string | null;
      whatChanges: string;
    }[] = await db('revisions as r')
      .join('parts as p', 'p.id', 'r.part_id')
      .where({ 'p.maker_id': makerId, 'r.state': 'announced' })
      .orderBy(['p.name', 'r.position'])
      .select('p.slug', 'p.name', 'r.id', 'r.label', {
        partId: 'p.id',
        soldFrom: 'r.sold_from',
        whatChanges: 'r.what_changed',
      });
    return rows.map(({ slug, name, id, partId, label, ...rest }) => ({
      part: { slug, name },
      revision: toRevisionRef({ id, partId, label, state: 'announced' }),
      ...rest,
    }));
  },
};
