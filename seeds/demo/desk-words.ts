import type { FlagGround } from '../../shared/contract/flags.js';

export interface DemoFlag {
  readonly by: string;
  readonly ground: FlagGround;
  readonly line: string;
  readonly hoursAgo: number;
}

/** What members told the desk: of a trial, then of a write-up. */
export const demoFlags: readonly (readonly DemoFlag[])[] = [
  [
    {
      by: 'owner',
      ground: 'wrong',
      line: 'They tried it on a bracket from another batch, as their own reading shows.',
      hoursAgo: 52,
    },
    {
      by: 'author',
      ground: 'wrong',
      line: 'The figure is in minutes of arc, not in degrees; it cannot have passed.',
      hoursAgo: 30,
    },
  ],
  [
    {
      by: 'owner',
      ground: 'unsafe',
      line: 'Nothing says that the motor must be unplugged before the plate comes off.',
      hoursAgo: 14,
    },
  ],
];
