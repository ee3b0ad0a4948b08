import type { Knex } from 'knex';
import type { Photo } from '../../shared/contract/photos.js';
import type { QuestionLine, QuestionPage, Reply } from '../../shared/contract/questions.js';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { Caller } from '../http/caller.js';
import { NotFound, TakenDownByDesk } from '../http/problems.js';
import { mayReadTakenDown, takenDownOf } from '../taken-down.js';
import type { QuestionLinksStore } from './question-links.store.js';
import type { QuestionPhotosStore } from './question-photos.store.js';
import type { QuestionRow, QuestionStore } from './question.store.js';
import type { ReplyRow, ReplyStore } from './reply.store.js';

/** What questions need of photos. */
export interface QuestionPhotos {
  photosByIds(ids: readonly number[]): Promise<Map<number, Photo>>;
  ownPhotoIds(accountId: number, ids: readonly number[]): Promise<Set<number>>;
}

export type QuestionViews = ReturnType<typeof createQuestionViews>;

/** Questions and replies as they are read. */
export function createQuestionViews(around: {
  knex: Knex;
  hardware: HardwareService;
  photos: QuestionPhotos;
  renderText: (source: string) => RichText;
  store: QuestionStore;
  replies: ReplyStore;
  attached: QuestionPhotosStore;
  links: QuestionLinksStore;
}) {
  const { knex, hardware, photos, renderText, store, replies, attached, links } = around;

  /** Lines of questions with their parts; a handful of look-ups, whatever their number. */
  async function linesOf(rows: readonly QuestionRow[]): Promise<QuestionLine[]> {
    const named = await store.partsOf(rows.map((row) => row.id));
    const [parts, revisions] = await Promise.all([
      hardware.partsByIds(named.map((link) => link.partId)),
      hardware.revisionsByIds(named.flatMap(({ revisionId }) => revisionId ?? [])),
    ]);
    return rows.map((row) => ({
      slug: row.slug,
      title: row.title,
      parts: named
        .filter((link) => link.questionId === row.id)
        .map((link) => ({
          part: parts.get(link.partId)!,
          revision: link.revisionId === null ? null : (revisions.get(link.revisionId) ?? null),
        })),
      person: { id: row.accountId, displayName: row.displayName },
      createdAt: row.createdAt.toISOString(),
      replyCount: row.replyCount,
      settledBy: row.settledBy,
    }));
  }

  async function repliesOf(rows: readonly ReplyRow[], db: Knex = knex): Promise<Reply[]> {
    const named = await attached.ofReplies(
      rows.map((row) => row.id),
      db,
    );
    const found = await photos.photosByIds([...named.values()].flat());
    return rows.map((row) => ({
      id: row.id,
      text: renderText(row.text),
      worksheet: row.worksheet,
      photos: (named.get(row.id) ?? []).flatMap((id) => found.get(id) ?? []),
      person: { id: row.accountId, displayName: row.displayName },
      createdAt: row.createdAt.toISOString(),
      changedAt: row.changedAt?.toISOString() ?? null,
      writeUp: row.writeUp,
      takenDown: takenDownOf(row),
    }));
  }

  /** The question as far as the reader may see it. NotFound, or TakenDownByDesk. */
  async function existing(slug: string, db: Knex, reader: Caller): Promise<QuestionRow> {
    const row = await store.bySlug(slug, db);
    if (!row) throw new NotFound('There is no question at this address.');
    if (row.takenDownAt && !mayReadTakenDown(row.accountId, reader))
      throw new TakenDownByDesk('This question', row.takenDownReason);
    return row;
  }

  return {
    linesOf,
    repliesOf,
    existing,

    async read(slug: string, reader: Caller): Promise<QuestionPage> {
      const row = await existing(slug, knex, reader);
      const [[line], body, symptoms, replied, writeUps, named] = await Promise.all([
        linesOf([row]),
        store.bodyOf(row.id, knex),
        store.symptomsOf(row.id, knex),
        replies.repliesOf(row.id, reader).then((rows) => repliesOf(rows)),
        links.writeUpsOn(row.id),
        attached.ofQuestions([row.id]),
      ]);
      const shown = named.get(row.id) ?? [];
      const found = await photos.photosByIds(shown);
      return {
        ...line!,
        id: row.id,
        text: renderText(body.text),
        symptoms,
        readings: body.readings,
        worksheet: body.worksheet,
        photos: shown.flatMap((id) => found.get(id) ?? []),
        changedAt: body.changedAt?.toISOString() ?? null,
        writeUps,
        replies: replied,
        takenDown: takenDownOf(row),
      };
    },
  };
}
