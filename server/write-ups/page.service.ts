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
import { NoSuchWriteUp } from './edition-problems.js';
import type { EditionViews } from './edition-view.js';
import type { PublishedEditionRow, PublishedStore, WriteUpRow } from './published.store.js';
import type { TrialStore } from './trial.store.js';
import type { Knex } from 'knex';

export interface PageParts {
  readonly knex: Knex;
  readonly published: PublishedStore;
  readonly drafts: DraftStore;
  readonly trials: TrialStore;
  readonly views: EditionViews;
  readonly comparer: EditionComparer;
}

export type PageService = ReturnType<typeof createPageService>;

/** What everybody can read: published editions, as they are and as they were. */
export function createPageService({ knex, published, drafts, trials, views, comparer }: PageParts) {
  return {
    async readWriteUp(caller: Caller, slug: string): Promise<WriteUpPage> {
      const writeUp = await published.withContent(slug);
      if (!writeUp) throw new NoSuchWriteUp();
      const [editions, view, reported, myDraftId] = await Promise.all([
        published.editionsOf(writeUp.id),
        views.viewOf(writeUp.content, writeUp.id),
        trials.trialsOf(writeUp.id),
        caller.accountId === null ? undefined : drafts.openEditionOf(knex, writeUp.id, caller.accountId),
      ]);
      const authors = peopleOf(editions);
      return {
        id: writeUp.id,
        slug: writeUp.slug,
        edition: lineOf(editions.find((edition) => edition.id === writeUp.publishedEditionId)),
        editionCount: editions.length,
        firstPublishedAt: writeUp.firstPublishedAt.toISOString(),
        authors,
        view,
        trials: reported,
        mayEdit: isModerator(caller) || authors.some((author) => author.id === caller.accountId),
        myDraftId: myDraftId ?? null,
      };
    },

    async listEditions(slug: string): Promise<EditionLine[]> {
      return (await published.editionsOf((await find(slug)).id)).map(lineOf);
    },

    async readEdition(
      slug: string,
      number: number,
    ): Promise<{ slug: string; edition: EditionLine; latestNumber: number; view: EditionView }> {
      const writeUp = await find(slug);
      const editions = await published.editionsOf(writeUp.id);
      const edition = editionNumbered(editions, number);
      return {
        slug,
        edition: lineOf(edition),
        latestNumber: lineOf(editions.find((each) => each.id === writeUp.publishedEditionId)).number,
        view: await views.viewOf(await contentOf(edition.id), writeUp.id),
      };
    },

    async compareEditions(slug: string, numbers: { from: number; to: number }): Promise<EditionComparison> {
      const editions = await published.editionsOf((await find(slug)).id);
      const from = editionNumbered(editions, numbers.from);
      const to = editionNumbered(editions, numbers.to);
      const contents = await published.contents([from.id, to.id]);
      return comparer.compare(
        { line: lineOf(from), content: textIn(contents, from.id) },
        { line: lineOf(to), content: textIn(contents, to.id) },
      );
    },
  };

  async function find(slug: string): Promise<WriteUpRow> {
    const writeUp = await published.bySlug(slug);
    if (!writeUp) throw new NoSuchWriteUp();
    return writeUp;
  }

  async function contentOf(editionId: number): Promise<EditionContent> {
    return textIn(await published.contents([editionId]), editionId);
  }
}

function textIn(contents: ReadonlyMap<number, EditionContent>, editionId: number): EditionContent {
  const content = contents.get(editionId);
  if (!content) throw new Error(`Edition ${editionId} is listed as published but has no text.`);
  return content;
}

function editionNumbered(editions: readonly PublishedEditionRow[], number: number): PublishedEditionRow {
  const edition = editions.find((each) => each.number === number);
  if (!edition)
    throw new NotFound(`There is no published edition ${number}.`, 'Choose one from the list of editions.');
  return edition;
}

/** Everybody who wrote one of the editions, the first author first. */
function peopleOf(editionsNewestFirst: readonly PublishedEditionRow[]): PersonRef[] {
  const people = new Map<number, PersonRef>();
  for (const { authorId, authorName } of [...editionsNewestFirst].reverse()) {
    people.set(authorId, { id: authorId, displayName: authorName });
  }
  return [...people.values()];
}

function lineOf(edition: PublishedEditionRow | undefined): EditionLine {
  if (!edition) throw new Error('The edition that a write-up shows is not among its published ones.');
  return {
    id: edition.id,
    number: edition.number,
    author: { id: edition.authorId, displayName: edition.authorName },
    changeNote: edition.changeNote,
    publishedAt: edition.publishedAt.toISOString(),
    title: edition.title,
  };
}
