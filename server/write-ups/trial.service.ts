import type { Knex } from 'knex';
import type { EditionContent, Fix } from '../../shared/contract/edition-content.js';
import type { RevisionRef } from '../../shared/contract/hardware.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import { trialOutcomeWords, type Standing } from '../../shared/contract/vocabulary.js';
import type { Trial, TrialReport } from '../../shared/contract/write-ups.js';
import { standingOf } from '../../shared/fit/standing.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { MemberCaller } from '../http/caller.js';
import { NotValid } from '../http/problems.js';
import { groupBy } from '../rows.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { partIdsOf } from './edition-links.js';
import { NoSuchWriteUp } from './edition-problems.js';
import type { FixStore } from './fix.store.js';
import { publicationStore } from './publication.store.js';
import type { PublishedStore } from './published.store.js';
import type { TrialStore } from './trial.store.js';

/** What write-ups need of the search index: to be told which document must be made anew. */
export interface IndexNotice {
  add(trx: Knex, writeUpId: number): Promise<void>;
}

export interface TrialParts {
  readonly knex: Knex;
  readonly clock: () => Date;
  readonly hardware: HardwareService;
  readonly published: PublishedStore;
  readonly fixes: FixStore;
  readonly trials: TrialStore;
  readonly searchOutbox: IndexNotice;
  readonly happenings: Happenings;
  readonly deskInbox: DeskInbox;
}

export type TrialService = ReturnType<typeof createTrialService>;

export function createTrialService({
  knex,
  clock,
  hardware,
  published,
  fixes,
  trials,
  searchOutbox,
  happenings,
  deskInbox,
}: TrialParts) {
  return {
    /** As `reportTrialWithin`, in a transaction of its own. */
    async reportTrial(caller: MemberCaller, slug: string, report: TrialReport): Promise<Trial> {
      const { writeUpId, trialId } = await knex.transaction((trx) =>
        reportTrialWithin(trx, caller.accountId, slug, report),
      );
      const [trial] = await trials.trialsOf(writeUpId, caller, { trialId });
      return trial!;
    },

    reportTrialWithin,
    judgeStandings,

    /** Judges the fixes of a published write-up anew, after the desk has taken trials down or put them back. */
    async judgeAnew(trx: Knex, writeUpId: number): Promise<void> {
      await publicationStore.lockWriteUp(trx, writeUpId);
      const content = await published.publishedContent(trx, writeUpId);
      if (content && (await judgeStandings(trx, writeUpId, content))) await searchOutbox.add(trx, writeUpId);
    },
  };

  /**
   * Stores the trial, notes it for those who watch, and judges the standing of the fix anew. NoSuchWriteUp where none is
   * published at the address; NotValid where fix, revisions or figure do not belong to its published edition.
   */
  async function reportTrialWithin(
    trx: Knex,
    accountId: number,
    slug: string,
    report: TrialReport,
  ): Promise<{ writeUpId: number; trialId: number }> {
    const writeUp = await published.bySlug(slug);
    if (!writeUp) throw new NoSuchWriteUp();
    const revisions = await hardware.revisionsByIds(report.revisionIds);
    await publicationStore.lockWriteUp(trx, writeUp.id);
    const content = await published.publishedContent(trx, writeUp.id);
    if (!content) throw new NoSuchWriteUp();
    const problems = problemsOf(report, content, revisions);
    if (problems.length > 0) throw new NotValid(problems);
    const fixId = (await fixes.addMissing(trx, writeUp.id, [report.fixKey])).get(report.fixKey)!;
    const trialId = await trials.putTrial(trx, {
      ...report,
      fixId,
      revisionIds: [...new Set(report.revisionIds)],
      accountId,
      createdAt: clock(),
    });
    const fix = content.fixes.find((each) => each.key === report.fixKey)!;
    await happenings.add(trx, {
      kind: 'trial-reported',
      key: `trial-reported:${fixId}:${accountId}:${trialId}`,
      title: `Trial of “${fix.title}”: ${trialOutcomeWords[report.outcome]}`,
      text: report.note,
      path: `/write-ups/${slug}`,
      actorId: accountId,
      about: { writeUps: [writeUp.id], revisions: report.revisionIds },
    });
    const title = `Trial of “${fix.title}”`;
    await deskInbox.firstPost(trx, { kind: 'trial', id: trialId, accountId, title });
    if (await judgeStandings(trx, writeUp.id, content)) await searchOutbox.add(trx, writeUp.id);
    return { writeUpId: writeUp.id, trialId };
  }

  /** Judges every fix of an edition anew by the trials there are; whether any standing changed. */
  async function judgeStandings(trx: Knex, writeUpId: number, content: EditionContent): Promise<boolean> {
    const known = await fixes.fixesOf(writeUpId, trx);
    const authors = new Set(await published.authorIds(trx, writeUpId));
    const evidence = groupBy(await fixes.evidenceFor(trx, writeUpId), (trial) => trial.fixId);
    const changed = new Map<number, Standing>();
    for (const { key, acceptance } of content.fixes) {
      const fix = known.get(key);
      if (!fix) continue;
      const reported = (evidence.get(fix.id) ?? []).map((trial) => ({
        ...trial,
        byAuthor: authors.has(trial.accountId),
      }));
      const standing = standingOf(reported, acceptance, fix.madeRightFrom !== null);
      if (standing !== fix.standing) changed.set(fix.id, standing);
    }
    await fixes.setStandings(trx, changed);
    return changed.size > 0;
  }
}

function problemsOf(
  report: TrialReport,
  content: EditionContent,
  revisions: ReadonlyMap<number, RevisionRef>,
): FieldProblem[] {
  const fix: Fix | undefined = content.fixes.find((each) => each.key === report.fixKey);
  if (!fix) {
    const remedy = 'Read the write-up again and choose one of its fixes.';
    return [{ path: 'fixKey', message: 'is not a fix of the published edition', remedy }];
  }
  const parts = new Set(partIdsOf(content));
  const stray = report.revisionIds.flatMap((id, index) => {
    const revision = revisions.get(id);
    return revision && parts.has(revision.partId)
      ? []
      : [
          {
            path: `revisionIds.${index}`,
            message: 'is not a revision of one of the parts',
            remedy: 'Choose from the parts of the joint.',
          },
        ];
  });
  if (report.figure === null || fix.acceptance) return stray;
  return [
    ...stray,
    {
      path: 'figure',
      message: 'has nothing to be held against: the fix names no acceptance figure',
      remedy: 'Leave it out and tell it in the note.',
    },
  ];
}
