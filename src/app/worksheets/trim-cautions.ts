import type { HazardKind } from '../../../shared/contract/vocabulary';
import type { Caution } from '../../../shared/contract/write-ups';

type Words = Pick<Caution, 'signalWord' | 'hazard' | 'consequence' | 'avoidance'>;

/** What goes before taking material off, by hazard; signal words as in ANSI Z535.6. */
const words: Partial<Record<HazardKind, Words>> = {
  'power-tool': {
    signalWord: 'warning',
    hazard: 'Flying chips, bursting cutters, a tool that grabs.',
    consequence: 'Could blind you or cut deeply.',
    avoidance:
      'Eye protection. Clamp the work, never hold it in the hand. No gloves, loose sleeves or hair near the spindle. Light passes; unplug before changing the cutter.',
  },
  blade: {
    signalWord: 'caution',
    hazard: 'A blade that slips off hard plastic or metal.',
    consequence: 'Could cut hands or eyes.',
    avoidance:
      'Cut away from yourself, the work clamped, the other hand behind the edge. Fresh blade, light cuts.',
  },
  dust: {
    signalWord: 'caution',
    hazard: 'Dust of plastic, metal or fibre.',
    consequence: 'Could irritate eyes and lungs; fibre dust stays in them.',
    avoidance: 'Dust mask and eye protection, work wet where you can, take the dust up with a damp cloth.',
  },
  'swarf-near-optics': {
    signalWord: 'caution',
    hazard: 'Swarf near glass and electronics.',
    consequence: 'Could get into eyes, and scratch optics or short a board when power comes on.',
    avoidance:
      'Take glass and electronics out first and unplug them. Work in another room; clean before anything goes back.',
  },
};

/** The cautions for the hazards that a piece of work brings, the gravest first. */
export function trimCautions(hazards: readonly HazardKind[]): readonly Caution[] {
  return hazards
    .flatMap((hazard, index) => {
      const found = words[hazard];
      return found ? [{ id: index + 1, fixKey: null, stepKey: null, hazards: [hazard], ...found }] : [];
    })
    .sort((one, other) => rank(one) - rank(other));
}

function rank({ signalWord }: Words): number {
  return ['danger', 'warning', 'caution'].indexOf(signalWord);
}
