import type { EditionContent } from '../../../../shared/contract/edition-content';
import type { EditionText } from './edition-form';
import { same } from '../../../../shared/editions/same';

export type Side = 'mine' | 'theirs';

/** One piece of the text that the two sides say differently; undefined where a side does not have it. */
export interface MergeRow {
  /** `cause`, or `fixes/<key>` for one item of a list. */
  id: string;
  field: PieceField;
  mine: unknown;
  theirs: unknown;
  /** What is taken unless somebody chooses otherwise: the side that changed it, and mine where both did. */
  choice: Side;
  /** Both sides have changed it. */
  disputed: boolean;
}

const wholeFields = ['title', 'summary', 'joints', 'symptoms', 'noticed', 'cause', 'sources'] as const;
const listFields = ['readings', 'fixes', 'photos'] as const;
type ListField = (typeof listFields)[number];
export type PieceField = (typeof wholeFields)[number] | ListField | 'changeNote';

/** The pieces that differ between two texts that both began as `base`, in the order of the form. */
export function mergeRows(base: EditionText, mine: EditionText, theirs: EditionText): MergeRow[] {
  const before = piecesOf(base);
  const here = piecesOf(mine);
  const there = piecesOf(theirs);
  const rows: MergeRow[] = [];
  for (const [id, field] of piecesInOrder(here, there)) {
    const row = { id, field, mine: here.get(id)?.value, theirs: there.get(id)?.value };
    if (same(row.mine, row.theirs)) continue;
    const was = before.get(id)?.value;
    const iChanged = !same(row.mine, was);
    const theyChanged = !same(row.theirs, was);
    rows.push({ ...row, choice: iChanged ? 'mine' : 'theirs', disputed: iChanged && theyChanged });
  }
  return rows;
}

/** The text made of both by the choices; what the sides agree on needs none. Items keep my order, theirs follow. */
export function mergedText(
  mine: EditionText,
  theirs: EditionText,
  rows: readonly Pick<MergeRow, 'id' | 'choice'>[],
): EditionText {
  const choices = new Map(rows.map((row) => [row.id, row.choice]));
  const pick = <T>(id: string, here: T, there: T): T => (choices.get(id) === 'theirs' ? there : here);
  const list = <T>(
    field: ListField,
    keyOf: (item: T) => string,
    here: readonly T[],
    there: readonly T[],
  ): T[] => {
    const left = new Map(here.map((item) => [keyOf(item), item]));
    const right = new Map(there.map((item) => [keyOf(item), item]));
    return [...new Set([...left.keys(), ...right.keys()])].flatMap((key) => {
      const taken = pick(`${field}/${key}`, left.get(key), right.get(key));
      return taken === undefined ? [] : [taken];
    });
  };
  const here = mine.content;
  const there = theirs.content;
  return {
    content: {
      title: pick('title', here.title, there.title),
      summary: pick('summary', here.summary, there.summary),
      joints: pick('joints', here.joints, there.joints),
      symptoms: pick('symptoms', here.symptoms, there.symptoms),
      noticed: pick('noticed', here.noticed, there.noticed),
      cause: pick('cause', here.cause, there.cause),
      readings: list('readings', byKey, here.readings, there.readings),
      fixes: list('fixes', byKey, here.fixes, there.fixes),
      photos: list('photos', byPhoto, here.photos, there.photos),
      sources: pick('sources', here.sources, there.sources),
    },
    changeNote: pick('changeNote', mine.changeNote, theirs.changeNote),
  };
}

interface Piece {
  field: PieceField;
  value: unknown;
}

function piecesOf({ content, changeNote }: EditionText): Map<string, Piece> {
  const pieces = new Map<string, Piece>();
  for (const field of [...wholeFields.slice(0, 6), ...listFields, 'sources'] as const) {
    if (isList(field)) {
      for (const [key, value] of itemsOf(content, field)) pieces.set(`${field}/${key}`, { field, value });
    } else {
      pieces.set(field, { field, value: content[field as (typeof wholeFields)[number]] });
    }
  }
  return pieces.set('changeNote', { field: 'changeNote', value: changeNote });
}

/** Ids with their field, in the order of my form; items that only they have stand at the end of their list. */
function piecesInOrder(here: Map<string, Piece>, there: Map<string, Piece>): [string, PieceField][] {
  const order: PieceField[] = [
    'title',
    'summary',
    'joints',
    'symptoms',
    'noticed',
    'cause',
    ...listFields,
    'sources',
    'changeNote',
  ];
  const all = new Map([...here, ...there].map(([id, piece]) => [id, piece.field]));
  return [...all].sort(([, one], [, other]) => order.indexOf(one) - order.indexOf(other));
}

function itemsOf(content: EditionContent, field: ListField): [string, unknown][] {
  return field === 'photos'
    ? content.photos.map((photo) => [byPhoto(photo), photo])
    : content[field].map((item) => [byKey(item), item]);
}

function isList(field: string): field is ListField {
  return (listFields as readonly string[]).includes(field);
}

function byKey(item: { key: string }): string {
  return item.key;
}

function byPhoto(photo: { photoId: number }): string {
  return String(photo.photoId);
}
