/** A question on which nothing is written yet. */
export interface SingleQuestion {
  readonly title: string;
  readonly text: string;
  /** `part:letter`, or the part alone where the asker does not know the revision. */
  readonly parts: readonly string[];
  /** Slugs with blanks between them. */
  readonly symptoms: string;
  readonly reading?: readonly [dimension: string, value: number];
  readonly replies: readonly string[];
}

const ask = (
  title: string,
  text: string,
  parts: string,
  symptoms: string,
  more: { reading?: readonly [string, number]; replies?: readonly string[] } = {},
): SingleQuestion => ({ title, text, parts: parts.split(' '), symptoms, replies: [], ...more });

/** Questions that stand for themselves. */
export const unansweredQuestions: readonly SingleQuestion[] = [
  ask(
    'Belt kit 80 on the older ring, has anybody tried?',
    'My ring is from before the kit. The leaflet names only the newer one, and the teeth look alike. Before I order: does the belt find the same circle?',
    'thornapple-belt-kit-80:A larkfield-wren-80:A',
    'cannot-tension',
    {
      replies: [
        'Count the teeth on the ring and hold a piece of belt against it, it has to lie in all of them.',
      ],
    },
  ),
  ask(
    'M2 gets hot when it only holds',
    'After an hour of holding the case is too warm to touch for long, without having moved. Indoors at twenty degrees. Is that how it should be?',
    'tarn-m2:B',
    'drive-noisy motor-stalls',
    {
      replies: [
        'Is there a setting for the current while holding? Mine is at a third and stays cool.',
        'Warm is usual, too hot to touch is not. I would ask Tarn Motion.',
      ],
    },
  ),
  ask(
    'Dew ring and belt bracket on one short tube',
    'Between lens and focuser there are 92 mm. Ring and bracket each want their place, and the rings of the mount too. In which order did you put them?',
    'emberfell-dew-ring:C stonebridge-belt-bracket:B larkfield-wren-60:C',
    'fouls-tube',
    { reading: ['room between shield and focuser', 92] },
  ),
  ask(
    'Which side does the N2 foot go?',
    'There is a step on one side of the foot and none on the other. In my shoe it goes in both ways and is a little looser in one.',
    'nettlecombe-guide-foot:B oxbow-finder-shoe',
    'foot-works-loose',
    { replies: ['Step against the screw, here.'] },
  ),
  ask(
    'Tilt plate at the very end of its screws',
    'To square the Q26 I need more than the plate has on one side. Shim under the camera, or is something else out?',
    'hollin-tilt-plate:C quillback-q26:A',
    'stars-long-in-corner',
    { replies: ['Something else. Take the plate out and look how bad it is without.'] },
  ),
  ask(
    'Rotator R54: may it be oiled?',
    'It turns by jerks since the winter. The leaflet forbids oil on the track but says nothing of the bearing.',
    'brackwater-r54:C',
    'rotates-by-itself',
  ),
  ask(
    'Ring gear 80 and the reducer, does the rim clear?',
    'The reducer’s flange is wider than the drawtube. I have 3.1 mm between it and the rim at the innermost position, and the kit’s leaflet wants four.',
    'cotterpin-ring-gear-kit-80:B greywether-reducer-08:B',
    'fouls-tube',
    { reading: ['room between flange and rim', 3.1] },
  ),
  ask(
    'Felt or cork in tube ring 70?',
    'Both can be had. One slides and one sticks, they say. What has held for a year or more with you?',
    'larkfield-tube-ring-70:A larkfield-wren-60:D',
    'tube-slides',
    {
      replies: [
        'Felt, and new every second year.',
        'Cork, but sealed with a thin coat of wax or it crumbles.',
      ],
    },
  ),
  ask(
    'G1 comes loose by vibration',
    'On the way to the field it unscrews itself from the micro helical by half a turn. I mark it and turn it back each time.',
    'quillback-g1:C dunlin-micro-helical:B',
    'too-loose-in-bore rattles',
  ),
  ask(
    'Print orientation for a guide foot',
    'I would print the foot again myself. Lying or standing? It has to take the pull of the screw.',
    'stonebridge-guide-foot:B',
    'part-creeps',
    { replies: ['Lying, so that the layers run along the pull. Solid, no fill.'] },
  ),
  ask(
    'Filter drawer and FW5 in one train',
    'For a single narrow filter I would keep the drawer in front of the wheel. Does anybody have the sum of both to the shoulder?',
    'pallister-filter-drawer:B pallister-fw5:C',
    'wont-reach-focus vignetting',
    { reading: ['drawer between its faces', 15.2] },
  ),
  ask(
    'How much slack should a cold belt have?',
    'Set at twenty degrees it is tight at minus ten, I think, or is it the other way about with this bracket? The belt has cords of glass.',
    'thornapple-belt-kit-60:C stonebridge-belt-bracket:D',
    'motor-stalls-cold belt-slips',
    { replies: ['The aluminium shrinks more than the glass, so it slackens. Not by much over 60 mm.'] },
  ),
  ask(
    'M1 with two leads, which is the later one?',
    'Bought as “nearly new”. It has a lead of 60 cm and another in the box of 100 with a different plug, and no label.',
    'tarn-m1',
    'cable-in-the-way',
    {
      replies: [
        'There is a page that finds it out from marks and the recess: “Which one do I have?” on the part’s page.',
      ],
    },
  ),
  ask(
    'Strip 60 on the secondary dew shield',
    'The longer shield of a friend’s telescope is 3 mm wider. Will the strip close, or do I need the next size?',
    'emberfell-strip-60:B larkfield-wren-60:D',
    'heater-does-not-close',
    { reading: ['length round the shield', 261] },
  ),
  ask(
    'Clamp screw of the Wren 60 has a burr',
    'It scratches the ring each time. Before I take a file to it: is it hardened, and is it a thread that can be bought?',
    'larkfield-wren-60:B',
    'fouls-clamp-screw',
    { replies: ['Soft brass on mine. A turn on a fine stone was enough.'] },
  ),
  ask(
    'Heron 72: bar with two rows of holes',
    'Mine has holes at 20 and at 25 mm. Which of them are meant for the clamp? With the inner ones it turns a little.',
    'greywether-heron-72:B oxbow-dovetail-clamp:C',
    'foot-works-loose',
  ),
  ask(
    'Drawtube creaks when the rotator turns',
    'A creak at every start of the rotator, and the star makes a small hook. Without the reducer it is quiet.',
    'brackwater-r54:B greywether-reducer-08:A greywether-heron-72:A',
    'rattles focus-shifts-on-slew',
    { replies: ['Is the reducer’s barrel tight in the tube? I had that and it was the clamp.'] },
  ),
  ask(
    'Does the Q26 need the adapter’s outer flange?',
    'Without the flange I would win four millimetres. The camera stands on its inner face then, as far as I can see.',
    'hollin-camera-adapter:B quillback-q26:B',
    'wont-reach-focus',
  ),
  ask(
    'Motor plate for the M2 in another thickness',
    'The plate flexes by hand pressure, I see it in the star. Is there one of five millimetres, or a drawing to have it made?',
    'dunlin-motor-plate:C tarn-m2:C',
    'backlash-changes',
    { replies: ['I glued a second one behind it. Ugly, stiff.'] },
  ),
  ask(
    'Halo round one bright star since the M42 adapter',
    'Only round the brightest, off to one side, and it turns with the adapter. The inside is bare metal.',
    'hollin-m42-adapter:B quillback-q16:C',
    'reflection-halo',
    { replies: ['Matt black inside, or a ring of velvet paper for a try.'] },
  ),
  ask(
    'Hand rotator: how to keep the zero?',
    'I note the angle of each panel, but the scale slips round with the ring when I lock it.',
    'brackwater-hand-rotator:B',
    'rotates-by-itself flats-do-not-match',
    { replies: ['A scratch on both halves, the scale is only pressed on.'] },
  ),
];
