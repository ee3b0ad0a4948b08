import type { DeskSubject, DeskSubjectKind } from '../../shared/contract/desk-subjects.js';
import { takenDownOf, type TakenDownRow } from '../taken-down.js';

export interface Writer {
  readonly id: number;
  readonly personId: number;
  readonly displayName: string;
}
export type Written = Writer & TakenDownRow;

/** Columns of the writer, whose account has the alias `a`. */
export const person = { personId: 'a.id', displayName: 'a.display_name' };

/** What every thing on the desk has in common. */
export function writtenBy(
  kind: DeskSubjectKind,
  row: Written,
): Pick<DeskSubject, 'kind' | 'id' | 'person' | 'photo' | 'takenDown'> {
  return {
    kind,
    id: row.id,
    person: { id: row.personId, displayName: row.displayName },
    photo: null,
    takenDown: takenDownOf(row),
  };
}
