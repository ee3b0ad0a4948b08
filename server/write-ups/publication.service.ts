import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { NotFound } from '../http/problems.js';
import type { DraftStore, EditionRow } from './draft.store.js';
import { editionLinks } from './edition-links.js';
import { wrongState } from './edition-problems.js';
import type { FixStore } from './fix.store.js';
import { publicationStore } from './publication.store.js';
import { freeSlug, slugFrom } from './slug.js';
import type { TrialService } from './trial.service.js';

export interface PublicationParts {
  readonly drafts: DraftStore;
  readonly fixes: FixStore;
  readonly judgeStandings: TrialService['judgeStandings'];
}

/** An edition held fast by the transaction, with what is published while it is held. */
export interface HeldEdition {
  readonly edition: EditionRow;
  readonly publishedEditionId: number | null;
}

/** How an edition becomes the published one. Everything runs in the transaction of the desk's command. */
export function createPublicationService({ drafts, fixes, judgeStandings }: PublicationParts) {
  return {
    /** Holds write-up and edition, in that order; WrongState unless the edition waits on the desk. */
    async holdSubmitted(trx: Knex, writeUpId: number, editionId: number): Promise<HeldEdition> {
      const writeUp = await publicationStore.lockWriteUp(trx, writeUpId);
      const edition = await drafts.lockEdition(trx, editionId);
      if (!writeUp || !edition) throw new NotFound();
      if (edition.state !== 'submitted') throw wrongState(edition, 'an edition on the desk');
      return { edition, publishedEditionId: writeUp.publishedEditionId };
    },

    /** Holds a write-up, so that its cautions and what is published cannot change in the meantime. */
    async holdWriteUp(trx: Knex, writeUpId: number): Promise<void> {
      await publicationStore.lockWriteUp(trx, writeUpId);
    },

    /** Sees to it that the fix is there for a caution to stand on, before its first edition is published. */
    async fixIdOf(trx: Knex, writeUpId: number, fixKey: string): Promise<number> {
      return (await fixes.addMissing(trx, writeUpId, [fixKey])).get(fixKey)!;
    },

    /** Makes a held edition the published one. A first edition gets the write-up its slug, from the title. */
    async publishHeld(
      trx: Knex,
      { edition }: HeldEdition,
      at: Date,
    ): Promise<{ slug: string; number: number }> {
      const { id, writeUpId, content } = edition;
      const slug = edition.slug ?? (await giveSlug(trx, writeUpId, content.title));
      const number = await publicationStore.giveNumber(trx, writeUpId, id);
      await writeLinks(trx, writeUpId, id, content);
      await publicationStore.markPublished(trx, writeUpId, id, at);
      await judgeStandings(trx, writeUpId, content);
      return { slug, number };
    },
  };

  async function writeLinks(
    trx: Knex,
    writeUpId: number,
    editionId: number,
    content: EditionContent,
  ): Promise<void> {
    const links = editionLinks(content);
    const fixIds = await fixes.addMissing(
      trx,
      writeUpId,
      links.fixes.map((fix) => fix.key),
    );
    await publicationStore.writeLinks(trx, editionId, links, fixIds);
  }

  async function giveSlug(trx: Knex, writeUpId: number, title: string): Promise<string> {
    const base = slugFrom(title);
    const taken = await publicationStore.slugsLike(trx, base);
    for (;;) {
      const slug = freeSlug(base, taken);
      if (await publicationStore.giveSlug(trx, writeUpId, slug)) return slug;
      // Given away by another transaction since the list was read.
      taken.add(slug);
    }
  }
}
