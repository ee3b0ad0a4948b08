export type FilterToken =
  | { readonly kind: 'word'; readonly text: string; readonly quoted: boolean; readonly at: number }
  | { readonly kind: 'sign'; readonly text: string; readonly at: number };

/** A filter that cannot be read; the caller gives it the error code of its route. */
export class FilterSyntaxError extends Error {}

const pattern =
  /\s+|(?<sign>!=|>=|<=|[=<>()[\],])|(?<quoted>"(?:[^"\\]|\\.)*"|'(?:[^'\\]|\\.)*')|(?<word>[^\s=<>()[\],'"!]+)|(?<other>.)/gsu;

/** Cuts a filter into words, quoted words and signs. Throws at a quote that is never closed. */
export function filterTokens(source: string): FilterToken[] {
  const tokens: FilterToken[] = [];
  for (const match of source.matchAll(pattern)) {
    const at = match.index;
    const { sign, quoted, word, other } = match.groups ?? {};
    if (sign !== undefined) tokens.push({ kind: 'sign', text: sign, at });
    else if (quoted !== undefined) {
      tokens.push({ kind: 'word', text: quoted.slice(1, -1).replace(/\\(.)/gsu, '$1'), quoted: true, at });
    } else if (word !== undefined) tokens.push({ kind: 'word', text: word, quoted: false, at });
    else if (other !== undefined) throw new FilterSyntaxError(strayText(other, at, source));
  }
  return tokens;
}

function strayText(character: string, at: number, source: string): string {
  const place = `${at + 1}:${source.length + 1}`;
  if (character === '"' || character === "'") {
    return `Expression \`${source.slice(at, at + 40)}\` is missing the following closing delimiter: \`${character}\`. ${place}`;
  }
  return `Unexpected character \`${character}\` at ${place}.`;
}
