/** Symptoms in owners' words, by group; the slug is what addresses and write-ups carry. */
const groups: Record<string, Record<string, string>> = {
  'Sits badly': {
    'plate-rocks': 'The plate rocks when I press its corners',
    'plate-tilts': 'The plate ends up tilted when the screws are tight',
    'gap-under-plate': 'There is a gap under the plate',
    'lip-does-not-enter': 'A lip or boss will not go into its recess',
    'screws-do-not-line-up': 'The screws do not line up with the holes',
    'screw-bottoms': 'A screw bottoms before it clamps',
    'bottoms-early': 'It stops before its shoulder seats',
    'too-loose-in-bore': 'It is loose in its bore',
    'will-not-go-in': 'It will not go in at all',
    'thread-binds': 'The thread binds or grinds',
    'thread-stuck': 'The ring is stuck and will not unscrew',
    'fouls-clamp-screw': 'It hits a clamp screw as it turns',
    'fouls-tube': 'It hits the tube or another part',
    'cable-in-the-way': 'A cable or plug is in the way',
  },
  Drive: {
    'belt-slips': 'The belt slips or jumps teeth',
    'belt-slips-one-way': 'The belt slips in one direction only',
    'belt-walks-off': 'The belt walks off the pulley',
    'belt-squeaks': 'The belt squeaks or hums',
    'cannot-tension': 'The slot ends before the belt is tight',
    'gear-skips': 'The gear skips under load',
    'gear-grinds': 'The gears grind or bind once a turn',
    'backlash-large': 'Too much backlash',
    'backlash-changes': 'Backlash changes along the travel',
    'motor-stalls': 'The motor stalls or loses steps',
    'motor-stalls-cold': 'The motor stalls in the cold',
    'pinion-slips': 'The pinion or pulley slips on the shaft',
    'motor-turns-focus-does-not': 'The motor turns but the focus does not move',
    'drive-noisy': 'The drive got noisy',
  },
  'Stars and focus': {
    'stars-long-in-corner': 'Stars are long in one corner',
    'stars-long-all-corners': 'Stars are long in all corners',
    'stars-triangular': 'Stars are triangular or have spikes',
    'focus-drifts': 'Focus drifts through the night',
    'focus-run-fails': 'Focus runs fail or give odd curves',
    'focus-shifts-on-slew': 'Focus shifts when the telescope slews',
    'wont-reach-focus': 'It does not reach focus',
    'image-shifts': 'The image shifts when focus reverses',
    'star-trails-guiding-good': 'Stars trail although guiding looks good',
    vignetting: 'Corners are dark',
    'flats-do-not-match': 'Flats no longer match',
    'reflection-halo': 'Halos or reflections round bright stars',
  },
  'Holds badly': {
    'slips-when-pointing-up': 'Focus slides when pointing up',
    'tube-slides': 'The tube slides in its rings',
    'foot-works-loose': 'The foot works loose',
    'rotates-by-itself': 'The camera turns by itself',
    'lock-screw-dents': 'The lock screw dents what it holds',
    'part-creeps': 'A printed part has crept out of shape',
    rattles: 'Something rattles',
  },
  'Dew and heat': {
    'dew-on-lens': 'Dew on the lens although the heater is on',
    'heater-cold-spot': 'The heater has a cold spot',
    'heater-does-not-close': 'The strip does not close round the tube',
    'supply-cuts-out': 'The supply cuts out with the heater on',
    'plume-on-stars': 'Stars boil when the heater is high',
  },
};

export interface DemoSymptom {
  readonly slug: string;
  readonly label: string;
  readonly group: string;
}

export const demoSymptoms: readonly DemoSymptom[] = Object.entries(groups).flatMap(([group, items]) =>
  Object.entries(items).map(([slug, label]) => ({ slug, label, group })),
);
