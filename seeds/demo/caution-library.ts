import type { HazardKind, SignalWord } from '../../shared/contract/vocabulary.js';

export interface DemoLibraryCaution {
  readonly slug: string;
  readonly name: string;
  readonly signalWord: SignalWord;
  readonly hazards: readonly HazardKind[];
  readonly hazard: string;
  readonly consequence: string;
  readonly avoidance: string;
}

const entry = (
  slug: string,
  name: string,
  signalWord: SignalWord,
  hazards: HazardKind[],
  hazard: string,
  consequence: string,
  avoidance: string,
): DemoLibraryCaution => ({ slug, name, signalWord, hazards, hazard, consequence, avoidance });

/** The usual cautions; signal words as in ANSI Z535.6: danger "will", warning "could", caution "could cause minor or moderate injury". */
export const demoCautionLibrary: readonly DemoLibraryCaution[] = [
  entry(
    'sun',
    'Optics and the Sun',
    'danger',
    ['sun'],
    'Looking at or near the Sun through any optics.',
    'Will blind you at once and without pain; it can also burn cameras and start fires.',
    'Never point the telescope, finder or guide scope near the Sun without a full-aperture solar filter over the front, checked for pinholes and tied on. Cap the finder. Turn away from the Sun to test, and wait until it has set where you can.',
  ),
  entry(
    'mains',
    'Mains supply',
    'danger',
    ['mains'],
    'Mains voltage inside supplies, plugs and outdoor leads.',
    'Will kill through a wet hand or a damp lead.',
    'Do not open a mains supply. Leave mains work to a licensed person and keep to your local code. Outdoors use a residual-current device and a supply made for damp places; unplug before you touch anything.',
  ),
  entry(
    'lithium',
    'Lithium cells and packs',
    'warning',
    ['lithium-cell'],
    'Lithium cells that are shorted, crushed, overcharged or opened.',
    'Could burst into fire that water does not put out.',
    'Never bridge, open or solder to a pack. Fuse the lead at the pack, use its own charger, stop at swelling or heat, and put it outdoors on stone. Follow the maker’s instructions and local rules for disposal.',
  ),
  entry(
    'rotary-tool',
    'Rotary tool or drill',
    'warning',
    ['power-tool', 'dust'],
    'Flying chips, bursting cutters and a tool that grabs.',
    'Could blind you or cut to the bone; fine dust harms the lungs.',
    'Wear eye protection and a dust mask. Clamp the work, never hold it in the hand. Keep to the maker’s instructions. No gloves, loose sleeves or hair near the spindle. Let the cutter run up to speed, take light passes, and unplug before changing it.',
  ),
  entry(
    'blade',
    'Knife, scraper or saw blade',
    'caution',
    ['blade'],
    'A blade that slips off hard plastic or metal.',
    'Could cut hands or eyes.',
    'Cut away from yourself with the work clamped and the other hand behind the edge. Use a fresh blade, light cuts and eye protection.',
  ),
  entry(
    'dust',
    'Sanding and filing dust',
    'caution',
    ['dust'],
    'Dust of printed plastic, metal, carbon or glass fibre.',
    'Could irritate eyes and lungs; fibre dust stays in them.',
    'Wear a dust mask and eye protection, work wet where you can, take the dust up with a damp cloth, and do it away from optics.',
  ),
  entry(
    'swarf',
    'Swarf near optics or electronics',
    'caution',
    ['swarf-near-optics'],
    'Chips and dust on glass, in gears or on circuit boards.',
    'Could scratch coatings, jam the drive, and short a board that then burns fingers.',
    'Take the electronics and the glass out first and put them in another room. Cap every opening. Clean the part with a brush and a damp cloth before it comes near the telescope again.',
  ),
  entry(
    'cyanoacrylate',
    'Instant glue',
    'caution',
    ['adhesive'],
    'Cyanoacrylate bonds skin in seconds and its vapour frosts glass.',
    'Could glue fingers or eyelids; could irritate eyes and lungs.',
    'Wear eye protection, use a drop from a needle, air the room, and keep optics out of it until the smell is gone. Never pull bonded skin apart: soak it in warm soapy water; with eyes see a doctor.',
  ),
  entry(
    'epoxy',
    'Epoxy and thread-locking compounds',
    'caution',
    ['adhesive'],
    'Uncured resin and locking compounds.',
    'Could irritate skin and bring on a lasting allergy.',
    'Wear nitrile gloves, air the room, keep it off skin, optics and printed plastic that it cracks. Read the maker’s data sheet first.',
  ),
  entry(
    'solvent',
    'Alcohol, acetone and other solvents',
    'warning',
    ['solvent'],
    'Vapour that burns and liquid that strips coatings and plastics.',
    'Could catch fire and burn you; could harm lungs and eyes.',
    'No flame, heat or spark near it, open a window, wear gloves and eye protection, use drops on a cloth, and let all of it dry before power goes on. Keep it off lenses, paint and printed parts, and dispose of it by local rules.',
  ),
  entry(
    'heat',
    'Hot air, iron and heated parts',
    'caution',
    ['heat'],
    'Metal and plastic that stay hot for minutes.',
    'Could burn skin; could crack cold glass and set light to foam.',
    'Take the optics out first. Warm slowly and evenly, stay below 60 °C near plastics, use gloves, and lay the tool on a stand that will not burn.',
  ),
  entry(
    'heater-hot',
    'Dew heaters run without control',
    'caution',
    ['heat'],
    'A heater at full power that lies double or is covered.',
    'Could burn skin, melt its cover and mark the tube.',
    'Never overlap the heated length, feel it after five minutes indoors, and use the supply and fuse that its maker names. Leave mains supplies to a licensed person.',
  ),
  entry(
    'pinch',
    'Moving belts and gears',
    'caution',
    ['pinch'],
    'A gear or belt that starts when software says so.',
    'Could pinch fingers or catch hair and cords.',
    'Unplug the motor before you reach into the drive. For running tests tie hair back, keep fingers out and one hand at the plug.',
  ),
  entry(
    'magnet',
    'Strong magnets',
    'warning',
    ['magnet'],
    'Magnets that snap together, and splinter.',
    'Could pinch and chip into eyes; swallowed by a child, two of them could kill. Could disturb a pacemaker.',
    'Slide them apart, do not pull. Wear eye protection, count them before and after, keep them from children, pacemakers and cards.',
  ),
  entry(
    'balance-shift',
    'Telescope out of balance',
    'caution',
    ['pinch'],
    'A mount that swings when a heavy part comes off.',
    'Could bruise or pinch, and could throw the telescope over.',
    'Point the tube straight down to the ground plate or take it off the mount, lock both axes and hold the camera before you loosen a clamp.',
  ),
  entry(
    'glass-edge',
    'Bare filters and lens cells',
    'caution',
    ['blade'],
    'Sharp edges of unmounted glass.',
    'Could cut fingers; fingerprints etch coatings.',
    'Wear clean cotton or nitrile gloves, work over a folded towel, and hold glass by its rim only.',
  ),
];
