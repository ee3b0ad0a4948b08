import { emptyContent, type EditionContent, type Fix } from '../../../../shared/contract/edition-content';
import { keyed } from '../../../../shared/editions/edition-shape';
import { orderStep, type MergeRow } from '../../../../shared/editions/merge-editions';
import type { EditionText } from '../../../../shared/editions/edition-text';
import { fieldsOf, type ContentNames } from '../../../../shared/text/edition-fields';
import { fieldName } from './field-names';

/** Members that are written in words, by whether they take several lines. */
const written: Record<string, 'line' | 'passage'> = {
  title: 'line',
  summary: 'line',
  noticed: 'passage',
  cause: 'passage',
  sources: 'passage',
  changeNote: 'line',
  why: 'passage',
  text: 'passage',
  alt: 'line',
  caption: 'line',
  afterwardsNote: 'line',
  feature: 'line',
};

/** How a piece is written, where somebody can make one text of both by hand; null for figures, choices and whole items. */
export function waysToWrite(row: MergeRow): 'line' | 'passage' | null {
  const member = row.path.at(-1) ?? '';
  const isText = typeof row.mine === 'string' && typeof row.theirs === 'string';
  return isText && Object.hasOwn(written, member) ? written[member]! : null;
}

/** One side of a piece in words, so that two can be read side by side; null where that side does not have it. */
export function wordsOfPiece(
  path: readonly string[],
  value: unknown,
  texts: readonly EditionText[],
  names: ContentNames,
): string | null {
  if (value === undefined) return null;
  const [, list, , member = '', , inner] = path;
  if (path.at(-1) === orderStep) return wordsOfOrder(path.slice(0, -1), value as string[], texts, names);
  if (typeof value === 'string' && Object.hasOwn(written, path.at(-1) ?? '')) return value;
  if (list === 'symptoms') return names.symptom(String(value));
  if (list === 'joints') return wordsOfJoint(value, names);
  if (list === 'fixes' && path.length > 3) return wordsOfFixMember(member, inner, value, names);
  if (list === 'photos' && path.length > 3) {
    const whole = path.length > 4 ? [value] : value;
    return wordsOf({ photos: [{ photoId: 0, alt: '', caption: '', callouts: [], [member]: whole }] }, names);
  }
  return wordsOf({ [list ?? '']: [value] }, names);
}

/** What a piece is called: "Fix “Coin behind the plate”, step 2, text". */
export function nameOfPiece(
  path: readonly string[],
  texts: readonly EditionText[],
  names: ContentNames,
): string {
  const [top = '', list = '', key = '', member, ...inner] = path;
  if (top !== 'content') return fieldName(top);
  const order = path.at(-1) === orderStep ? ['order'] : [];
  const item = <T>(of: (content: EditionContent) => readonly T[], keyOf: (one: T) => string): T | undefined =>
    texts
      .map(({ content }) => keyed(of(content), keyOf as (one: unknown) => string).get(key))
      .find((found) => found !== undefined) as T | undefined;
  const named = (word: string, name: string | undefined, ...more: (string | undefined)[]): string =>
    [name ? `${word} “${name}”` : word, ...more.filter((step) => step !== undefined), ...order].join(', ');

  if (list === 'fixes') {
    const fix = item(
      ({ fixes }) => fixes,
      (one: Fix) => one.key,
    );
    const step = member === 'steps' ? placeOf(inner[0], fix, texts) : undefined;
    return named(
      'Fix',
      fix?.title,
      step ?? (member && lower(fieldName(member))),
      step && lastOf(inner.slice(1)),
    );
  }
  if (list === 'readings') {
    return named(
      'Reading',
      item(
        ({ readings }) => readings,
        (one) => one.key,
      )?.dimension,
    );
  }
  if (list === 'photos') {
    const photo = item(
      ({ photos }) => photos,
      (one) => String(one.photoId),
    );
    return named('Photo', photo?.alt, member && lower(fieldName(member)));
  }
  if (list === 'joints') {
    const parts = key.split('-').map((id) => (/^\d+$/.test(id) ? names.part(Number(id)) : 'no part'));
    return named(
      'Joint',
      order.length > 0 ? undefined : parts.join(' and '),
      lastOf(member ? [member, ...inner] : []),
    );
  }
  return named(fieldName(list), undefined);
}

function wordsOfOrder(
  path: readonly string[],
  keys: readonly string[],
  texts: readonly EditionText[],
  names: ContentNames,
): string {
  const isNamed = ['fixes', 'readings', 'photos', 'joints', 'steps'].includes(path.at(-1) ?? '');
  const nameOf = (key: string): string => {
    if (path.at(-1) === 'symptoms') return names.symptom(key);
    return isNamed ? nameOfPiece([...path, key], texts, names) : key;
  };
  return keys.map((key, index) => `${index + 1}. ${nameOf(key)}`).join('\n');
}

function placeOf(
  key: string | undefined,
  fix: Fix | undefined,
  texts: readonly EditionText[],
): string | undefined {
  if (key === undefined || key === orderStep) return undefined;
  const lists = texts.map(({ content }) => content.fixes.find((one) => one.key === fix?.key)?.steps ?? []);
  const place = lists.map((steps) => steps.findIndex((step) => step.key === key)).find((at) => at >= 0);
  return `step ${(place ?? 0) + 1}`;
}

/** The last member of a path that has a name of its own. */
function lastOf(path: readonly string[]): string | undefined {
  const member = path.filter((step) => step !== orderStep && !/^\d+$/.test(step)).at(-1);
  return member && lower(fieldName(member));
}

function lower(words: string): string {
  return words.charAt(0).toLowerCase() + words.slice(1);
}

function wordsOfJoint(value: unknown, names: ContentNames): string {
  const mark = value as { revisionId?: number; holds?: boolean };
  if (mark.revisionId === undefined) return wordsOf({ joints: [value] }, names);
  return `${mark.holds ? 'holds for' : 'not for'} ${names.revision(mark.revisionId)}`;
}

function wordsOfFixMember(
  member: string,
  inner: string | undefined,
  value: unknown,
  names: ContentNames,
): string {
  if (inner === 'photoId') return value === null ? '' : names.photo(value as number);
  // Items that are nothing but a name come alone, a step as it is; all else is the member itself.
  const whole = ['tools', 'materials', 'steps', 'revisionIds', 'afterwards'].includes(member)
    ? [value]
    : value;
  return wordsOf({ fixes: [{ ...emptyFix, [member]: whole }] }, names);
}

function wordsOf(content: Record<string, unknown>, names: ContentNames): string {
  return fieldsOf({ ...emptyContent, ...content } as EditionContent, names)
    .map((field) => field.text)
    .filter((text) => text !== '')
    .join('\n');
}

const emptyFix: Fix = {
  key: '',
  title: '',
  kind: null,
  permanence: null,
  why: '',
  tools: [],
  materials: [],
  steps: [],
  revisionIds: [],
  afterwards: [],
  afterwardsNote: '',
  acceptance: null,
  worksheet: null,
};
