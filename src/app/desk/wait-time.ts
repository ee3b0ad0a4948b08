const minute = 60_000;
const hour = 60 * minute;
const day = 24 * hour;

/** How long something has waited, in the two largest units that matter: "3 days 4 h", "2 h 5 min", "under a minute". */
export function waitTime(since: Date, now: Date): string {
  const waited = Math.max(0, now.getTime() - since.getTime());
  if (waited < minute) return 'under a minute';
  if (waited < hour) return `${Math.floor(waited / minute)} min`;
  if (waited < day)
    return joined(`${Math.floor(waited / hour)} h`, Math.floor((waited % hour) / minute), 'min');
  const days = Math.floor(waited / day);
  return joined(days === 1 ? '1 day' : `${days} days`, Math.floor((waited % day) / hour), 'h');
}

function joined(larger: string, count: number, unit: string): string {
  return count === 0 ? larger : `${larger} ${count} ${unit}`;
}
