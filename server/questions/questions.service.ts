import type { Knex } from 'knex';
import type { EditionContent } from '../../shared/contract/edition-content.js';
import { Id } from '../../shared/contract/primitives.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import type {
  AddReply,
  AskQuestion,
  QuestionLine,
  QuestionPage,
  Reply,
  Settle,
} from '../../shared/contract/questions.js';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { HardwareService } from '../hardware/hardware.js';
import { visitor, type Caller, type MemberCaller } from '../http/caller.js';
import { readCursor, toPage } from '../http/pages.js';
import { FieldNotValid, NotAllowed, NotFound, NotValid, TakenDownByDesk } from '../http/problems.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import { mayReadTakenDown, takenDownOf } from '../taken-down.js';
import { slugFrom } from '../write-ups/slug.js';
import type { QuestionRow, QuestionStore, ReplyRow } from './question.store.js';

/** What questions need to know of write-ups: the text that is published now. */
export interface PublishedFixes {
  publishedContent(db: Knex, writeUpId: number): Promise<EditionContent | undefined>;
}

export type QuestionService = ReturnType<typeof createQuestionService>;

export function createQuestionService(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  writeUps: PublishedFixes;
  renderText: (source: string) => RichText;
  store: QuestionStore;
  deskInbox: DeskInbox;
}) {
  const { knex, clock, hardware, writeUps, renderText, store, deskInbox } = around;

  async function linesOf(rows: readonly QuestionRow[]): Promise<QuestionLine[]> {
    const links = await store.partsOf(rows.map((row) => row.id));
    const [parts, revisions] = await Promise.all([
      hardware.partsByIds(links.map((link) => link.partId)),
      hardware.revisionsByIds(links.flatMap(({ revisionId }) => revisionId ?? [])),
    ]);
    return rows.map((row) => ({
      slug: row.slug,
      title: row.title,
      parts: links
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

  const toReply = ({ accountId, displayName, takenDownAt, takenDownReason, ...row }: ReplyRow): Reply => ({
    ...row,
    takenDown: takenDownOf({ takenDownAt, takenDownReason }),
    text: renderText(row.text),
    person: { id: accountId, displayName },
    createdAt: row.createdAt.toISOString(),
  });

  /** The question as far as the reader may see it. NotFound, or TakenDownByDesk. */
  async function existing(slug: string, db: Knex, reader: Caller): Promise<QuestionRow> {
    const row = await store.bySlug(slug, db);
    if (!row) throw new NotFound('There is no question at this address.');
    if (row.takenDownAt && !mayReadTakenDown(row.accountId, reader))
      throw new TakenDownByDesk('This question', row.takenDownReason);
    return row;
  }

  async function read(slug: string, reader: Caller): Promise<QuestionPage> {
    const row = await existing(slug, knex, reader);
    const [[line], body, symptoms, replies] = await Promise.all([
      linesOf([row]),
      store.bodyOf(row.id),
      store.symptomsOf(row.id),
      store.repliesOf(row.id, reader),
    ]);
    return {
      ...line!,
      ...body,
      text: renderText(body.text),
      symptoms,
      replies: replies.map(toReply),
      takenDown: takenDownOf(row),
    };
  }

  /** The question, if the account asked it. */
  async function own(slug: string, caller: MemberCaller, db: Knex): Promise<QuestionRow> {
    const row = await existing(slug, db, caller);
    if (row.accountId !== caller.accountId)
      throw new NotAllowed('Only who asked can say what settled a question.', 'Reply to it instead.');
    return row;
  }

  return {
    read,

    /** One page, the newest first. NotFound for a part that the catalogue does not have. */
    async list(query: {
      part?: string | undefined;
      open?: 'true' | 'false' | undefined;
      cursor?: string | undefined;
      limit: number;
    }): Promise<{ items: QuestionLine[]; next: string | null }> {
      const before = readCursor(Id, query.cursor);
      const part = query.part === undefined ? undefined : await hardware.partBySlug(query.part);
      const rows = await store.newest({
        before,
        partId: part?.id,
        open: query.open === undefined ? undefined : query.open === 'true',
        rows: query.limit + 1,
      });
      const page = toPage(rows, query.limit, (row) => row.id);
      return { items: await linesOf(page.items), next: page.next };
    },

    async ask(caller: MemberCaller, question: AskQuestion): Promise<QuestionPage> {
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
      ];
      if (broken.length > 0) throw new NotValid(broken);
      const slug = await knex.transaction(async (trx) => {
        const { accountId } = caller;
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
        const title = `Question “${question.title}”`;
        await deskInbox.firstPost(trx, { kind: 'question', id: added.id, accountId, title });
        return added.slug;
      });
      return read(slug, caller);
    },

    async reply(slug: string, { accountId }: MemberCaller, reply: AddReply): Promise<Reply> {
      return knex.transaction(async (trx) => {
        const { id: questionId, title } = await existing(slug, trx, visitor);
        const added = await store.addReply({ ...reply, questionId, accountId, createdAt: clock() }, trx);
        const posted = { kind: 'reply', id: added.id, accountId, title: `Reply to “${title}”` } as const;
        await deskInbox.firstPost(trx, posted);
        return toReply(added);
      });
    },

    /** Names the fix that helped. NotAllowed for others than the asker; FieldNotValid for a fix that is not published. */
    async settle(slug: string, caller: MemberCaller, { writeUpSlug, fixKey }: Settle): Promise<QuestionPage> {
      await knex.transaction(async (trx) => {
        const question = await own(slug, caller, trx);
        const writeUpId = await store.publishedWriteUpId(writeUpSlug, trx);
        if (writeUpId === undefined)
          throw new FieldNotValid(
            'writeUpSlug',
            'is not a published write-up',
            'Search for it by its title.',
          );
        const content = await writeUps.publishedContent(trx, writeUpId);
        const fix = content?.fixes.find(({ key }) => key === fixKey);
        if (!fix)
          throw new FieldNotValid(
            'fixKey',
            'is not a fix of its published edition',
            'Choose one of its fixes.',
          );
        await store.settle(question.id, { writeUpId, fixKey, fixTitle: fix.title }, trx);
      });
      return read(slug, caller);
    },

    async reopen(slug: string, caller: MemberCaller): Promise<QuestionPage> {
      const question = await own(slug, caller, knex);
      await store.settle(question.id, null, knex);
      return read(slug, caller);
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
