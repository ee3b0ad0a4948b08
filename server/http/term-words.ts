/** A term in words: "until 4 March 2026, 10:00 UTC", or "until the desk lifts it". */
export function termInWords(until: Date | null): string {
  if (until === null) return 'until the desk lifts it';
  const day = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZone: 'UTC',
  }).format(until);
  return `until ${day.replace(' at ', ', ')} UTC`;
}
