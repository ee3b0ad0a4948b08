import { heldJoints } from './joints/held.js';
import type { DemoJoint } from './joints/joint-shape.js';
import { screwedJoints } from './joints/screwed.js';
import { seatJoints } from './joints/seats.js';

/** The joints of the demo, by kind. */
export const demoJoints: readonly DemoJoint[] = [...seatJoints, ...screwedJoints, ...heldJoints];
