import type { EndedPeriod } from './digest.store.js';

const day = 24 * 60 * 60 * 1000;
/** Hour of the day in UTC at which a day's digest is made: early evening in Europe, before the sky is dark. */
export const digestHour = 16;

/** The last day, from hour to hour, and the last week, from Monday to Monday, that have ended at `now`. Both are half open. */
export function endedPeriods(now: Date): { daily: EndedPeriod; weekly: EndedPeriod } {
  const today = Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), now.getUTCDate(), digestHour);
  const dailyEnd = today <= now.getTime() ? today : today - day;
  const sinceMonday = (new Date(dailyEnd).getUTCDay() + 6) % 7;
  return {
    daily: periodEnding('day', dailyEnd),
    weekly: periodEnding('week', dailyEnd - sinceMonday * day),
  };
}

/** Named after the day on which it ends. */
function periodEnding(kind: 'day' | 'week', end: number): EndedPeriod {
  return { name: `${kind}:${new Date(end).toISOString().slice(0, 10)}`, end: new Date(end) };
}
