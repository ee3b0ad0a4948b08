import { covers } from '../storage/attributes.js';
import type { Document } from '../storage/flatten.js';
import { formatText, type Crop, type Tags } from './format-text.js';
import type { TextMatcher } from './text-matches.js';

export interface Formatting {
  readonly highlight: readonly string[];
  readonly tags: Tags;
  /** Attributes to crop with their numbers of words. */
  readonly crop: readonly { readonly attribute: string; readonly words: number }[];
  readonly marker: string;
}

export interface BytePosition {
  readonly start: number;
  readonly length: number;
  readonly indices?: readonly number[];
}

/** A document as it is shown in `_formatted`: numbers as texts, matches tagged, long texts cropped. */
export function formatDocument(document: Document, matcher: TextMatcher, formatting: Formatting): Document {
  const format = (value: unknown, path: string): unknown => {
    if (typeof value === 'string' || typeof value === 'number') return formatted(String(value), path);
    if (Array.isArray(value)) return value.map((each) => format(each, path));
    if (typeof value !== 'object' || value === null) return value;
    return Object.fromEntries(
      Object.entries(value).map(([key, each]) => [key, format(each, path === '' ? key : `${path}.${key}`)]),
    );
  };
  const formatted = (text: string, path: string): string => {
    const tags = formatting.highlight.some((each) => covers(each, path)) ? formatting.tags : undefined;
    const crop = cropFor(path, formatting);
    return tags || crop ? formatText(text, matcher.matches(text), crop, tags) : text;
  };
  return format(document, '') as Document;
}

function cropFor(path: string, { crop, marker }: Formatting): Crop | undefined {
  const found =
    crop.find(({ attribute }) => attribute === path) ?? crop.find(({ attribute }) => covers(attribute, path));
  return found && { words: found.words, marker };
}

/** Where the matches stand, per path, in bytes of UTF-8; `indices` names the element inside arrays. */
export function matchesPosition(document: Document, matcher: TextMatcher): Record<string, BytePosition[]> {
  const positions = new Map<string, BytePosition[]>();
  const visit = (value: unknown, path: string, indices: readonly number[]): void => {
    if (typeof value === 'string' || typeof value === 'number') {
      const text = String(value);
      const found = matcher.matches(text).map(({ start, end }) => ({
        start: Buffer.byteLength(text.slice(0, start)),
        length: Buffer.byteLength(text.slice(start, end)),
        ...(indices.length > 0 ? { indices } : {}),
      }));
      if (found.length > 0) positions.set(path, [...(positions.get(path) ?? []), ...found]);
    } else if (Array.isArray(value)) value.forEach((each, place) => visit(each, path, [...indices, place]));
    else if (typeof value === 'object' && value !== null) {
      for (const [key, each] of Object.entries(value))
        visit(each, path === '' ? key : `${path}.${key}`, indices);
    }
  };
  visit(document, '', []);
  return Object.fromEntries(positions);
}
