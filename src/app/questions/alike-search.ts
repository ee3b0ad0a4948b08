import { Injectable, inject } from '@angular/core';
import { catchError, forkJoin, map, of, type Observable } from 'rxjs';
import type { PartRef, RevisionRef } from '../../../shared/contract/hardware';
import type { FitCheckLine, JointRef } from '../../../shared/contract/joints';
import type { QuestionLine, WriteUpRef } from '../../../shared/contract/questions';
import { Joints } from '../joints/joints';
import { Questions } from './questions';

/** What a question that is being written is about so far. */
export interface Written {
  readonly words: string;
  readonly parts: readonly { readonly part: PartRef; readonly revision: RevisionRef | null }[];
}

/** Where two of its parts meet: as judged for their revisions, or only that they are meant to. */
export interface MeetingPlace {
  readonly joint: JointRef;
  readonly line: FitCheckLine | null;
}

export interface Alike {
  readonly places: readonly MeetingPlace[];
  readonly writeUps: readonly WriteUpRef[];
  readonly questions: readonly QuestionLine[];
  /** The revisions that were judged. */
  readonly revisionIds: readonly number[];
}

export const nothingAlike: Alike = { places: [], writeUps: [], questions: [], revisionIds: [] };
const mostPlaces = 5;

/** Finds what may answer a question before it is asked. What cannot be found out is left out: asking goes on without. */
@Injectable({ providedIn: 'root' })
export class AlikeSearch {
  private readonly questions = inject(Questions);
  private readonly joints = inject(Joints);

  find({ words, parts }: Written): Observable<Alike> {
    const slugs = parts.map(({ part }) => part.slug);
    const revisionIds = parts.flatMap(({ revision }) => (revision ? [revision.id] : []));
    return forkJoin({
      lines:
        revisionIds.length < 2
          ? of<FitCheckLine[]>([])
          : this.joints.check(revisionIds).pipe(
              map(({ items }) => items),
              catchError(() => of<FitCheckLine[]>([])),
            ),
      writeUps:
        words === '' && slugs.length === 0
          ? of<WriteUpRef[]>([])
          : this.questions.writeUpsLike(words, slugs).pipe(catchError(() => of<WriteUpRef[]>([]))),
      alike: this.questions
        .alike(
          words,
          parts.map(({ part }) => part.id),
        )
        .pipe(catchError(() => of({ questions: [] as QuestionLine[], joints: [] as JointRef[] }))),
    }).pipe(
      map(({ lines, writeUps, alike }) => ({
        places: placesOf(lines, alike.joints).slice(0, mostPlaces),
        writeUps,
        questions: alike.questions,
        revisionIds,
      })),
    );
  }
}

/** Judged ones first, as the fit check orders them, then those that cannot be judged for want of a revision. */
function placesOf(lines: readonly FitCheckLine[], joints: readonly JointRef[]): MeetingPlace[] {
  const judged = new Set(lines.map((line) => line.joint.id));
  return [
    ...lines.map((line) => ({ joint: line.joint, line })),
    ...joints.filter((joint) => !judged.has(joint.id)).map((joint) => ({ joint, line: null })),
  ];
}
