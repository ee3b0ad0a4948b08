import { randomUUID } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import type { Knex } from 'knex';
import type {
  LibraryChange,
  LibraryEntry,
  LibraryUse,
  LibraryVersion,
  LibraryWords,
} from '../../shared/contract/caution-library.js';
import type { FieldDifference } from '../../shared/contract/write-ups.js';
import { cautionDifference } from '../../shared/text/caution-difference.js';
import type { AuditLog } from '../audit/audit.js';
import { FieldNotValid, NotFound, ProblemError } from '../http/problems.js';
import type { CautionService } from '../moderation/caution.service.js';
import { slugFrom } from '../write-ups/slug.js';
import { usesOf, type UseRow } from './library-use.store.js';
import { libraryStore as store, type EntryWords, type VersionRow } from './library.store.js';

/** The library was changed since the caller read it; carries it as it stands now. */
export class LibraryMovedOn extends ProblemError {
  constructor(current: unknown, status: 409 | 412 = 412) {
    super(
      'moved-on',
      status,
      'Somebody else at the desk changed the library since you read it.',
      'Look at what stands there now, then save yours on top of it.',
      { current },
    );
  }
}

export interface LibraryParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly audit: AuditLog;
  readonly cautions: Pick<CautionService, 'rewordWithin'>;
}

export type LibraryService = ReturnType<typeof createLibraryService>;

/** The library of cautions is kept by the moderators: every change is kept with who, when and why. */
export function createLibraryService({ knex, clock, audit, cautions }: LibraryParts) {
  return {
    readLibrary: (): Promise<LibraryEntry[]> => store.entries(knex),
    readEntry,

    async addEntry(moderatorId: number, { why, ...words }: LibraryWords): Promise<LibraryEntry> {
      const id = await knex.transaction(async (trx) => {
        // The slug names an entry to programs; it is no address, so that it need not be a handsome one.
        const added = await store.add(trx, `${slugFrom(words.name)}-${randomUUID().slice(0, 8)}`, words);
        await keep(trx, added, { version: 1, change: 'added', words, by: moderatorId, why });
        return added;
      });
      return readEntry(id);
    },

    changeEntry: (moderatorId: number, id: number, version: number, { why, ...words }: LibraryWords) =>
      change(moderatorId, id, version, 'worded', why, () => ({ words })),

    retireEntry: (moderatorId: number, id: number, version: number, why: string) =>
      change(moderatorId, id, version, 'retired', why, (entry) => {
        if (entry.retired) throw new LibraryMovedOn(entry);
        return { words: wordsOf(entry), retiredAt: clock() };
      }),

    putBackEntry: (moderatorId: number, id: number, version: number, why: string) =>
      change(moderatorId, id, version, 'put-back', why, (entry) => {
        if (!entry.retired) throw new LibraryMovedOn(entry);
        return { words: wordsOf(entry), retiredAt: null };
      }),

    /** LibraryMovedOn where the entries named are not all those there are. */
    async order(moderatorId: number, ids: readonly number[]): Promise<LibraryEntry[]> {
      await knex.transaction(async (trx) => {
        const there = await store.holdOrder(trx);
        const named = new Set(ids);
        if (named.size !== ids.length || there.length !== ids.length || there.some((id) => !named.has(id)))
          throw new LibraryMovedOn(await store.entries(trx), 409);
        if (isDeepStrictEqual(there, ids)) return;
        await store.setOrder(trx, ids);
        await audit.note(trx, {
          actorId: moderatorId,
          action: 'library-reordered',
          subject: { kind: 'library-caution', id: ids[0]!, name: 'The whole library' },
          details: { order: [...ids] },
        });
      });
      return store.entries(knex);
    },

    async listVersions(id: number): Promise<LibraryVersion[]> {
      await readEntry(id);
      return (await store.versions(knex, id)).map(lineOf);
    },

    async compareVersions(
      id: number,
      { from, to }: { from: number; to: number },
    ): Promise<{ from: LibraryVersion; to: LibraryVersion; changed: FieldDifference[] }> {
      await readEntry(id);
      const versions = await store.versions(knex, id);
      const [earlier, later] = [versionOf(versions, from), versionOf(versions, to)];
      return {
        from: lineOf(earlier),
        to: lineOf(later),
        changed: cautionDifference(earlier.words, later.words),
      };
    },

    async listUses(id: number): Promise<LibraryUse[]> {
      const entry = await readEntry(id);
      return (await usesOf(knex, id)).map((use) => useView(use, entry));
    },

    /** All chosen cautions are worded anew or none; CautionMissing where one would leave a hazard without a caution. */
    async applyEntry(
      moderatorId: number,
      id: number,
      version: number,
      cautionIds: readonly number[],
    ): Promise<LibraryUse[]> {
      await knex.transaction(async (trx) => {
        const entry = await held(trx, id, version);
        const uses = new Set((await usesOf(trx, id)).map((use) => use.cautionId));
        const stray = cautionIds.findIndex((cautionId) => !uses.has(cautionId));
        if (stray >= 0) {
          const remedy = 'Read the list of write-ups that carry it again.';
          throw new FieldNotValid(
            `cautionIds.${stray}`,
            'does not stand, or was not taken from this entry',
            remedy,
          );
        }
        const { name: _, ...words } = wordsOf(entry);
        // Each is checked, noted and told of by itself, as if it were worded anew on its page.
        for (const cautionId of [...new Set(cautionIds)].sort((a, b) => a - b))
          await cautions.rewordWithin(trx, moderatorId, cautionId, words);
      });
      return this.listUses(id);
    },
  };

  async function readEntry(id: number, db: Knex = knex): Promise<LibraryEntry> {
    const [entry] = await store.entries(db, { id });
    if (!entry) throw new NotFound('There is no such entry in the library.', 'Read the library again.');
    return entry;
  }

  async function held(trx: Knex, id: number, version: number): Promise<LibraryEntry> {
    await store.hold(trx, id);
    const entry = await readEntry(id, trx);
    if (entry.version !== version) throw new LibraryMovedOn(entry);
    return entry;
  }

  async function change(
    moderatorId: number,
    id: number,
    version: number,
    kind: LibraryChange,
    why: string,
    changed: (entry: LibraryEntry) => { words: EntryWords; retiredAt?: Date | null },
  ): Promise<LibraryEntry> {
    await knex.transaction(async (trx) => {
      const entry = await held(trx, id, version);
      const next = { ...changed(entry), version: version + 1 };
      await store.change(trx, id, next);
      await keep(trx, id, { version: next.version, change: kind, words: next.words, by: moderatorId, why });
    });
    return readEntry(id);
  }

  /** In the entry's own history, and in the log of all that is decided. */
  async function keep(
    trx: Knex,
    id: number,
    entry: { version: number; change: LibraryChange; words: EntryWords; by: number; why: string },
  ): Promise<void> {
    await store.addVersion(trx, id, { ...entry, at: clock() });
    await audit.note(trx, {
      actorId: entry.by,
      action: `library-caution-${entry.change}`,
      subject: { kind: 'library-caution', id, name: entry.words.name },
      reason: entry.why,
      details: { version: entry.version },
    });
  }
}

function wordsOf({ name, signalWord, hazards, hazard, consequence, avoidance }: LibraryEntry): EntryWords {
  return { name, signalWord, hazards, hazard, consequence, avoidance };
}

function lineOf({ words: _, ...line }: VersionRow): LibraryVersion {
  return line;
}

function versionOf(versions: readonly VersionRow[], version: number): VersionRow {
  const found = versions.find((each) => each.version === version);
  if (!found) throw new NotFound(`There is no version ${version}.`, 'Choose one from the history.');
  return found;
}

function useView(use: UseRow, entry: LibraryEntry): LibraryUse {
  const { cautionId, writeUpId, slug, title, published, words } = use;
  const fix = use.content.fixes.find((each) => each.key === use.fixKey);
  const step = fix?.steps.findIndex((each) => each.key === use.stepKey) ?? -1;
  const { name: _, ...now } = wordsOf(entry);
  return {
    cautionId,
    writeUpId,
    slug,
    title,
    published,
    fixTitle: fix?.title ?? null,
    step: step < 0 ? null : step + 1,
    asEntry: isDeepStrictEqual(words, now),
    hazard: words.hazard,
    consequence: words.consequence,
    avoidance: words.avoidance,
  };
}
