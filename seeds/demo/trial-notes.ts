import type { FixKind, TrialOutcome } from '../../shared/contract/vocabulary.js';

/** What people wrote under their trials, by kind of fix; plain text. */
export const trialNotes: Record<FixKind, Record<TrialOutcome, readonly string[]>> = {
  shim: {
    held: [
      'Sits flat now. I weighed the pieces first and kept the three that agreed to 0.02 mm.',
      'Four months and two trips in the car later it has not moved. Paint marks still line up.',
      'Did it on the kitchen table in half an hour. Press test: no rock at any corner.',
      'Held through a night from 14 °C to minus 3 °C. I check the screws each new moon.',
      'Same remedy, brass strip instead of what the write-up uses. Works as told.',
      'Measured before and after with the same caliper; the gap is gone.',
      'Cut the piece with scissors, then flattened the burr between two steel blocks. It measured 0.02 mm less after that.',
      'Took two tries: the first strip was a tenth too thick and the screws would not start.',
      'A spot of grease holds the pieces while you turn it over. No tape needed.',
    ],
    'held-for-a-while': [
      'Good for six weeks, then the tape had crept. Metal instead of tape would do it.',
      'Worked until I took the camera off; one piece fell out and I could not find it. Stick them down.',
      'Fine on the bench, came loose after a drive on a gravel road.',
      'Held through the summer. In damp autumn the paper part of it swelled and I went over to brass.',
    ],
    'did-not-help': [
      'The rock is gone but the drive still stalls: mine had a second cause.',
      'My gap is not even, so three equal pieces only moved the tilt elsewhere.',
      'Could not get the screws to bite with that much under the plate. Longer ones are on order.',
    ],
  },
  trim: {
    held: [
      'Took it off in five light passes and stopped to measure after each. Fits.',
      'Clamped it in a drill vice between two bits of leather. Clean edge, no dust in the motor because the motor was in another room.',
      'Done with a file only, slower but no nerves. Sits flush.',
      'Half a millimetre more than told to get room on mine; wall still thick enough.',
      'Two seasons on, no cracks where I cut.',
      'Practised on a scrap of the same plastic first. Glad I did.',
      'A friend with a lathe did it in five minutes; by hand I would not have kept it square.',
    ],
    'held-for-a-while': [
      'Flush for a season; then the thin wall cracked at one screw. Leave more than I did.',
      'Good until the plate warped in the sun on the window sill.',
    ],
    'did-not-help': [
      'I took too much off one side and it now sits crooked the other way.',
      'Mine was already short. Nothing left to take off; measure first.',
    ],
  },
  reposition: {
    held: [
      'Turned it as told and it clears by a finger.',
      'Took ten minutes and cost nothing. Should have been in the leaflet.',
      'Clears over the whole travel; I ran it end to end five times.',
      'Had to move the finder too, but it works.',
      'No change in a year. Marked the place with a scribe line.',
      'Needed a longer cable, nothing else.',
    ],
    'held-for-a-while': [
      'Crept back after a month because the clamp screw was not tight enough.',
      'Fine until I changed cameras; the new one wants another angle.',
    ],
    'did-not-help': [
      'There is no free angle with my off-axis guider in the way.',
      'Clears, but the cable now pulls. Not a gain for me.',
    ],
  },
  remake: {
    held: [
      'Printed in glass-filled nylon at 100 % around the holes. Dimension came out 0.05 under, which is fine.',
      'Had it turned by a friend. Best thing I did to this telescope.',
      'The first print was too tight by 0.1; scaled the bore and the second one fits.',
      'Held a summer in the car without creeping.',
      'Rubbed the faces flat on wet paper; straight from the printer it rocked by 0.1.',
    ],
    'held-for-a-while': [
      'Printed it in the easy plastic and it sagged on a hot day. Use what the write-up says.',
      'Cracked along the layers at the clamp after three months.',
    ],
    'did-not-help': ['My print shrank more than I thought; the bore is off by 0.3. Will try again.'],
  },
  swap: {
    held: [
      'The maker changed it for the newer one against postage. Fits straight out of the box.',
      'Bought the newer revision second hand. All good, nothing to cut.',
      'Swapped, ran the whole travel, no touch anywhere.',
      'Newer one is 12 g heavier, otherwise the same and it seats.',
      'Sold the old one on with a note of what it does fit.',
    ],
    'held-for-a-while': ['Good until the clamp worked loose; that is another matter.'],
    'did-not-help': ['The one I got was the old revision in the new bag. Look at the marks before paying.'],
  },
  adjust: {
    held: [
      'Set it as told, backlash went down and stays there.',
      'Two nights of focus runs, all of them fitted.',
      'Needed three goes to find the place. Worth it.',
      'I turned it an eighth less than told because mine is the short-travel one.',
      'Checked again after a month: same figure within what I can read.',
      'Quiet now, and it starts from cold.',
      'Wrote the setting on a strip of tape inside the lid, so that I find it again.',
    ],
    'held-for-a-while': [
      'Held till the first frost, then I had to do it again.',
      'Works loose in about three weeks on mine.',
      'Good at 15 °C, less so at minus 5 °C.',
    ],
    'did-not-help': [
      'No difference at all. I think my trouble is further down.',
      'Better one way, worse the other.',
      'Ran out of travel before it got good.',
    ],
  },
};
