import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import type { AddReply, Reply } from '../../shared/contract/questions.js';
import { isModerator, visitor, type MemberCaller } from '../http/caller.js';
import { AlreadyThere, NotAllowed, NotFound, NotValid, TakenDownByDesk } from '../http/problems.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { foreignPhotos } from './foreign-photos.js';
import type { QuestionPhotosStore } from './question-photos.store.js';
import type { QuestionPhotos, QuestionViews } from './question-view.js';
import type { QuestionStore } from './question.store.js';
import { draftContent } from './reply-draft.js';
import type { ReplyRow, ReplyStore } from './reply.store.js';

/** What replies need of write-ups: to start one, and to find the caller's draft of it again. */
export interface DraftStarter {
  startDraftWithin(
    trx: Knex,
    authorId: number,
    content: EditionContent,
  ): Promise<{ writeUpId: number; draftId: number }>;
  openDraftOf(db: Knex, writeUpId: number, authorId: number): Promise<number | undefined>;
}

export type ReplyService = ReturnType<typeof createReplyService>;

export function createReplyService(around: {
  knex: Knex;
  clock: () => Date;
  writeUps: DraftStarter;
  photos: QuestionPhotos;
  store: QuestionStore;
  replies: ReplyStore;
  attached: QuestionPhotosStore;
  views: QuestionViews;
  deskInbox: DeskInbox;
  happenings: Happenings;
  plainText: (markdown: string) => string;
  newKey: () => string;
}) {
  const { knex, clock, writeUps, photos, store, replies, attached, views, deskInbox, happenings } = around;

  /** NotFound for a reply that is not there; TakenDownByDesk for one that is taken down. */
  async function held(id: number, trx: Knex): Promise<ReplyRow> {
    const reply = await replies.hold(id, trx);
    if (!reply) throw new NotFound('There is no such reply.', 'Read the question again.');
    if (reply.takenDownAt) throw new TakenDownByDesk('This reply', reply.takenDownReason);
    return reply;
  }

  return {
    /** NotFound for the question; NotValid for photos of others. */
    async reply(slug: string, { accountId }: MemberCaller, reply: AddReply): Promise<Reply> {
      const strange = foreignPhotos(reply.photos, await photos.ownPhotoIds(accountId, reply.photos));
      if (strange.length > 0) throw new NotValid(strange);
      const id = await knex.transaction(async (trx) => {
        const question = await views.existing(slug, trx, visitor);
        const added = await replies.add(
          { ...reply, questionId: question.id, accountId, createdAt: clock() },
          trx,
        );
        await attached.addToReply(added.id, reply.photos, trx);
        await deskInbox.photosUsed(trx, reply.photos);
        const title = `Reply to “${question.title}”`;
        await deskInbox.firstPost(trx, { kind: 'reply', id: added.id, accountId, title });
        await happenings.add(trx, {
          kind: 'reply-added',
          key: `reply-added:${added.id}`,
          title,
          text: around.plainText(reply.text),
          path: `/questions/${slug}`,
          actorId: accountId,
          about: { questions: [question.id] },
          people: [{ accountId: question.accountId, atOnce: false }],
        });
        return added.id;
      });
      return shown(id);
    },

    /** NotAllowed for others than its writer. */
    async changeReply(id: number, { accountId }: MemberCaller, text: string): Promise<Reply> {
      await knex.transaction(async (trx) => {
        const reply = await held(id, trx);
        if (reply.accountId !== accountId)
          throw new NotAllowed('Only its writer can change a reply.', 'Add a reply of your own.');
        await replies.change(id, text, clock(), trx);
      });
      return shown(id);
    },

    /**
     * A draft of the caller's with what question and reply say; the one that is under way is given back. NotAllowed for
     * others than the reply's writer and moderators; AlreadyThere where somebody has made a write-up from it.
     */
    async draft(id: number, caller: MemberCaller): Promise<{ draftId: number }> {
      return knex.transaction(async (trx) => {
        const reply = await held(id, trx);
        if (reply.accountId !== caller.accountId && !isModerator(caller))
          throw new NotAllowed(
            'Only its writer and moderators make a write-up from a reply.',
            'Ask its writer, or write your own.',
          );
        if (reply.writeUpId !== null) {
          const open = await writeUps.openDraftOf(trx, reply.writeUpId, caller.accountId);
          if (open !== undefined) return { draftId: open };
          throw new AlreadyThere(
            'A write-up has been made from this reply already.',
            reply.writeUp ? 'Read it, and start its next edition there.' : 'Wait until it is published.',
          );
        }
        const { writeUpId, draftId } = await writeUps.startDraftWithin(
          trx,
          caller.accountId,
          await contentOf(reply, caller, trx),
        );
        await replies.startedWriteUp(id, writeUpId, trx);
        return { draftId };
      });
    },
  };

  async function contentOf(reply: ReplyRow, caller: MemberCaller, trx: Knex): Promise<EditionContent> {
    const [question] = await store.byIds([reply.questionId]);
    if (!question) throw new TakenDownByDesk('The question of this reply', null);
    const [body, symptoms, parts, named] = await Promise.all([
      store.bodyOf(question.id, trx),
      store.symptomsOf(question.id, trx),
      store.partsOf([question.id]),
      attached.ofReplies([reply.id], trx),
    ]);
    const ids = named.get(reply.id) ?? [];
    const [own, found] = await Promise.all([
      photos.ownPhotoIds(caller.accountId, ids),
      photos.photosByIds(ids),
    ]);
    return draftContent(
      {
        slug: question.slug,
        title: question.title,
        text: body.text,
        askedBy: question.displayName,
        parts,
        symptoms: symptoms.map((symptom) => symptom.slug),
        readings: body.readings,
      },
      {
        text: reply.text,
        worksheet: reply.worksheet,
        repliedBy: reply.displayName,
        day: reply.createdAt.toISOString().slice(0, 10),
        photos: ids.flatMap((photoId) => {
          const photo = own.has(photoId) ? found.get(photoId) : undefined;
          return photo ? [{ photoId, alt: photo.alt }] : [];
        }),
      },
      around.newKey,
    );
  }

  async function shown(id: number): Promise<Reply> {
    const [reply] = await views.repliesOf([(await replies.byId(id, knex))!]);
    return reply!;
  }
}
