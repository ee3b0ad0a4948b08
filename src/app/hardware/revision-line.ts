import type { Revision } from '../../../shared/contract/hardware';

/** A revision on the time line: where it stands and how long it was sold, in hundredths of the line's length. */
export interface RevisionSpan {
  readonly revision: Revision;
  readonly start: number;
  readonly length: number;
  /** Still sold at the end of the line. */
  readonly sold: boolean;
  /** Announced: runs from the day it is meant to be sold, or from now where none is named. */
  readonly announced: boolean;
}

export interface TimeLine {
  readonly spans: readonly RevisionSpan[];
  /** First of January of each year on the line, thinned to at most eight. */
  readonly years: readonly { readonly year: number; readonly at: number }[];
  /** Revisions whose first day nobody knows. */
  readonly undated: readonly Revision[];
}

const day = 24 * 60 * 60 * 1000;
/** Shown of a revision that is only announced. */
const announcedLength = 120 * day;
const mostYears = 8;

/**
 * Lays revisions out between the first day on which one was sold and `now`. A revision without a last day runs to the
 * next one's first day where that is known, else to the end. Cost: O(n²) over a part's few revisions.
 */
export function timeLineOf(revisions: readonly Revision[], now: Date): TimeLine {
  const isDated = (revision: Revision): boolean => revision.soldFrom !== null || revision.announced === true;
  const dated = revisions.filter(isDated);
  const undated = revisions.filter((revision) => !isDated(revision));
  const from = ({ soldFrom }: Revision): number => (soldFrom === null ? now.getTime() : instant(soldFrom));
  if (dated.length === 0) return { spans: [], years: [], undated };
  const first = Math.min(...dated.map(from));
  const last = Math.max(
    now.getTime(),
    ...dated.map((revision) =>
      revision.announced
        ? from(revision) + announcedLength
        : (revision.soldTo === null ? from(revision) : instant(revision.soldTo)) + day,
    ),
  );
  const at = (time: number): number => ((time - first) / (last - first)) * 100;
  const spans = dated.map((revision): RevisionSpan => {
    const start = at(from(revision));
    const announced = revision.announced === true;
    const sold = !announced && revision.soldTo === null;
    const end = announced ? 100 : at(revision.soldTo === null ? now.getTime() : instant(revision.soldTo));
    return { revision, start, length: Math.max(end - start, 1), sold, announced };
  });
  return {
    spans,
    years: yearsBetween(first, last).map((year) => ({ year, at: at(Date.UTC(year, 0, 1)) })),
    undated,
  };
}

function yearsBetween(first: number, last: number): number[] {
  const from = new Date(first).getUTCFullYear() + 1;
  const to = new Date(last).getUTCFullYear();
  const step = Math.max(1, Math.ceil((to - from + 1) / mostYears));
  const years: number[] = [];
  for (let year = from; year <= to; year += step) years.push(year);
  return years;
}

function instant(text: string): number {
  return Date.parse(`${text}T00:00:00Z`);
}
