import type { Knex } from 'knex';

export interface MakerRow {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
  readonly about: string;
  readonly mailDomain: string | null;
  readonly contactAddress: string | null;
}

const columns = {
  id: 'id',
  slug: 'slug',
  name: 'name',
  about: 'about',
  mailDomain: 'mail_domain',
  contactAddress: 'contact_address',
};

/** Makers with their addresses, and who speaks for them. */
export const makerStore = {
  async bySlug(db: Knex, slug: string): Promise<MakerRow | undefined> {
    return db('makers').where({ slug }).first(columns);
  },

  async byIds(db: Knex, ids: readonly number[]): Promise<MakerRow[]> {
    return db('makers').whereIn('id', ids).orderBy(['name', 'id']).select(columns);
  },

  /** The maker, held until the transaction ends: who speaks for it changes one at a time. */
  async hold(trx: Knex, id: number): Promise<MakerRow | undefined> {
    return trx('makers').where({ id }).forUpdate().first(columns);
  },

  async setAddresses(
    trx: Knex,
    id: number,
    addresses: { mailDomain: string | null; contactAddress: string | null },
  ): Promise<void> {
    await trx('makers')
      .where({ id })
      .update({ mail_domain: addresses.mailDomain, contact_address: addresses.contactAddress });
  },

  async speakers(db: Knex, makerId: number): Promise<{ id: number; displayName: string; since: Date }[]> {
    return db('maker_members as m')
      .join('accounts as a', 'a.id', 'm.account_id')
      .where('m.maker_id', makerId)
      .orderBy(['m.since', 'a.id'])
      .select('a.id', 'm.since', { displayName: 'a.display_name' });
  },

  async speaks(db: Knex, accountId: number, makerId: number): Promise<boolean> {
    const where = { account_id: accountId, maker_id: makerId };
    return (await db('maker_members').where(where).first('account_id')) !== undefined;
  },

  /** Makers that an account speaks for. */
  async spokenFor(db: Knex, accountId: number): Promise<number[]> {
    return db('maker_members').where({ account_id: accountId }).pluck('maker_id');
  },

  async addSpeaker(trx: Knex, accountId: number, makerId: number, since: Date): Promise<void> {
    await trx('maker_members').insert({ account_id: accountId, maker_id: makerId, since });
  },

  /** Whether they spoke for it. */
  async removeSpeaker(trx: Knex, accountId: number, makerId: number): Promise<boolean> {
    return (await trx('maker_members').where({ account_id: accountId, maker_id: makerId }).delete()) > 0;
  },
};
