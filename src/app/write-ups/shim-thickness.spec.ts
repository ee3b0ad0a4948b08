import type { EditionView, FixView, RichText } from '../../../shared/contract/write-ups';
import { worksheetOfLink } from '../../../shared/fit/worksheet-link';
import { shimThickness, trimHeight } from './shim-thickness';

const none: RichText = { source: '', html: '' };
const fixWith = (materials: string[], kind: FixView['kind'] = 'shim'): FixView => ({
  key: 'coins-behind',
  title: 'Coins',
  kind,
  permanence: 'reversible',
  standing: 'told',
  madeRightFrom: null,
  why: none,
  tools: [],
  materials,
  steps: [],
  revisions: [],
  afterwards: [],
  afterwardsNote: '',
  worksheet: null,
  acceptance: null,
  cautions: [],
  trialCounts: { held: 0, heldForAWhile: 0, didNotHelp: 0 },
});
const view = (readings: EditionView['readings'] = []): EditionView => ({
  title: '',
  summary: '',
  joints: [],
  symptoms: [],
  noticed: none,
  cause: none,
  readings,
  fixes: [],
  photos: [],
  sources: none,
  cautions: [],
});

describe('the thickness of a shim', () => {
  it('is the middle of what stands beside the coins', () => {
    const materials = ['Three coins of 1.65 to 1.75 mm', 'thin double-sided tape', 'M3 screws 2 mm longer'];
    expect(shimThickness(view(), fixWith(materials))).toBeCloseTo(1.7, 9);
  });
  it('is the last figure of a washer told by three', () => {
    expect(shimThickness(view(), fixWith(['Four shim washers 3 × 6 × 0.3 mm']))).toBe(0.3);
  });
  it('is a reading of it before anything else', () => {
    const reading = {
      key: 'thickness',
      part: null,
      revision: null,
      dimension: 'thickness of the coin',
      value: 1.52,
      unit: 'mm' as const,
      instrument: 'micrometer' as const,
      uncertainty: null,
    };
    expect(shimThickness(view([reading]), fixWith(['Coins of 1.7 mm']))).toBe(1.52);
  });
  it('is not told where none stands there, or several do, or nothing is laid in', () => {
    expect(shimThickness(view(), fixWith(['Tape']))).toBeNull();
    expect(shimThickness(view(), fixWith(['Washers of 0.3 mm', 'a coin of 1.5 mm']))).toBeNull();
    expect(shimThickness(view(), fixWith(['Coins of 1.7 mm'], 'trim'))).toBeNull();
  });

  it('is that of the worksheet where one is attached, whatever the materials say', () => {
    const read = worksheetOfLink('/worksheets/shim?v=1&gap=1.5&tolerance=0.05&mostPieces=1&families=coin');
    if (!('record' in read)) throw new Error(read.refusal);
    const fix = { ...fixWith(['Three coins of 1.65 to 1.75 mm']), worksheet: read.record };
    expect(shimThickness(view(), fix)).toBeCloseTo(1.52, 12);
    expect(trimHeight(fix)).toBeNull();
  });
});

describe('what a trim takes off', () => {
  it('is told by its worksheet: the height of the boss and the allowance', () => {
    const read = worksheetOfLink(
      '/worksheets/trim?v=1&bossDiameter=22.5&bossHeight=1.7&recessDiameter=19.5&allowance=0.1',
    );
    if (!('record' in read)) throw new Error(read.refusal);
    expect(trimHeight({ ...fixWith([], 'trim'), worksheet: read.record })).toBeCloseTo(1.8, 12);
  });
});
