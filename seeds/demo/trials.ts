import type { TrialOutcome } from '../../shared/contract/vocabulary.js';
import type { WorksheetRecord } from '../../shared/contract/worksheet.js';
import { pick, shuffled } from './random.js';
import { lettersOf } from './resolve-content.js';
import { trialNotes } from './trial-notes.js';
import { ownWorksheet } from './trial-worksheets.js';
import type { DemoContent, DemoFix } from './write-up-shape.js';

export interface PlannedTrial {
  readonly accountId: number;
  readonly outcome: TrialOutcome;
  readonly figure: number | null;
  readonly note: string;
  readonly worksheet: WorksheetRecord | null;
  /** `part:letter`. */
  readonly revisions: readonly string[];
  readonly createdAt: Date;
}

/** Gives a fix's trials their people, days, revisions and words; nobody tries the same fix twice. */
export function planTrials(parts: {
  fix: DemoFix;
  content: DemoContent;
  people: readonly number[];
  since: Date;
  now: Date;
  next: () => number;
}): PlannedTrial[] {
  const { fix, content, people, since, now, next } = parts;
  const joint = content.joints[0];
  const choices = joint ? [joint.a, joint.b].map((side) => lettersOf(`${side.part}:${side.holds}`)) : [];
  const who = shuffled(people, next);
  const notes: Record<TrialOutcome, string[]> = {
    held: shuffled(trialNotes[fix.kind].held, next),
    'held-for-a-while': shuffled(trialNotes[fix.kind]['held-for-a-while'], next),
    'did-not-help': shuffled(trialNotes[fix.kind]['did-not-help'], next),
  };
  return fix.trials.map((trial, index) => {
    const pool = notes[trial.outcome];
    const limited = fix.only.flatMap(lettersOf);
    return {
      accountId: who[index % who.length]!,
      outcome: trial.outcome,
      figure: trial.figure,
      note: pool[index % pool.length]!,
      worksheet: ownWorksheet(fix.worksheet, index),
      revisions: choices.map((side) => {
        const fitting = side.filter((revision) => limited.includes(revision));
        return pick(fitting.length > 0 ? fitting : side, next);
      }),
      createdAt: new Date(since.getTime() + (now.getTime() - since.getTime()) * (0.05 + 0.9 * next())),
    };
  });
}
