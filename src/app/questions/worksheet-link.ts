import type { ValidatorFn } from '@angular/forms';
import type { WorksheetRecord } from '../../../shared/contract/worksheet';
import { worksheetOfLink } from '../../../shared/fit/worksheet-link';

/** Lets an empty field and the link of a worksheet pass; says in words why another text does not. */
export const isWorksheetLink: ValidatorFn = ({ value }) => {
  const read = linkIn(value) === '' ? null : worksheetOfLink(linkIn(value));
  return read && 'refusal' in read ? { told: read.refusal } : null;
};

/** The worksheet of a field that has passed `isWorksheetLink`; null where it is empty. */
export function worksheetIn(link: string): WorksheetRecord | null {
  if (linkIn(link) === '') return null;
  const read = worksheetOfLink(linkIn(link));
  return 'record' in read ? read.record : null;
}

function linkIn(value: unknown): string {
  return String(value ?? '').trim();
}
