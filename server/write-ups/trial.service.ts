import type { Knex } from 'knex';
import type { EditionContent, Fix } from '../../shared/contract/edition-content.js';
import type { RevisionRef } from '../../shared/contract/hardware.js';
import type { FieldProblem } from '../../shared/contract/problem.js';
import { trialOutcomeWords, type Standing, type TrialOutcome } from '../../shared/contract/vocabulary.js';
import type { Trial } from '../../shared/contract/write-ups.js';
import { standingOf } from '../../shared/fit/standing.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { MemberCaller } from '../http/caller.js';
import { NotValid } from '../http/problems.js';
import { groupBy } from '../rows.js';
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

export interface TrialReport {
  readonly fixKey: string;
  readonly outcome: TrialOutcome;
  readonly revisionIds: readonly number[];
  readonly note: string;
  readonly figure: number | null;
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
}: TrialParts) {
  return {
    /** NotValid where fix, revisions or figure do not belong to the published edition. */
    async reportTrial(caller: MemberCaller, slug: string, report: TrialReport): Promise<Trial> {
      const writeUp = await published.bySlug(slug);
      if (!writeUp) throw new NoSuchWriteUp();
      const revisions = await hardware.revisionsByIds(report.revisionIds);
      const trialId = await knex.transaction(async (trx) => {
        await publicationStore.lockWriteUp(trx, writeUp.id);
        const content = await published.publishedContent(trx, writeUp.id);
        if (!content) throw new NoSuchWriteUp();
        const problems = problemsOf(report, content, revisions);
        if (problems.length > 0) throw new NotValid(problems);
        const fixId = (await fixes.addMissing(trx, writeUp.id, [report.fixKey])).get(report.fixKey)!;
        const id = await trials.putTrial(trx, {
          ...report,
          fixId,
          revisionIds: [...new Set(report.revisionIds)],
          accountId: caller.accountId,
          createdAt: clock(),
        });
        const fix = content.fixes.find((each) => each.key === report.fixKey)!;
        await happenings.add(trx, {
          kind: 'trial-reported',
          key: `trial-reported:${fixId}:${caller.accountId}:${id}`,
          title: `Trial of “${fix.title}”: ${trialOutcomeWords[report.outcome]}`,
          text: report.note,
          path: `/write-ups/${slug}`,
          actorId: caller.accountId,
          about: { writeUps: [writeUp.id], revisions: report.revisionIds },
        });
        if (await judgeStandings(trx, writeUp.id, content)) await searchOutbox.add(trx, writeUp.id);
        return id;
      });
      const [trial] = await trials.trialsOf(writeUp.id, { trialId });
      return trial!;
    },

    judgeStandings,
  };

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
