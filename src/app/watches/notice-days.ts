import { gatheredKinds, type Notice } from '../../../shared/contract/watches';

/** One line of the list: a notice, or several of one kind on one page of one day. */
export interface NoticeGroup {
  readonly key: string;
  /** The newest first. */
  readonly notices: readonly [Notice, ...Notice[]];
  readonly title: string;
  readonly unreadIds: readonly number[];
}

export interface NoticeDay {
  /** Calendar day in UTC, ISO 8601. */
  readonly day: string;
  readonly groups: readonly NoticeGroup[];
}

/** Notices, the newest first, by day; readings, trials and reports of fit of one page and day become one line. */
export function noticeDays(notices: readonly Notice[]): NoticeDay[] {
  const days = new Map<string, Map<string, [Notice, ...Notice[]]>>();
  for (const notice of notices) {
    const day = notice.at.slice(0, 10);
    const groups = days.get(day) ?? new Map<string, [Notice, ...Notice[]]>();
    days.set(day, groups);
    const key = gatheredKinds.has(notice.kind) ? `${notice.kind} ${notice.path}` : String(notice.id);
    const group = groups.get(key);
    if (group) group.push(notice);
    else groups.set(key, [notice]);
  }
  return [...days].map(([day, groups]) => ({
    day,
    groups: [...groups.entries()].map(([key, group]) => ({
      key,
      notices: group,
      title: titleOf(group),
      unreadIds: group.flatMap(({ id, read }) => (read ? [] : [id])),
    })),
  }));
}

function titleOf([first, ...others]: readonly [Notice, ...Notice[]]): string {
  const several = others.length > 0 ? gatheredKinds.get(first.kind) : undefined;
  return several ? several(others.length + 1) : first.title;
}
