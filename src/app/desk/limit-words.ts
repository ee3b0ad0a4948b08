import { formatDate } from '@angular/common';
import type { LimitNotice } from '../../../shared/contract/members';

/** "limited until 4 March 2026, 10:00", "blocked until lifted". */
export function limitWords({ kind, until }: Pick<LimitNotice, 'kind' | 'until'>): string {
  return `${kind} until ${until === null ? 'lifted' : formatDate(until, 'd MMMM y, HH:mm', 'en')}`;
}
