import type { Knex } from 'knex';
import type { MemberAgent, TestApp } from './app.js';
import type { TestPart } from './catalogue.js';

/** Identity and slug of the maker of a test part. */
export async function makerOf(
  knex: Knex,
  part: TestPart,
): Promise<{ id: number; slug: string; name: string }> {
  return knex('makers').where({ slug: part.makerSlug }).first('id', 'slug', 'name');
}

/** The maker's mail domain and the address that letters go to. */
export async function giveAddresses(
  knex: Knex,
  part: TestPart,
  addresses: { mailDomain?: string | null; contactAddress?: string | null },
): Promise<void> {
  await knex('makers')
    .where({ slug: part.makerSlug })
    .update({
      mail_domain: addresses.mailDomain ?? null,
      contact_address: addresses.contactAddress ?? null,
    });
}

/** A new account of role maker, signed in, that speaks for the part's maker. */
export async function speakerFor(app: TestApp, part: TestPart): Promise<MemberAgent> {
  const agent = await app.as('maker');
  const { id } = await makerOf(app.knex, part);
  await app.knex('maker_members').insert({ account_id: agent.account.id, maker_id: id, since: new Date() });
  return agent;
}

/** What the audit log says, the oldest first. */
export async function auditActions(knex: Knex): Promise<string[]> {
  return knex('audit_log').orderBy('id').pluck('action');
}
