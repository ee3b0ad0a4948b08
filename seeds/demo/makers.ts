/** Makers of the invented world: slug, name, and what they are about. */
const makers: Record<string, readonly [name: string, about: string]> = {
  'larkfield-optics': [
    'Larkfield Optics',
    'Small refractors with helical focusers, made in batches of two hundred and marked with a batch ring on the lens cell.',
  ],
  'tarn-motion': [
    'Tarn Motion',
    'Stepper focus motors and rigid brackets. Prints the revision on the label under the motor.',
  ],
  'stonebridge-prints': [
    'Stonebridge Prints',
    'Printed brackets, feet and spacers in glass-filled nylon. Revisions are moulded into the underside as dots.',
  ],
  'cotterpin-works': [
    'Cotterpin Works',
    'Ring-gear kits for helical focusers, cut in acetal, with pinions in brass.',
  ],
  'thornapple-drives': ['Thornapple Drives', 'Belt kits and tensioners; sells belts by the tooth.'],
  'dunlin-focus': ['Dunlin Focus', 'Rack and helical focusers and the plates that carry a motor on them.'],
  'hollin-turning': [
    'Hollin Turning',
    'Turned rings, spacers and tilt plates in aluminium; lengths engraved on the rim.',
  ],
  'pallister-wheelworks': [
    'Pallister Wheelworks',
    'Filter wheels and drawers with a printed serial on the lid.',
  ],
  brackwater: ['Brackwater', 'Camera rotators, driven and by hand.'],
  quillback: ['Quillback', 'Cooled imaging cameras and small guide cameras.'],
  emberfell: ['Emberfell', 'Dew strips and heated rings for low-voltage supplies.'],
  'oxbow-clampworks': ['Oxbow Clampworks', 'Ring clamps, dovetail clamps and finder shoes, milled from bar.'],
  'nettlecombe-fittings': ['Nettlecombe Fittings', 'Guide scopes, feet and risers for small set-ups.'],
  'greywether-optics': ['Greywether Optics', 'The Heron refractor and its reducer.'],
};

export interface DemoMaker {
  readonly slug: string;
  readonly name: string;
  readonly about: string;
}

export const demoMakers: readonly DemoMaker[] = Object.entries(makers).map(([slug, [name, about]]) => ({
  slug,
  name,
  about,
}));
