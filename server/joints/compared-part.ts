import type { ComparedPart, FitCheckLine, JointRef } from '../../shared/contract/joints.js';
import type { PairWriteUp } from './joint-write-ups.store.js';

/**
 * One part of the comparison: its lines against what is on the bench, and what owners told of it whatever else they had.
 * `compared` are the parts side by side; a joint between two of them tells nothing about choosing between them.
 */
export function comparedPart(from: {
  part: { id: number; about: string; price: string | null };
  ref: ComparedPart['part'];
  compared: readonly number[];
  lines: readonly FitCheckLine[];
  about: readonly PairWriteUp[];
}): ComparedPart {
  const { part, ref, compared, lines } = from;
  const writeUps = onceEach(from.about.filter(({ partA, partB }) => partA === part.id || partB === part.id));
  const total = (outcome: keyof ComparedPart['trials']): number =>
    writeUps.reduce((sum, writeUp) => sum + writeUp.trials[outcome], 0);
  return {
    part: ref,
    about: part.about,
    price: part.price,
    lines: lines.filter(({ joint }) => isAgainstOthers(joint, part.id, compared)),
    trials: {
      held: total('held'),
      heldForAWhile: total('heldForAWhile'),
      didNotHelp: total('didNotHelp'),
    },
    afterwards: [
      ...new Set(writeUps.flatMap((writeUp) => writeUp.content.fixes.flatMap((fix) => fix.afterwards))),
    ].sort(),
  };
}

function isAgainstOthers(joint: JointRef, partId: number, compared: readonly number[]): boolean {
  if (joint.a.id === partId) return !compared.includes(joint.b.id);
  return joint.b.id === partId && !compared.includes(joint.a.id);
}

/** A write-up with two joints on one part tells its trials once. */
function onceEach(writeUps: readonly PairWriteUp[]): PairWriteUp[] {
  return [...new Map(writeUps.map((writeUp) => [writeUp.writeUpId, writeUp])).values()];
}
