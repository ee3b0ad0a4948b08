import type { DemoWriteUp } from './write-up-shape.js';
import { beltBracketWriteUps } from './write-ups/belt-bracket.js';

/** Every write-up of the demo, by topic. */
export const demoWriteUps: readonly DemoWriteUp[] = [...beltBracketWriteUps];
