import type { FeatureKind } from '../contract/vocabulary.js';

/** One dimension that a feature of a kind can have. */
export interface DimensionSpec {
  readonly name: string;
  readonly label: string;
  readonly unit: 'mm' | 'deg' | 'count';
  /** How to read it on the bench, in one sentence. */
  readonly howTo: string;
}

/** Something about a feature that is named rather than measured. */
export interface AttributeSpec {
  readonly name: string;
  readonly label: string;
  /** Absent: free text. */
  readonly options?: readonly string[];
}

export interface FeatureSpec {
  readonly label: string;
  readonly dimensions: readonly DimensionSpec[];
  readonly attributes: readonly AttributeSpec[];
}

const jaws = 'Caliper across the outside at three turns of 60°; enter each as a repeat.';
const points =
  "Caliper's inner jaws at three turns of 60°; keep them square to the axis and take the largest of each turn.";
const depthRod = "Caliper's depth rod from the face, at three places.";

const envelope: readonly DimensionSpec[] = [
  {
    name: 'innerRadius',
    label: 'inner radius',
    unit: 'mm',
    howTo: 'Half the caliper reading across the axis to the nearest edge, or distance from the axis.',
  },
  {
    name: 'outerRadius',
    label: 'outer radius',
    unit: 'mm',
    howTo: 'Distance from the axis to the farthest edge; half of it where both sides can be spanned.',
  },
  {
    name: 'bottom',
    label: 'bottom above the joint face',
    unit: 'mm',
    howTo: 'Depth rod from the joint face to the nearest edge; below the face counts negative.',
  },
  {
    name: 'top',
    label: 'top above the joint face',
    unit: 'mm',
    howTo: 'Depth rod from the joint face to the farthest edge.',
  },
  {
    name: 'angle',
    label: 'middle, angle round the axis',
    unit: 'deg',
    howTo: 'Protractor from the mark both parts share, counter-clockwise seen from the sky.',
  },
  {
    name: 'width',
    label: 'angle it fills',
    unit: 'deg',
    howTo: 'Protractor between its two edges, seen along the axis.',
  },
];

/** Dimension set of each kind of feature. */
export const featureSpecs: Record<FeatureKind, FeatureSpec> = {
  boss: {
    label: 'boss',
    dimensions: [
      { name: 'diameter', label: 'outer diameter', unit: 'mm', howTo: jaws },
      { name: 'height', label: 'height', unit: 'mm', howTo: depthRod },
      {
        name: 'plateWidth',
        label: 'width of the plate round it',
        unit: 'mm',
        howTo: 'Caliper across the plate where it is narrowest.',
      },
    ],
    attributes: [],
  },
  recess: {
    label: 'recess',
    dimensions: [
      { name: 'diameter', label: 'inner diameter', unit: 'mm', howTo: points },
      { name: 'depth', label: 'depth', unit: 'mm', howTo: depthRod },
      { name: 'outerDiameter', label: 'outer diameter of its wall', unit: 'mm', howTo: jaws },
    ],
    attributes: [],
  },
  bore: {
    label: 'bore',
    dimensions: [
      { name: 'diameter', label: 'inner diameter (split ring: screw slack)', unit: 'mm', howTo: points },
      {
        name: 'closedDiameter',
        label: 'inner diameter with the split closed',
        unit: 'mm',
        howTo: 'Close the split by hand on an undersized rod, then as for the bore.',
      },
      { name: 'depth', label: 'depth', unit: 'mm', howTo: depthRod },
      {
        name: 'driveSize',
        label: 'across the flat, or width of the keyway',
        unit: 'mm',
        howTo: 'Inner jaws from the flat to the far wall; a keyway across its width.',
      },
    ],
    attributes: [{ name: 'form', label: 'form', options: ['round', 'flat', 'key'] }],
  },
  barrel: {
    label: 'barrel',
    dimensions: [
      { name: 'diameter', label: 'outer diameter', unit: 'mm', howTo: jaws },
      { name: 'length', label: 'length', unit: 'mm', howTo: depthRod },
    ],
    attributes: [],
  },
  thread: {
    label: 'thread',
    dimensions: [
      {
        name: 'length',
        label: 'length (male) or depth (female)',
        unit: 'mm',
        howTo: 'Depth rod or caliper from the shoulder to the end of the thread.',
      },
    ],
    attributes: [
      { name: 'designation', label: 'designation, such as M48x0.75' },
      { name: 'sex', label: 'sex', options: ['male', 'female'] },
    ],
  },
  'hole-pattern': {
    label: 'hole pattern',
    dimensions: [
      {
        name: 'circle',
        label: 'circle through the hole centres',
        unit: 'mm',
        howTo: 'Inner jaws across two opposite holes, near edge to near edge, plus one hole diameter.',
      },
      { name: 'holeDiameter', label: 'hole diameter', unit: 'mm', howTo: points },
      {
        name: 'slotTravel',
        label: 'travel of the slot',
        unit: 'mm',
        howTo: "Slot's length minus its width.",
      },
      { name: 'count', label: 'count of holes', unit: 'count', howTo: 'Count them.' },
    ],
    attributes: [
      { name: 'screw', label: 'screw', options: ['M2', 'M2.5', 'M3', 'M4', 'M5', 'M6', 'M8'] },
      { name: 'slotAlong', label: 'slots run along', options: ['radius', 'circle'] },
    ],
  },
  slot: {
    label: 'slot',
    dimensions: [
      { name: 'width', label: 'width', unit: 'mm', howTo: "Caliper's inner jaws across it." },
      { name: 'length', label: 'length', unit: 'mm', howTo: "Caliper's inner jaws along it." },
    ],
    attributes: [],
  },
  gear: {
    label: 'gear',
    dimensions: [
      {
        name: 'module',
        label: 'module',
        unit: 'mm',
        howTo: 'Outer diameter divided by teeth + 2, for a gear without profile shift.',
      },
      { name: 'teeth', label: 'teeth', unit: 'count', howTo: 'Mark one tooth and count.' },
      {
        name: 'profileShift',
        label: 'profile shift coefficient',
        unit: 'count',
        howTo: "From the maker's drawing.",
      },
      { name: 'faceWidth', label: 'face width', unit: 'mm', howTo: 'Caliper across the toothed rim.' },
    ],
    attributes: [],
  },
  pulley: {
    label: 'pulley',
    dimensions: [
      { name: 'pitch', label: 'belt pitch', unit: 'mm', howTo: 'Ten teeth of the belt, divided by ten.' },
      { name: 'teeth', label: 'teeth', unit: 'count', howTo: 'Mark one tooth and count.' },
      { name: 'faceWidth', label: 'face width', unit: 'mm', howTo: 'Caliper between the flanges.' },
    ],
    attributes: [],
  },
  shaft: {
    label: 'shaft',
    dimensions: [
      {
        name: 'diameter',
        label: 'diameter',
        unit: 'mm',
        howTo: 'Micrometer or caliper at three turns of 60°, off the flat.',
      },
      {
        name: 'driveSize',
        label: 'across the flat, or width of the key',
        unit: 'mm',
        howTo: 'Caliper from the flat to the far side; a key across its width.',
      },
      { name: 'length', label: 'length', unit: 'mm', howTo: depthRod },
    ],
    attributes: [{ name: 'form', label: 'form', options: ['round', 'flat', 'key'] }],
  },
  dovetail: {
    label: 'dovetail',
    dimensions: [
      {
        name: 'width',
        label: 'width at the reference height',
        unit: 'mm',
        howTo: 'Caliper at the height named; bar outside, clamp inside and fully open.',
      },
      {
        name: 'referenceHeight',
        label: 'reference height above the wide face',
        unit: 'mm',
        howTo: "Depth rod from the wide face to the caliper's jaws.",
      },
      {
        name: 'flankAngle',
        label: 'flank angle',
        unit: 'deg',
        howTo: 'Protractor between wide face and flank.',
      },
    ],
    attributes: [],
  },
  envelope: { label: 'envelope', dimensions: envelope, attributes: [] },
};

/** The dimension of that name of a feature kind, or undefined. */
export function dimensionSpec(kind: FeatureKind, name: string): DimensionSpec | undefined {
  return featureSpecs[kind].dimensions.find((dimension) => dimension.name === name);
}
