import type { TextRun } from '../../shared/contract/search.js';

/** Put round matching words by the engine: characters of private use, which no text of the index holds. */
export const hitStart = '\uE000';
export const hitEnd = '\uE001';

/** A text as it goes into the index. */
export function withoutHitMarks(text: string): string {
  return text.replace(/[\uE000\uE001]/g, '');
}

/** A marked text as runs; empty runs are left out. */
export function runsOf(marked: string): TextRun[] {
  return marked.split(/(\uE000[^\uE001]*\uE001?)/).flatMap((piece) => {
    const text = withoutHitMarks(piece);
    return text === '' ? [] : [{ text, hit: piece.startsWith(hitStart) }];
  });
}
