import type { HazardKind } from '../contract/vocabulary.js';

/** One way in which a text names a hazard. */
export interface HazardRule {
  readonly hazard: HazardKind;
  /** Words that name it, as the source of a regular expression; they match whole words only, in capitals or not. */
  readonly words: string;
  /** The words count only where these stand in the same line, step or passage. */
  readonly beside?: string;
  /** The words count only in the list of tools; elsewhere they mean something else too often. */
  readonly toolsOnly?: true;
}

const between = String.raw`[\s-]+`;
const perhapsBetween = String.raw`[\s-]*`;

/** Joins alternatives; a space in one stands for white space or a hyphen, a space with a question mark for these or nothing. */
function any(...alternatives: string[]): string {
  return `(?:${alternatives.join('|').replaceAll(' ?', perhapsBetween).replaceAll(' ', between)})`;
}

const removal = any(
  'filing',
  'filed',
  'files? (?:down|off|away|back|flat|flush|smooth|the|it|them|until|along|about|both|each|its)',
  'drill(?:s|ed|ing)?',
  'grind(?:s|ing)?',
  'sand(?:s|ed|ing)',
  'sand (?:down|off|away|back|flat|smooth|the|it|them)',
  'saw(?:ed|n|ing)',
  'mill(?:s|ed|ing)',
  'ream(?:s|ed|ing)?',
  'tapping',
  'deburr(?:s|ed|ing)?',
  'scrap(?:e|es|ed|ing)',
);

const opticsOrElectronics = any(
  'tubes?',
  'telescopes?',
  'cameras?',
  'sensors?',
  'lens(?:es)?',
  'objectives?',
  'mirrors?',
  'correctors?',
  'optics',
  'glass',
  'focusers?',
  'electronics',
  'circuit boards?',
);

const runs = any('runs?', 'running', 'turns?', 'turning', 'moves?', 'moving', 'spins?', 'spinning');
const movingThing = any('gears?', 'belts?', 'pulleys?', 'motors?', 'pinions?');

/**
 * The rule list. It errs on the side of finding: a caution too many costs a moderator a minute. Negations are not
 * understood ("no knife is needed" names a knife), and neither are wrong spellings.
 */
export const hazardRules: readonly HazardRule[] = [
  {
    hazard: 'blade',
    words: any(
      'kni(?:fe|ves)',
      'scalpels?',
      'razors?(?: blades?)?',
      'blades?',
      'side cutters?',
      'flush cutters?',
      'box cutters?',
      'cutters?',
      'nippers',
      'snips',
      'chisels?',
      'hacksaws?',
      'razor saws?',
      'saw(?:ed|n|ing)',
      'deburring tools?',
    ),
  },
  { hazard: 'blade', words: any('saws?', 'scrapers?'), toolsOnly: true },
  {
    hazard: 'power-tool',
    words: any(
      'rotary (?:multi )?tools?',
      'drill press(?:es)?',
      'drill(?:s|ed|ing)?',
      'sanders?',
      'grinders?',
      'power tools?',
      'lathes?',
      'milling machines?',
      'jig ?saws?',
      'band ?saws?',
      'cordless drivers?',
    ),
  },
  {
    hazard: 'dust',
    words: any(
      'sand(?:s|ed|ing)',
      'sand (?:down|off|away|back|flat|smooth|the|it|them)',
      'sand ?papers?',
      'emery',
      'abrasive papers?',
      'wet and dry paper',
      'grind(?:s|ing|ers?)?',
      'filing',
      'filed',
      'files? (?:down|off|away|back|flat|flush|smooth|the|it|them|until|along|about|both|each|its)',
      '(?:needle|hand|flat|round|half round) files?',
    ),
  },
  { hazard: 'dust', words: any('(?<!(?:print|stl|model|step|log)[\\s-])files?'), toolsOnly: true },
  {
    hazard: 'dust',
    words: any('drill(?:s|ed|ing)?', 'cut(?:s|ting)?', 'saw(?:ed|n|ing)'),
    beside: any('carbon', 'brass'),
  },
  {
    hazard: 'solvent',
    words: any(
      'acetone',
      'isoprop(?:yl|anol|yl alcohol)',
      'ipa',
      'ethanol',
      'alcohol',
      'methylated spirits?',
      'white spirits?',
      'solvents?',
      'degreasers?',
      'brake cleaners?',
      'contact cleaners?',
      'naphtha',
      'turpentine',
      'dichloromethane',
      'methylene chloride',
    ),
  },
  {
    hazard: 'adhesive',
    words: any(
      'cyanoacrylates?',
      'super ?glues?',
      'glu(?:e|es|ed|ing)',
      'epox(?:y|ies)',
      'resins?',
      'thread ?lock(?:s|ed|er|ers|ing)?',
      'contact cement',
      'retaining compound',
    ),
  },
  {
    hazard: 'heat',
    words: any(
      'hot air',
      'heat ?guns?',
      'solder(?:s|ed|ing)?(?: irons?)?',
      'soldering stations?',
      'blow ?torch(?:es)?',
      'hot glue',
      'heat set inserts?',
      'boiling water',
      'ovens?',
      'heat shrinks?',
      'hot plates?',
    ),
  },
  {
    hazard: 'lithium-cell',
    words: any('lithium', 'li ?ion', 'li ?po(?:ly)?', 'lifepo4', '18650s?', '21700s?', 'power banks?'),
  },
  {
    hazard: 'mains',
    words: any(
      'mains',
      '(?:100|110|115|120|220|230|240) ?v(?:olts?|ac)?',
      'wall (?:socket|outlet)s?',
      'power outlets?',
      'line voltage',
      'household current',
    ),
  },
  { hazard: 'sun', words: any('sun', 'sunlight', 'sunshine', 'solar') },
  { hazard: 'swarf-near-optics', words: any('swarf', 'filings', 'metal chips') },
  { hazard: 'swarf-near-optics', words: removal, beside: opticsOrElectronics },
  {
    hazard: 'pinch',
    words: any(
      'pinch(?:es|ed|ing)?',
      `${movingThing} (?:is |are )?${runs}`,
      `(?:running|turning|moving|spinning) ${movingThing}`,
    ),
  },
  { hazard: 'magnet', words: any('magnets?', 'neodymium') },
];
