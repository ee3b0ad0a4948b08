/** Element id of the field at a path of the content, such as `fixes.0.title`. */
export function fieldId(path: string): string {
  return `field-${path.replaceAll('.', '-')}`;
}

const names: Record<string, string> = {
  title: 'title',
  summary: 'summary',
  joints: 'joint',
  a: 'first part',
  b: 'second part',
  partId: 'choice of part',
  feature: 'mating feature',
  revisions: 'revisions',
  symptoms: 'symptoms',
  noticed: 'own words',
  cause: 'cause',
  readings: 'reading',
  dimension: 'dimension',
  value: 'value',
  unit: 'unit',
  uncertainty: 'uncertainty',
  fixes: 'fix',
  kind: 'kind',
  permanence: 'permanence',
  why: 'why it helps',
  tools: 'tools',
  materials: 'materials',
  steps: 'steps',
  afterwardsNote: 'note on afterwards',
  acceptance: 'acceptance figure',
  worksheet: 'worksheet',
  photos: 'photo',
  alt: 'alternative text',
  caption: 'caption',
  callouts: 'callout',
  label: 'words',
  sources: 'sources',
  changeNote: 'change note',
};

/** The field's name as a person would say it: `fixes.0.kind` is "Fix 1, kind". */
export function fieldName(path: string): string {
  const words: string[] = [];
  for (const part of path.split('.')) {
    if (/^\d+$/.test(part)) words[words.length - 1] += ` ${Number(part) + 1}`;
    else words.push(names[part] ?? part);
  }
  const name = words.join(', ');
  return name.charAt(0).toUpperCase() + name.slice(1);
}
