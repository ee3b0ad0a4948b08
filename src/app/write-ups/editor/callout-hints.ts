import type { CalloutKind, PhotoPoint } from '../../../../shared/contract/callouts';
import type { EndName } from '../../../../shared/drawing/callout-ends';
import type { CalloutBoard } from './callout-board';

export const endWords: Record<EndName, string> = {
  from: 'Start',
  to: 'End',
  centre: 'Centre',
  edge: 'Edge',
};

const beginnings: Record<CalloutKind, string> = {
  arrow: 'where the arrow begins; its words will stand there',
  ring: 'the middle of the ring',
  dimension: 'where the dimension begins',
};

const endings: Record<CalloutKind, string> = {
  arrow: 'what the arrow points at',
  ring: 'where the ring passes',
  dimension: 'where the dimension ends',
};

/** What to do next on the photo, for pointer and keys alike. */
export function hintFor(board: CalloutBoard): string {
  const tool = board.tool();
  if (board.carried()) return 'Tap where it goes.';
  if (tool && board.started()) return `Now ${endings[tool]}: drag or tap there, or arrow keys and Enter.`;
  if (tool) return `First ${beginnings[tool]}: press there, or arrow keys and Enter.`;
  if (board.isFull()) return 'No more fit on one photo; take one off first.';
  if (board.chosen()) return 'Drag an end, tap it and then its new place, or move it with the arrow keys.';
  return board.callouts().length === 0
    ? 'Choose what to draw.'
    : 'Choose what to draw, or tap what is drawn to change it.';
}

/** A place on the photo as it is read out. */
export function placeWords({ x, y }: PhotoPoint): string {
  return `${Math.round(x * 100)} % across, ${Math.round(y * 100)} % down`;
}
