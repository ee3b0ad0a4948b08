import {
  emptyInputs,
  OwnPiece,
  worksheetSchemas,
  worksheetVersion,
  type WorksheetInputs,
  type WorksheetKind,
} from './worksheet.js';

/** Inputs as they stand in fields and in an address: figures as typed, lists as lists. */
export type Texts<I> = { [K in keyof I]: I[K] extends readonly unknown[] ? readonly string[] : string };
export type WorksheetTexts<K extends WorksheetKind> = Texts<WorksheetInputs[K]>;

/** One value, or several of one name, as a query gives them. */
export type QueryValues = Readonly<Record<string, string | readonly string[] | undefined>>;

export interface ReadInputs<K extends WorksheetKind> {
  readonly inputs: WorksheetInputs[K];
  /** Fields that hold something which is not a number; they count as empty in `inputs`. */
  readonly notNumbers: readonly string[];
}

/** The figure in a text: point or comma for decimals, spaces at the ends left out. Null for an empty text, NaN for no number. */
export function figureIn(text: string): number | null {
  const trimmed = text.trim().replace(',', '.').replace('−', '-');
  if (trimmed === '') return null;
  return /^[-+]?(\d+\.?\d*|\.\d+)$/.test(trimmed) ? Number(trimmed) : NaN;
}

/** Texts of inputs, to fill a form with. */
export function textsOf<K extends WorksheetKind>(inputs: WorksheetInputs[K]): WorksheetTexts<K> {
  const texts = Object.entries(inputs).map(([name, value]: [string, unknown]) => [name, textOf(name, value)]);
  return Object.fromEntries(texts) as WorksheetTexts<K>;
}

/** Texts of an address: what it leaves out is as in an empty sheet; a word that is not known is left out too. */
export function textsOfQuery<K extends WorksheetKind>(kind: K, query: QueryValues): WorksheetTexts<K> {
  const texts: Record<string, string | readonly string[]> = { ...textsOf<K>(emptyInputs[kind]) };
  const shape = worksheetSchemas[kind].shape as Record<
    string,
    { safeParse(value: unknown): { success: boolean } }
  >;
  for (const [name, fallback] of Object.entries(texts)) {
    const given = query[name];
    if (given === undefined) continue;
    if (typeof fallback !== 'string') {
      const list = (typeof given === 'string' ? [given] : given).filter((entry) => entry !== '');
      if (shape[name]!.safeParse(list.map((entry) => valueIn(name, entry))).success) texts[name] = list;
    } else {
      const word = typeof given === 'string' ? given : (given[0] ?? '');
      if (isFigure(kind, name) || shape[name]!.safeParse(word).success) texts[name] = word.slice(0, 400);
    }
  }
  return texts as WorksheetTexts<K>;
}

/** Inputs that the texts of a form or an address stand for. Never throws. */
export function readInputs<K extends WorksheetKind>(kind: K, texts: WorksheetTexts<K>): ReadInputs<K> {
  const notNumbers: string[] = [];
  const inputs = Object.entries(texts).map(([name, text]: [string, string | readonly string[]]) => {
    if (typeof text !== 'string') return [name, text.map((entry) => valueIn(name, entry))];
    if (!isFigure(kind, name)) return [name, text];
    const figure = figureIn(text);
    if (figure === null || Number.isFinite(figure)) return [name, figure];
    notNumbers.push(name);
    return [name, null];
  });
  return { inputs: Object.fromEntries(inputs) as WorksheetInputs[K], notNumbers };
}

/** Query of a sheet's address: its version and whatever differs from an empty sheet. */
export function queryOf<K extends WorksheetKind>(
  kind: K,
  texts: Partial<WorksheetTexts<K>>,
): Record<string, string | string[]> {
  const empty = textsOf<K>(emptyInputs[kind]) as Record<string, string | readonly string[]>;
  const query: Record<string, string | string[]> = { v: String(worksheetVersion) };
  for (const [name, text] of Object.entries(texts) as [string, string | readonly string[] | undefined][]) {
    if (text === undefined || String(text) === String(empty[name])) continue;
    // An emptied list has to be told apart from one that was never touched.
    query[name] = typeof text === 'string' ? text : text.length > 0 ? [...text] : [''];
  }
  return query;
}

/** Address of a sheet with these inputs, from the site's root. */
export function worksheetAddress<K extends WorksheetKind>(
  kind: K,
  inputs: Partial<WorksheetInputs[K]>,
): string {
  const query = queryOf(kind, textsOf<K>({ ...emptyInputs[kind], ...inputs }));
  const parameters = new URLSearchParams();
  for (const [name, text] of Object.entries(query))
    for (const one of typeof text === 'string' ? [text] : text) parameters.append(name, one);
  return `/worksheets/${kind}?${parameters.toString()}`;
}

/** Own stock in an address: "1.48~0.01~2~strip of tin", the name last; no count stands for as many as wanted. */
export function ownPieceText(piece: OwnPiece): string {
  return [piece.thickness, piece.uncertainty, piece.available ?? '', piece.name].join('~');
}

/** The piece that such a text stands for; null where it stands for none. */
export function ownPieceIn(text: string): OwnPiece | null {
  const [thickness, uncertainty, available, ...name] = text.split('~');
  const parsed = OwnPiece.safeParse({
    thickness: figureIn(thickness ?? ''),
    uncertainty: figureIn(uncertainty ?? ''),
    available: figureIn(available ?? ''),
    name: name.join('~'),
  });
  return parsed.success ? parsed.data : null;
}

function isFigure(kind: WorksheetKind, name: string): boolean {
  const empty = (emptyInputs[kind] as Record<string, unknown>)[name];
  return empty === null || typeof empty === 'number';
}

function valueIn(name: string, text: string): unknown {
  return name === 'own' ? ownPieceIn(text) : text;
}

function textOf(name: string, value: unknown): string | readonly string[] {
  if (name === 'own') return (value as readonly OwnPiece[]).map(ownPieceText);
  if (Array.isArray(value)) return value as string[];
  return value === null ? '' : String(value);
}
