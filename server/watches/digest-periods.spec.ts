import { describe, expect, it } from 'vitest';
import { endedPeriods } from './digest-periods.js';

describe('the periods that have ended', () => {
  it.each([
    // 2026-12-07 is a Monday.
    ['just before the hour', '2026-12-02T15:59:59.999Z', 'day:2026-12-01', 'week:2026-11-30'],
    ['on the hour', '2026-12-02T16:00:00.000Z', 'day:2026-12-02', 'week:2026-11-30'],
    ['at night', '2026-12-02T23:30:00.000Z', 'day:2026-12-02', 'week:2026-11-30'],
    ['on Monday before the hour', '2026-12-07T15:59:59.999Z', 'day:2026-12-06', 'week:2026-11-30'],
    ['on Monday at the hour', '2026-12-07T16:00:00.000Z', 'day:2026-12-07', 'week:2026-12-07'],
    ['on Sunday', '2026-12-13T20:00:00.000Z', 'day:2026-12-13', 'week:2026-12-07'],
    ['over the turn of the year', '2027-01-01T03:00:00.000Z', 'day:2026-12-31', 'week:2026-12-28'],
    ['on a leap day', '2028-02-29T16:00:00.000Z', 'day:2028-02-29', 'week:2028-02-28'],
  ])('%s', (_case, at, day, week) => {
    const { daily, weekly } = endedPeriods(new Date(at));

    expect([daily.name, weekly.name]).toEqual([day, week]);
    expect(daily.end.toISOString()).toBe(`${day.slice(4)}T16:00:00.000Z`);
    expect(weekly.end.toISOString()).toBe(`${week.slice(5)}T16:00:00.000Z`);
  });
});
