import type { Knex } from 'knex';
import type { JointPage } from '../../shared/contract/joints.js';
import type { MakerLetter } from '../../shared/contract/makers.js';
import type { WriteUpPage } from '../../shared/contract/write-ups.js';
import { jointOfWriteUp } from '../../shared/fit/joint-of-write-up.js';
import type { AuditLog } from '../audit/audit.js';
import { isModerator, type MemberCaller } from '../http/caller.js';
import { AlreadyThere, NotAllowed, NotFound } from '../http/problems.js';
import type { JointService } from '../joints/joints.service.js';
import type { Attachment, Letter } from '../mail/letter.js';
import type { MakerMail } from '../mail/maker-mail.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import type { Concerned } from './concerned.js';
import { attachmentsOf, drawingOf } from './letter-drawing.js';
import { fitTable, fixesTable, readingsTable, trialsTable } from './letter-evidence.js';
import { makerLetterStore as letters, type SentLetter } from './maker-letter.store.js';
import type { MakerRow } from './maker.store.js';

export interface TellingParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly concerned: Concerned;
  readonly writeUps: WriteUpService;
  readonly joints: JointService;
  readonly mail: MakerMail;
  readonly audit: AuditLog;
  readonly publicAddress: string;
}

interface Prepared {
  readonly page: WriteUpPage;
  readonly maker: MakerRow;
  readonly month: string;
  readonly sent: SentLetter | undefined;
  readonly drawing: string | null;
  readonly attachments: readonly Attachment[];
  letter(note: string): Letter;
}

export type TellingService = ReturnType<typeof createTellingService>;

/** Telling a maker of a write-up, with the evidence that owners gathered. */
export function createTellingService(around: TellingParts) {
  const { knex, clock, concerned, writeUps, joints, mail, audit, publicAddress } = around;

  return {
    /** The letter as it would go out now, without a note. */
    async preview(caller: MemberCaller, slug: string, makerSlug: string): Promise<MakerLetter> {
      return view(await prepare(caller, slug, makerSlug), caller, '');
    },

    /** Once for each write-up, maker and calendar month (UTC): AlreadyThere names who was first. */
    async send(caller: MemberCaller, slug: string, makerSlug: string, note: string): Promise<MakerLetter> {
      const prepared = await prepare(caller, slug, makerSlug);
      const { page, maker, month, attachments } = prepared;
      const to = maker.contactAddress;
      if (to === null)
        throw new NotFound(`No address of ${maker.name} is known.`, 'Ask the desk to find one.');
      await knex.transaction(async (trx) => {
        const accountId = caller.accountId;
        const id = await letters.add(trx, {
          writeUpId: page.id,
          makerId: maker.id,
          month,
          accountId,
          at: clock(),
        });
        if (id === undefined) throw toldAlready(prepared);
        const letter = prepared.letter(note);
        await mail.queueLetter(trx, { dedupeKey: `maker-letter:${id}`, to, letter, attachments });
        await audit.note(trx, {
          actorId: accountId,
          action: 'maker-told',
          subject: { kind: 'write-up', id: page.id, name: page.view.title },
          details: { maker: maker.slug, month },
        });
      });
      return view(await prepare(caller, slug, makerSlug), caller, note);
    },
  };

  /** NotAllowed for whoever is neither author nor moderator. */
  async function prepare(caller: MemberCaller, slug: string, makerSlug: string): Promise<Prepared> {
    const { maker, writeUp } = await concerned.makerIn(slug, makerSlug);
    const page = await writeUps.readWriteUp(caller, writeUp.slug);
    const isAuthor = page.authors.some(({ id }) => id === caller.accountId);
    if (!isAuthor && !isModerator(caller))
      throw new NotAllowed('Authors of the write-up and moderators tell the maker.', 'Ask one of them.');
    const [joint, sent] = await Promise.all([jointOf(page), letters.of(knex, page.id)]);
    const month = clock().toISOString().slice(0, 7);
    const drawing = joint && drawingOf(joint, page.view);
    return {
      page,
      maker,
      month,
      sent: sent.find((each) => each.makerId === maker.id && each.month === month),
      drawing,
      attachments: drawing === null ? [] : await attachmentsOf(drawing),
      letter: (note) => letterAbout(page, maker, joint, note),
    };
  }

  async function jointOf({ view }: WriteUpPage): Promise<JointPage | null> {
    const first = view.joints[0];
    if (!first) return null;
    const joint = jointOfWriteUp(await joints.list(first.a.part.slug), view);
    return joint && joints.page(joint.slug);
  }

  function letterAbout(page: WriteUpPage, maker: MakerRow, joint: JointPage | null, note: string): Letter {
    const { view } = page;
    const tables = [
      ...(joint ? [readingsTable(joint), fitTable(joint)] : []),
      fixesTable(view.fixes),
      trialsTable(page.trials, view.fixes),
    ].filter(({ rows }) => rows.length > 0);
    return {
      subject: `What owners found on your part: ${view.title}`,
      greeting: `To ${maker.name}`,
      paragraphs: [
        `Owners of your parts keep a write-up on Shimlore: “${view.title}”. ${view.summary}`.trim(),
        `It was written by ${page.authors.map(({ displayName }) => displayName).join(', ')}. Below stands what owners have measured and tried so far. These are their readings, not ours; none of it is a judgement of your work.`,
        ...(note.trim() === '' ? [] : [note.trim()]),
        'You can answer on the write-up, announce a revision and say from which one on it is made right: ask to speak for your name on your page there. Replies to this mail reach the desk.',
      ],
      tables,
      action: {
        label: 'Read the write-up',
        url: new URL(`/write-ups/${page.slug}`, publicAddress).href,
      },
    };
  }
}

function view(prepared: Prepared, caller: MemberCaller, note: string): MakerLetter {
  const { maker, sent, drawing, attachments } = prepared;
  const letter = prepared.letter(note);
  return {
    maker: { id: maker.id, slug: maker.slug, name: maker.name },
    to: isModerator(caller) ? (maker.contactAddress ?? '') : shortened(maker.contactAddress),
    subject: letter.subject,
    paragraphs: [letter.greeting, ...letter.paragraphs],
    tables: (letter.tables ?? []).map(({ caption, head, rows }) => ({
      caption,
      head: [...head],
      rows: rows.map((row) => [...row]),
    })),
    drawing,
    attachments: attachments.map(({ fileName, mediaType, content }) => ({
      fileName,
      mediaType,
      bytes: content.length,
    })),
    sent: sent
      ? {
          person: { id: sent.accountId, displayName: sent.displayName },
          sentAt: sent.sentAt.toISOString(),
        }
      : null,
  };
}

/** Enough to know it again, too little to write to. */
function shortened(address: string | null): string {
  return address === null ? '' : address.replace(/^(.)[^@]*/, '$1…');
}

function toldAlready({ maker, sent }: Prepared): AlreadyThere {
  const who = sent ? ` by ${sent.displayName}` : '';
  return new AlreadyThere(
    `${maker.name} was told of this write-up this month already${who}.`,
    'Next month it can be told again, with what came in until then.',
  );
}
