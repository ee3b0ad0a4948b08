import { waitTime } from './wait-time';

describe('how long an edition has waited', () => {
  it.each([
    ['2026-12-01T10:00:30Z', 'under a minute'],
    ['2026-12-01T10:05:59Z', '5 min'],
    ['2026-12-01T12:00:00Z', '2 h'],
    ['2026-12-01T12:05:00Z', '2 h 5 min'],
    ['2026-12-02T10:00:00Z', '1 day'],
    ['2026-12-04T14:59:00Z', '3 days 4 h'],
    ['2026-12-01T09:59:00Z', 'under a minute'],
  ])('when it came at ten and it is %s, then it is told as %s', (now, expected) => {
    expect(waitTime(new Date('2026-12-01T10:00:00Z'), new Date(now))).toBe(expected);
  });
});
