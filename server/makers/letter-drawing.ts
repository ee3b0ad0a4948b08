import sharp from 'sharp';
import type { FitCell, JointPage, JointSidePage } from '../../shared/contract/joints.js';
import type { EditionView } from '../../shared/contract/write-ups.js';
import { drawingSvg } from '../../shared/drawing/drawing-svg.js';
import { drawJoint } from '../../shared/drawing/joint-drawing.js';
import type { FeatureOnHand } from '../../shared/fit/joint-verdict.js';
import { onHand } from '../joints/fit-cell.js';
import type { Attachment } from '../mail/letter.js';

const dotsPerInch = 144;

/**
 * The joint drawn from the consensus of the newest pair of revisions that the write-up holds for, else of the newest pair
 * of which readings tell something; null where no such pair can be drawn.
 */
export function drawingOf(joint: JointPage, view: EditionView): string | null {
  const held = new Set(
    view.joints
      .flatMap(({ a, b }) => [...a.revisions, ...b.revisions])
      .flatMap(({ id, holds }) => (holds ? [id] : [])),
  );
  const known = joint.cells.filter(({ verdict }) => verdict !== 'not-known');
  const cell =
    known.findLast(({ revisionA, revisionB }) => held.has(revisionA) && held.has(revisionB)) ?? known.at(-1);
  return cell ? drawn(joint, cell) : null;
}

function drawn(joint: JointPage, cell: FitCell): string | null {
  const a = side(joint.sideA, cell.revisionA);
  const b = side(joint.sideB, cell.revisionB);
  if (!a || !b) return null;
  const drawing = drawJoint({ kind: joint.kind, a: a.known, b: b.known, nameA: a.name, nameB: b.name });
  return drawing && drawingSvg(drawing, "From the consensus of owners' readings");
}

function side(page: JointSidePage, revisionId: number): { known: FeatureOnHand; name: string } | undefined {
  const entry = page.revisions.find(({ revision }) => revision.id === revisionId);
  if (!entry) return undefined;
  const { attributes, dimensions, revision } = entry;
  return {
    known: onHand({ process: page.process, attributes, dimensions }),
    name: `${page.part.name} ${revision.label}`,
  };
}

/** The drawing as it goes with the letter: to be opened anywhere, and to be scaled without loss. */
export async function attachmentsOf(svg: string): Promise<Attachment[]> {
  const bytes = Buffer.from(svg, 'utf8');
  const png = await sharp(bytes, { density: dotsPerInch }).png().toBuffer();
  return [
    { fileName: 'joint.svg', mediaType: 'image/svg+xml', content: bytes },
    { fileName: 'joint.png', mediaType: 'image/png', content: png },
  ];
}
