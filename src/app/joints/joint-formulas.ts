import type { JointKind } from '../../../shared/fit/joint-kinds';

const normal = 'chance = Φ(margin ÷ u), with u² the sum of the squares of both uncertainties';

/** How the verdict of each kind of joint is worked out, in one or two lines. */
export const jointFormulas: Record<JointKind, readonly string[]> = {
  'boss-recess': [
    'clearance = diameter of the recess − diameter of the boss; depth to spare = depth of the recess − height of the boss',
    `${normal}; the chance to seat is that of both together`,
    'gap = height of the boss where it does not enter, height − depth where it bottoms; tilt = asin(gap ÷ length from the rim to the far edge)',
  ],
  'barrel-bore': [
    'clearance = diameter of the bore − diameter of the barrel; depth to spare = depth of the bore − length of the barrel',
    `${normal}; the chance to seat is that of both together`,
  ],
  'thread-pair': [
    'diameter, pitch and sex have to go together; depth to spare = depth of the female thread − length of the male one',
    normal,
  ],
  'hole-pattern': [
    'play = (diameter of the hole − diameter of the screw) ÷ 2 − half the difference of the circles',
    normal,
  ],
  'barrel-clamp': [
    'margin = distance from the barrel to the nearer end of the ring’s range, open to closed',
    normal,
  ],
  'shaft-bore': [
    'clearance = diameter of the bore − diameter of the shaft; the same across the flat or key',
    normal,
  ],
  dovetail: ['margin = opening of the clamp − width of the bar, both at the bar’s reference height', normal],
  envelope: [
    'margin = room in radius or in height, whichever is larger; where both overlap, the angles both fill must not',
    normal,
  ],
};
