import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { PartRef } from '../../shared/contract/hardware.js';
import type { HardwareService } from '../hardware/hardware.js';
import { NotAllowed, NotFound } from '../http/problems.js';
import { partIdsOf } from '../write-ups/edition-links.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import { makerStore as makers, type MakerRow } from './maker.store.js';

/** A published write-up with the parts of its joints. */
export interface ConcernedWriteUp {
  readonly id: number;
  readonly slug: string;
  readonly content: EditionContent;
  readonly parts: ReadonlyMap<number, PartRef>;
}

export type Concerned = ReturnType<typeof createConcerned>;

/** Which write-up and which of its makers a call is about. */
export function createConcerned(around: { knex: Knex; hardware: HardwareService; writeUps: WriteUpService }) {
  const { knex, hardware, writeUps } = around;

  /** NotFound where nothing is published at the address. */
  async function writeUpAt(slug: string): Promise<ConcernedWriteUp> {
    const found = await writeUps.publishedBySlug(slug);
    if (!found) throw new NotFound('There is no write-up at this address.');
    const parts = await hardware.partsByIds(partIdsOf(found.content));
    return { id: found.id, slug: found.slug, content: found.content, parts };
  }

  return {
    writeUpAt,

    /** NotFound for a maker that made none of the parts. */
    async makerIn(slug: string, makerSlug: string): Promise<{ writeUp: ConcernedWriteUp; maker: MakerRow }> {
      const writeUp = await writeUpAt(slug);
      const part = [...writeUp.parts.values()].find(({ maker }) => maker.slug === makerSlug);
      const maker = part && (await makers.bySlug(knex, part.maker.slug));
      if (!maker) throw new NotFound('That maker made none of the parts of this write-up.');
      return { writeUp, maker };
    },

    /** NotAllowed unless the account speaks for the maker. */
    async demandSpeaker(
      db: Knex,
      accountId: number,
      maker: { id: number; name: string; slug: string },
    ): Promise<void> {
      if (await makers.speaks(db, accountId, maker.id)) return;
      throw new NotAllowed(
        `You do not speak for ${maker.name}.`,
        `Ask to on its page, /makers/${maker.slug}.`,
      );
    },
  };
}

/** The maker's own parts among those of the write-up. */
export function partsBy(writeUp: ConcernedWriteUp, makerId: number): PartRef[] {
  return [...writeUp.parts.values()].filter(({ maker }) => maker.id === makerId);
}
