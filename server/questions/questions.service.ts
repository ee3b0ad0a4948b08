import type { Knex } from 'knex';
import { Id } from '../../shared/contract/primitives.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type { JointRef } from '../../shared/contract/joints.js';
import type {
  AskQuestion,
  ChangeQuestion,
  QuestionLine,
  QuestionPage,
} from '../../shared/contract/questions.js';
import type { HardwareService } from '../hardware/hardware.js';
import { type MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { NotAllowed, NotFound, NotValid } from '../http/problems.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { slugFrom } from '../write-ups/slug.js';
import { foreignPhotos } from './foreign-photos.js';
import type { QuestionLinksStore } from './question-links.store.js';
import type { QuestionPhotosStore } from './question-photos.store.js';
import type { QuestionPhotos, QuestionViews } from './question-view.js';
import type { QuestionStore } from './question.store.js';

/** What questions need of joints. */
export interface JointsBetween {
  between(partIds: readonly number[]): Promise<JointRef[]>;
}

export type QuestionService = ReturnType<typeof createQuestionService>;

export function createQuestionService(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  joints: JointsBetween;
  photos: QuestionPhotos;
  store: QuestionStore;
  attached: QuestionPhotosStore;
  links: QuestionLinksStore;
  views: QuestionViews;
  deskInbox: DeskInbox;
  happenings: Happenings;
  plainText: (markdown: string) => string;
}) {
  const { knex, clock, hardware, joints, photos, store, attached, links, views, deskInbox, happenings } =
    around;

  return {
    read: views.read,

    /** One page, the newest first. NotFound for a part that the catalogue does not have. */
    async list(query: {
      part?: string | undefined;
      q?: string | undefined;
      open?: 'true' | 'false' | undefined;
      cursor?: string | undefined;
      limit: number;
    }): Promise<{ items: QuestionLine[]; next: string | null }> {
      const before = readCursor(Id, query.cursor);
      const part = query.part === undefined ? undefined : await hardware.partBySlug(query.part);
      const rows = await store.newest({
        before,
        partId: part?.id,
        words: query.q,
        open: query.open === undefined ? undefined : query.open === 'true',
        rows: query.limit + 1,
      });
      const page = toPage(rows, query.limit, (row) => row.id);
      return { items: await views.linesOf(page.items), next: page.next };
    },

    /** What is like a question that is being written; see the store for the rule. */
    async listAlike(wish: {
      q: string;
      part: readonly number[];
    }): Promise<{ questions: QuestionLine[]; joints: JointRef[] }> {
      const [ids, between] = await Promise.all([
        links.alike(wish.part, wish.q),
        wish.part.length < 2 ? [] : joints.between(wish.part),
      ]);
      return { questions: await views.linesOf(await store.byIds(ids)), joints: between };
    },

    /** Questions that a write-up settled or was made from. NotFound for one that is not published. */
    async listCovered(slug: string): Promise<{ items: QuestionLine[] }> {
      const writeUpId = await store.publishedWriteUpId(slug, knex);
      if (writeUpId === undefined)
        throw new NotFound('There is no published write-up of that name.', 'Search for the part.');
      return { items: await views.linesOf(await store.byIds(await links.coveredBy(writeUpId))) };
    },

    async ask(caller: MemberCaller, question: AskQuestion): Promise<QuestionPage> {
      const { accountId } = caller;
      const symptoms = await hardware.symptomsBySlugs(question.symptoms);
      const broken = [
        ...brokenParts(
          question,
          await hardware.partsByIds(question.parts.map((part) => part.partId)),
          await hardware.revisionsByIds(question.parts.flatMap(({ revisionId }) => revisionId ?? [])),
        ),
        ...question.symptoms.flatMap((slug, index) =>
          symptoms.has(slug)
            ? []
            : [{ path: `symptoms.${index}`, message: 'is not a symptom of the list', remedy: chooseOne }],
        ),
        ...foreignPhotos(question.photos, await photos.ownPhotoIds(accountId, question.photos)),
      ];
      if (broken.length > 0) throw new NotValid(broken);
      const slug = await knex.transaction(async (trx) => {
        const added = await store.add(
          {
            ...question,
            slugBase: slugBaseOf(question.title),
            symptomIds: [...new Set([...symptoms.values()].map((symptom) => symptom.id))],
            accountId,
            createdAt: clock(),
          },
          trx,
        );
        await attached.addToQuestion(added.id, question.photos, trx);
        await deskInbox.photosUsed(trx, question.photos);
        const title = `Question “${question.title}”`;
        await deskInbox.firstPost(trx, { kind: 'question', id: added.id, accountId, title });
        await happenings.add(trx, {
          kind: 'question-asked',
          key: `question-asked:${added.id}`,
          title: `Question: ${question.title}`,
          text: around.plainText(question.text),
          path: `/questions/${added.slug}`,
          actorId: accountId,
          about: {
            parts: question.parts.map(({ partId }) => partId),
            revisions: question.parts.flatMap(({ revisionId }) => revisionId ?? []),
            questions: [added.id],
          },
        });
        return added.slug;
      });
      return views.read(slug, caller);
    },

    /** NotAllowed for others than the asker. */
    async change(slug: string, caller: MemberCaller, change: ChangeQuestion): Promise<QuestionPage> {
      await knex.transaction(async (trx) => {
        const question = await views.existing(slug, trx, caller);
        if (question.accountId !== caller.accountId)
          throw new NotAllowed('Only who asked can change a question.', 'Reply to it instead.');
        await store.change(question.id, change, clock(), trx);
      });
      return views.read(slug, caller);
    },
  };
}

const chooseOne = 'Choose one of the list.';

function brokenParts(
  question: AskQuestion,
  parts: ReadonlyMap<number, unknown>,
  revisions: ReadonlyMap<number, { partId: number }>,
): FieldProblem[] {
  return question.parts.flatMap(({ partId, revisionId }, index) => {
    if (!parts.has(partId))
      return [
        { path: `parts.${index}.partId`, message: 'is not a part of the catalogue', remedy: chooseOne },
      ];
    if (revisionId !== null && revisions.get(revisionId)?.partId !== partId)
      return [
        { path: `parts.${index}.revisionId`, message: 'is not a revision of that part', remedy: chooseOne },
      ];
    const first = question.parts.findIndex(
      (other) => other.partId === partId && other.revisionId === revisionId,
    );
    return first === index
      ? []
      : [{ path: `parts.${index}`, message: 'is named twice', remedy: 'Name each once.' }];
  });
}

/** Words of the title for its address; a title in other letters than Latin ones gives `question`. */
function slugBaseOf(title: string): string {
  return /[a-z0-9]/i.test(title.normalize('NFKD')) ? slugFrom(title) : 'question';
}
