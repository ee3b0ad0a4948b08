import { diffArrays } from 'diff';
import type { DifferencePiece } from '../contract/write-ups.js';

/** Beyond so many words put in or taken out, a text counts as written anew; it bounds the time that hostile texts can take. */
const mostChanges = 3000;

/** A figure with its decimals, a word, a line end, other white space, or any one other character. */
const token = /\d+(?:[.,]\d+)*|[\p{L}\p{M}\p{N}_'’]+|\n|[^\S\n]+|[^]/gu;

/**
 * Two texts word by word, figures whole and white space kept: the pieces `same` and `removed` together are `from`, `same` and `added`
 * together are `to`. By the algorithm of Myers (1986), O(length × changes), at most 3000 changes; beyond them all of `from` is
 * removed and all of `to` added. Equal texts give one piece, two empty ones none.
 */
export function wordDifference(from: string, to: string): DifferencePiece[] {
  if (from === to) return piece('same', from);
  const runs = diffArrays(tokensOf(from), tokensOf(to), { maxEditLength: mostChanges });
  if (!runs) return [...piece('removed', from), ...piece('added', to)];
  return runs.map((run) => ({
    kind: run.added ? 'added' : run.removed ? 'removed' : 'same',
    text: run.value.join(''),
  }));
}

function tokensOf(text: string): string[] {
  return text.match(token) ?? [];
}

function piece(kind: DifferencePiece['kind'], text: string): DifferencePiece[] {
  return text === '' ? [] : [{ kind, text }];
}
