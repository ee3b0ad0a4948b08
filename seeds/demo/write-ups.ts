import type { DemoWriteUp } from './write-up-shape.js';
import { beltBracketWriteUps } from './write-ups/belt-bracket.js';
import { cameraWriteUps } from './write-ups/cameras.js';
import { clampWriteUps } from './write-ups/clamps.js';
import { dewWriteUps } from './write-ups/dew.js';
import { footWriteUps } from './write-ups/feet-and-warmth.js';
import { motorWriteUps } from './write-ups/motors.js';
import { ringGearWriteUps } from './write-ups/ring-gear.js';
import { seatWriteUps } from './write-ups/seats-and-bores.js';
import { shaftWriteUps } from './write-ups/shafts-and-plates.js';
import { spacerWriteUps } from './write-ups/spacers.js';
import { openEditions, unpublishedWriteUps } from './write-ups/unpublished.js';

const published = [
  ...beltBracketWriteUps,
  ...ringGearWriteUps,
  ...motorWriteUps,
  ...clampWriteUps,
  ...dewWriteUps,
  ...spacerWriteUps,
  ...cameraWriteUps,
  ...shaftWriteUps,
  ...seatWriteUps,
  ...footWriteUps,
];

/** Every write-up of the demo, by topic. */
export const demoWriteUps: readonly DemoWriteUp[] = [
  ...published.map((writeUp) => {
    const open = openEditions[writeUp.slug ?? ''];
    return open ? { ...writeUp, later: [...writeUp.later, open] } : writeUp;
  }),
  ...unpublishedWriteUps,
];
