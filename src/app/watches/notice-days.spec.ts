import type { Notice } from '../../../shared/contract/watches';
import { noticeDays } from './notice-days';

const notice = (over: Partial<Notice>): Notice => ({
  id: 1,
  kind: 'edition-published',
  title: 'New: lip',
  text: '',
  path: '/write-ups/lip',
  at: '2026-12-02T10:00:00.000Z',
  read: false,
  safety: false,
  because: 'watch',
  about: null,
  ...over,
});

describe('notices by day', () => {
  it('stand under the day in UTC on which they happened, the newest first', () => {
    const days = noticeDays([
      notice({ id: 3, at: '2026-12-02T00:00:00.000Z' }),
      notice({ id: 2, at: '2026-12-01T23:59:59.999Z' }),
    ]);

    expect(days.map(({ day }) => day)).toEqual(['2026-12-02', '2026-12-01']);
  });

  it('make readings of one page and day one line, and leave what is rare apart', () => {
    const reading = { kind: 'reading-recorded', path: '/parts/m1' };
    const [day] = noticeDays([
      notice({ id: 5, ...reading }),
      notice({ id: 4 }),
      notice({ id: 3, ...reading, read: true }),
      notice({ id: 2, ...reading, path: '/parts/m2', title: 'Reading: depth' }),
      notice({ id: 1 }),
    ]);

    expect(day?.groups.map(({ title }) => title)).toEqual([
      '2 new readings',
      'New: lip',
      'Reading: depth',
      'New: lip',
    ]);
    expect(day?.groups[0]?.unreadIds).toEqual([5]);
  });
});
