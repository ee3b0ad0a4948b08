import { z } from 'zod';

/** Who somebody is to the site. A visitor has no account. */
export const roles = ['visitor', 'member', 'maker', 'moderator', 'administrator'] as const;
export const Role = z.enum(roles);
export type Role = z.infer<typeof Role>;

/** Roles an account can have. */
export const AccountRole = z.enum(['member', 'maker', 'moderator', 'administrator']);
export type AccountRole = z.infer<typeof AccountRole>;

export const PartKind = z.enum([
  'telescope',
  'focuser',
  'focus-motor',
  'motor-bracket',
  'gear-kit',
  'belt-kit',
  'spacer',
  'clamp',
  'guide-scope-foot',
  'dew-heater',
  'camera',
  'corrector',
  'filter-wheel',
  'rotator',
]);
export type PartKind = z.infer<typeof PartKind>;
export const partKindWords: Record<PartKind, string> = {
  telescope: 'telescope',
  focuser: 'focuser',
  'focus-motor': 'focus motor',
  'motor-bracket': 'motor bracket',
  'gear-kit': 'ring-gear kit',
  'belt-kit': 'belt kit',
  spacer: 'spacer',
  clamp: 'clamp',
  'guide-scope-foot': 'guide-scope foot',
  'dew-heater': 'dew heater',
  camera: 'camera',
  corrector: 'field corrector',
  'filter-wheel': 'filter wheel',
  rotator: 'rotator',
};

/** Mating features of a part. */
export const FeatureKind = z.enum([
  'boss',
  'recess',
  'bore',
  'barrel',
  'thread',
  'hole-pattern',
  'slot',
  'gear',
  'pulley',
  'shaft',
  'dovetail',
  'envelope',
]);
export type FeatureKind = z.infer<typeof FeatureKind>;

export const FixKind = z.enum(['shim', 'trim', 'reposition', 'remake', 'swap', 'adjust']);
export type FixKind = z.infer<typeof FixKind>;
export const fixKindWords: Record<FixKind, { label: string; means: string }> = {
  shim: { label: 'Shim', means: 'fill the gap with something as thick as it' },
  trim: { label: 'Trim', means: 'take material off' },
  reposition: { label: 'Reposition', means: 'turn or move the part to where it clears' },
  remake: { label: 'Remake', means: 'print or machine the part anew with another dimension' },
  swap: { label: 'Swap', means: 'use another revision or another part' },
  adjust: { label: 'Adjust', means: 'set tension, depth or play' },
};

export const Permanence = z.enum(['reversible', 'leaves-a-mark', 'permanent']);
export type Permanence = z.infer<typeof Permanence>;
export const permanenceWords: Record<Permanence, string> = {
  reversible: 'reversible',
  'leaves-a-mark': 'leaves a mark',
  permanent: 'permanent',
};

/** How far a fix is borne out; see shared/fit/standing.ts for the rule. */
export const Standing = z.enum(['told', 'tried', 'measured', 'made-right']);
export type Standing = z.infer<typeof Standing>;
export const standingWords: Record<Standing, { label: string; means: string }> = {
  told: { label: 'told', means: 'nobody but the author has tried it' },
  tried: { label: 'tried', means: 'others have tried it' },
  measured: { label: 'measured', means: "a trial's numbers pass the acceptance figure" },
  'made-right': { label: 'made right', means: 'the maker has corrected the part' },
};

export const TrialOutcome = z.enum(['held', 'held-for-a-while', 'did-not-help']);
export type TrialOutcome = z.infer<typeof TrialOutcome>;
export const trialOutcomeWords: Record<TrialOutcome, string> = {
  held: 'held',
  'held-for-a-while': 'held for a while',
  'did-not-help': 'did not help',
};

/** Signal words of ANSI Z535.6, from the gravest down. */
export const SignalWord = z.enum(['danger', 'warning', 'caution']);
export type SignalWord = z.infer<typeof SignalWord>;
export const signalWordMeans: Record<SignalWord, string> = {
  danger: 'will cause death or serious injury if not avoided',
  warning: 'could cause death or serious injury if not avoided',
  caution: 'could cause minor or moderate injury if not avoided',
};

/** What a fix disturbs and must be done again. */
export const Afterwards = z.enum([
  'camera-angle',
  'flats',
  'balance',
  'collimation',
  'back-focus',
  'focus-offsets',
]);
export type Afterwards = z.infer<typeof Afterwards>;
export const afterwardsWords: Record<Afterwards, string> = {
  'camera-angle': 'camera angle',
  flats: 'flats',
  balance: 'balance',
  collimation: 'collimation',
  'back-focus': 'back focus',
  'focus-offsets': 'focus offsets',
};

export const ReadingUnit = z.enum(['mm', 'in', 'um', 'deg', 'arcmin', 'steps', 'N']);
export type ReadingUnit = z.infer<typeof ReadingUnit>;
export const readingUnitSymbols: Record<ReadingUnit, string> = {
  mm: 'mm',
  in: 'in',
  um: 'µm',
  deg: '°',
  arcmin: '′',
  steps: 'steps',
  N: 'N',
};

export const Instrument = z.enum([
  'caliper',
  'micrometer',
  'ruler',
  'feeler-leaf',
  'print-model',
  'makers-drawing',
  'count',
  'other',
]);
export type Instrument = z.infer<typeof Instrument>;
export const instrumentWords: Record<Instrument, string> = {
  caliper: 'caliper',
  micrometer: 'micrometer',
  ruler: 'ruler',
  'feeler-leaf': 'feeler leaf',
  'print-model': 'print model value',
  'makers-drawing': "maker's drawing",
  count: 'count',
  other: 'other',
};

/** Hazards that a fix's text can name; each wants a caution before publishing. */
export const HazardKind = z.enum([
  'blade',
  'power-tool',
  'dust',
  'solvent',
  'adhesive',
  'heat',
  'lithium-cell',
  'mains',
  'sun',
  'swarf-near-optics',
  'pinch',
  'magnet',
]);
export type HazardKind = z.infer<typeof HazardKind>;
export const hazardKindWords: Record<HazardKind, string> = {
  blade: 'blade',
  'power-tool': 'power tool',
  dust: 'dust',
  solvent: 'solvent',
  adhesive: 'adhesive',
  heat: 'heat',
  'lithium-cell': 'lithium cell',
  mains: 'mains supply',
  sun: 'optics near the Sun',
  'swarf-near-optics': 'swarf near optics or electronics',
  pinch: 'moving gear or belt',
  magnet: 'strong magnet',
};

export const EditionState = z.enum(['draft', 'submitted', 'returned', 'published']);
export type EditionState = z.infer<typeof EditionState>;
export const editionStateWords: Record<EditionState, string> = {
  draft: 'draft',
  submitted: 'on the desk',
  returned: 'returned',
  published: 'published',
};
