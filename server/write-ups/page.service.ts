import type { EditionContent } from '../../shared/contract/edition-content.js';
import type {
  EditionComparison,
  EditionLine,
  EditionView,
  PersonRef,
  WriteUpPage,
} from '../../shared/contract/write-ups.js';
import { isModerator, type Caller } from '../http/caller.js';
import { NotFound } from '../http/problems.js';
import type { EditionComparer } from './comparison.js';
import type { DraftStore } from './draft.store.js';
import { lineOf, peopleOf } from './edition-lines.js';
import type { EditionViews } from './edition-view.js';
import type { PublishedEditionRow, PublishedStore, WriteUpRow } from './published.store.js';
import type { TrialStore } from './trial.store.js';
import type { WithdrawalService } from './withdrawal.service.js';
import type { Knex } from 'knex';

export interface PageParts {
  readonly knex: Knex;
  readonly published: PublishedStore;
  readonly drafts: DraftStore;
  readonly trials: TrialStore;
  readonly views: EditionViews;
  readonly comparer: EditionComparer;
  readonly withdrawals: WithdrawalService;
}

export type PageService = ReturnType<typeof createPageService>;

/** What everybody can read: published editions, as they are and as they were. */
export function createPageService({
  knex,
  published,
  drafts,
  trials,
  views,
  comparer,
  withdrawals,
}: PageParts) {
  return {
    async readWriteUp(caller: Caller, slug: string): Promise<WriteUpPage> {
      const writeUp = await published.withContent(slug);
      if (!writeUp) throw await withdrawals.missing(caller, slug);
      const [editions, keepers, view, reported, myDraftId] = await Promise.all([
        published.editionsOf(writeUp.id),
        published.keeperIds(knex, writeUp.id),
        views.viewOf(writeUp.content, writeUp.id),
        trials.trialsOf(writeUp.id, caller),
        caller.accountId === null ? undefined : drafts.openEditionOf(knex, writeUp.id, caller.accountId),
      ]);
      const authors = peopleOf(editions);
      return {
        id: writeUp.id,
        slug: writeUp.slug,
        edition: lineOf(shownOf(editions, writeUp)),
        editionCount: editions.length,
        firstPublishedAt: writeUp.firstPublishedAt.toISOString(),
        authors,
        view,
        trials: reported,
        mayEdit: isModerator(caller) || keepers.some((id) => id === caller.accountId),
        myDraftId: myDraftId ?? null,
      };
    },

    /** Who wrote the published editions of a write-up, withdrawn or not, and how many there are. */
    async writtenBy(writeUpId: number): Promise<{ authors: PersonRef[]; editionCount: number }> {
      const editions = await published.editionsOf(writeUpId);
      return { authors: peopleOf(editions), editionCount: editions.length };
    },

    async listEditions(caller: Caller, slug: string): Promise<EditionLine[]> {
      return (await published.editionsOf((await withdrawals.withHistory(caller, slug)).id)).map(lineOf);
    },

    async readEdition(
      caller: Caller,
      slug: string,
      number: number,
    ): Promise<{ slug: string; edition: EditionLine; latestNumber: number; view: EditionView }> {
      const writeUp = await withdrawals.withHistory(caller, slug);
      const editions = await published.editionsOf(writeUp.id);
      const edition = editionNumbered(editions, number);
      return {
        slug,
        edition: lineOf(edition),
        latestNumber: shownOf(editions, writeUp).number,
        view: await views.viewOf(await contentOf(edition.id), writeUp.id),
      };
    },

    async compareEditions(
      caller: Caller,
      slug: string,
      numbers: { from: number; to: number },
    ): Promise<EditionComparison> {
      const editions = await published.editionsOf((await withdrawals.withHistory(caller, slug)).id);
      const from = editionNumbered(editions, numbers.from);
      const to = editionNumbered(editions, numbers.to);
      const contents = await published.contents([from.id, to.id]);
      return comparer.compare(
        { line: lineOf(from), content: textIn(contents, from.id) },
        { line: lineOf(to), content: textIn(contents, to.id) },
      );
    },
  };

  async function contentOf(editionId: number): Promise<EditionContent> {
    return textIn(await published.contents([editionId]), editionId);
  }
}

function textIn(contents: ReadonlyMap<number, EditionContent>, editionId: number): EditionContent {
  const content = contents.get(editionId);
  if (!content) throw new Error(`Edition ${editionId} is listed as published but has no text.`);
  return content;
}

/** The edition that a write-up shows. */
function shownOf(editions: readonly PublishedEditionRow[], writeUp: WriteUpRow): PublishedEditionRow {
  const edition = editions.find((each) => each.id === writeUp.publishedEditionId);
  if (!edition) throw new Error('The edition that a write-up shows is not among its published ones.');
  return edition;
}

function editionNumbered(editions: readonly PublishedEditionRow[], number: number): PublishedEditionRow {
  const edition = editions.find((each) => each.number === number);
  if (!edition)
    throw new NotFound(`There is no published edition ${number}.`, 'Choose one from the list of editions.');
  return edition;
}
