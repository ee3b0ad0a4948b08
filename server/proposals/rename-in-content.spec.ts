import { describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent, type JointSide } from '../../shared/contract/edition-content.js';
import { renameInContent } from './rename-in-content.js';

const side = (partId: number | null, ...revisions: [number, boolean][]): JointSide => ({
  partId,
  feature: 'lip',
  revisions: revisions.map(([revisionId, holds]) => ({ revisionId, holds })),
});
const renamed = { parts: new Map([[1, 9]]), revisions: new Map([[11, 91]]) };
const rename = (over: Partial<EditionContent>) => renameInContent({ ...emptyContent, ...over }, renamed);

describe('parts and revisions in the text of an edition', () => {
  it('get their new identities in joints, readings and fixes, and nothing else changes', () => {
    const content = {
      ...emptyContent,
      title: 'Part 1, revision 11',
      joints: [{ a: side(1, [11, true], [12, false]), b: side(2, [21, true]) }],
      readings: [
        { revisionId: 11, key: 'reading-1' },
        { revisionId: null, key: 'reading-2' },
      ],
      fixes: [{ key: 'fix-00011', revisionIds: [11, 21] }],
    } as unknown as EditionContent;
    expect(renameInContent(content, renamed)).toEqual({
      ...content,
      joints: [{ a: side(9, [91, true], [12, false]), b: side(2, [21, true]) }],
      readings: [
        { revisionId: 91, key: 'reading-1' },
        { revisionId: null, key: 'reading-2' },
      ],
      fixes: [{ key: 'fix-00011', revisionIds: [91, 21] }],
    });
  });

  it('are marked once where two become one, and hold where either did', () => {
    const { joints } = rename({ joints: [{ a: side(1, [91, false], [11, true]), b: side(null) }] });
    expect(joints[0]!.a).toEqual(side(9, [91, true]));
  });

  it('are named once by a fix that named both', () => {
    const fixes = [{ revisionIds: [91, 11] }] as EditionContent['fixes'];
    expect(rename({ fixes }).fixes[0]!.revisionIds).toEqual([91]);
  });
});
