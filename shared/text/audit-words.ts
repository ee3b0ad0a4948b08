/** Actions whose name alone does not say it well. */
const known: Readonly<Record<string, string>> = {
  merged: 'merged into another',
  'all-taken-down': 'all they wrote was taken down',
  'all-put-back': 'all they wrote was put back',
  'library-reordered': 'order of the caution library changed',
};

/** What was done, in words: `edition-published` → "edition published". */
export function actionWords(action: string): string {
  return known[action] ?? action.replaceAll('-', ' ');
}

/** What an action changed, each member in words; nested ones are told one within the other. */
export function detailWords(details: unknown): string[] {
  if (details === null || typeof details !== 'object') return [];
  return Object.entries(details as Record<string, unknown>).map(
    ([name, value]) => `${nameWords(name)}: ${valueWords(value)}`,
  );
}

/** `writeUpId` → "write up id". */
function nameWords(name: string): string {
  return name
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .replace(/[-_]/g, ' ')
    .toLowerCase();
}

function valueWords(value: unknown): string {
  if (value === null || value === undefined) return 'none';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return value.length === 0 ? 'none' : value.map(valueWords).join(', ');
  if (typeof value === 'object') return detailWords(value).join('; ') || 'none';
  return String(value as string | number);
}
