import type { Revision } from '../../../shared/contract/hardware';
import { timeLineOf } from './revision-line';

const revision = (id: number, soldFrom: string | null, soldTo: string | null): Revision => ({
  id,
  partId: 1,
  label: `Rev ${id}`,
  announcedAt: null,
  soldFrom,
  soldTo,
  howToTell: '',
  whatChanged: '',
  photos: [],
});
const now = new Date('2026-01-01T00:00:00Z');

describe('time line of revisions', () => {
  it('runs from the first day of the first revision to now', () => {
    const { spans } = timeLineOf(
      [revision(1, '2022-01-01', '2024-01-01'), revision(2, '2024-01-01', null)],
      now,
    );
    expect(spans[0]?.start).toBe(0);
    expect(spans[0]?.length).toBeCloseTo(50, 0);
    expect(spans[1]!.start + spans[1]!.length).toBeCloseTo(100, 6);
    expect(spans[1]?.sold).toBe(true);
  });

  it('sets revisions without a first day aside', () => {
    const line = timeLineOf([revision(1, null, null), revision(2, '2024-01-01', null)], now);
    expect(line.undated.map(({ id }) => id)).toEqual([1]);
    expect(line.spans).toHaveLength(1);
  });

  it('goes on beyond now for a revision that is announced, and what is sold ends today', () => {
    const { spans } = timeLineOf(
      [revision(1, '2024-01-01', null), { ...revision(2, '2026-05-01', null), announced: true }],
      now,
    );
    expect(spans[0]!.start + spans[0]!.length).toBeLessThan(spans[1]!.start);
    expect(spans[1]).toMatchObject({ announced: true, sold: false });
    expect(spans[1]!.start + spans[1]!.length).toBeCloseTo(100, 6);
  });

  it('starts an announced revision without a day now', () => {
    const { spans, undated } = timeLineOf(
      [revision(1, '2024-01-01', null), { ...revision(2, null, null), announced: true }],
      now,
    );
    expect(undated).toEqual([]);
    expect(spans[1]!.start).toBeCloseTo(spans[0]!.start + spans[0]!.length, 6);
  });

  it('has no line where no day is known', () => {
    expect(timeLineOf([revision(1, null, null)], now)).toMatchObject({ spans: [], years: [] });
  });

  it('thins the years of a long life to at most eight', () => {
    expect(timeLineOf([revision(1, '1996-01-01', null)], now).years.length).toBeLessThanOrEqual(8);
  });

  it('shows a revision that was sold for one day', () => {
    const { spans } = timeLineOf(
      [revision(1, '2025-01-01', '2025-01-02'), revision(2, '2025-01-02', null)],
      now,
    );
    expect(spans[0]!.length).toBeGreaterThanOrEqual(1);
  });
});
