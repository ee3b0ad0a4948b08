import { z } from 'zod';
import { Photo } from './photos.js';
import { Id } from './primitives.js';
import { TakenDown, takenDownKinds } from './taken-down.js';
import { PersonRef } from './write-ups.js';

/** What somebody can tell the desk of; a fix or a whole write-up is dealt with through its edition, not taken down here. */
export const deskSubjectKinds = [...takenDownKinds, 'write-up', 'fix'] as const;
export const DeskSubjectKind = z.enum(deskSubjectKinds);
export type DeskSubjectKind = z.infer<typeof DeskSubjectKind>;

export const deskSubjectWords: Record<DeskSubjectKind, string> = {
  question: 'question',
  reply: 'reply',
  trial: 'trial',
  'fit-report': 'fit report',
  reading: 'reading',
  photo: 'photo',
  'write-up': 'write-up',
  fix: 'fix',
};

/** Something a member wrote, as the desk looks at it: quoted, with where it stands. */
export const DeskSubject = z.object({
  kind: DeskSubjectKind,
  id: Id,
  /** What it is called: "Reply to “Which shim?”". */
  title: z.string(),
  /** Plain source, as typed; may be empty. */
  text: z.string(),
  /** Page on which it stands. */
  path: z.string(),
  person: PersonRef,
  photo: Photo.nullable(),
  takenDown: TakenDown.nullable(),
});
export type DeskSubject = z.infer<typeof DeskSubject>;
