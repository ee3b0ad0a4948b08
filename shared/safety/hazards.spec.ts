import { describe, expect, it } from 'vitest';
import { emptyContent, type EditionContent, type Fix } from '../contract/edition-content.js';
import { HazardKind } from '../contract/vocabulary.js';
import { hazardRules } from './hazard-rules.js';
import { answerHazards, findHazards } from './hazards.js';

function withFix(over: Partial<Fix>): EditionContent {
  const fix: Fix = {
    key: 'fix-aaaa',
    title: 'Remedy',
    kind: 'trim',
    permanence: 'permanent',
    why: '',
    tools: [],
    materials: [],
    steps: [],
    revisionIds: [],
    afterwards: [],
    afterwardsNote: '',
    worksheet: null,
    acceptance: null,
    ...over,
  };
  return { ...emptyContent, fixes: [fix] };
}

const step = (text: string): Partial<Fix> => ({ steps: [{ key: 'step-aaaa', text, photoId: null }] });
const hazardsOfStep = (text: string): HazardKind[] =>
  findHazards(withFix(step(text))).map((found) => found.hazard);
const hazardsOfTool = (tool: string): HazardKind[] =>
  findHazards(withFix({ tools: [tool] })).map((found) => found.hazard);

describe('words that name a hazard', () => {
  it.each<[string, HazardKind[]]>([
    ['Trim the lip with a sharp knife.', ['blade']],
    ['Two knives are better.', ['blade']],
    ['Use SCALPELS only.', ['blade']],
    ['Nip it off with **side-cutters**.', ['blade']],
    ['A rotary tool does it faster.', ['power-tool']],
    ['Open the hole on a drill press.', ['power-tool']],
    ['Sand the printed face flat.', ['dust']],
    ['Go on with 400 sandpaper.', ['dust']],
    ['File the boss down by 0.4 mm.', ['dust']],
    ['Cut the carbon plate to length.', ['dust']],
    ['Wipe with isopropyl alcohol.', ['solvent']],
    ['Wipe with IPA.', ['solvent']],
    ['A drop of cyanoacrylate holds it.', ['adhesive']],
    ['Secure with threadlocker.', ['adhesive']],
    ['Secure with thread-locking compound.', ['adhesive']],
    ['Both epoxies work.', ['adhesive']],
    ['Soften it with a heat gun.', ['heat']],
    ['Set the insert with a soldering\niron.', ['heat']],
    ['Charge the Li-ion pack first.', ['lithium-cell']],
    ['Three 18650s are enough.', ['lithium-cell']],
    ['Unplug it from the mains.', ['mains']],
    ['The 230 V side stays closed.', ['mains']],
    ['The 230V side stays closed.', ['mains']],
    ['Never point it at the Sun.', ['sun']],
    ['Blow the swarf away.', ['swarf-near-optics']],
    ['Deburr it with the camera still on.', ['swarf-near-optics']],
    ['Keep fingers away from running gears.', ['pinch']],
    ['Let the motor turn once.', ['pinch']],
    ['Four small magnets hold the cover.', ['magnet']],
  ])('finds in “%s”: %s', (text, hazards) => {
    expect(hazardsOfStep(text)).toEqual(hazards);
  });

  it.each([
    'I saw it tilt on Sunday.',
    'Put the dust cap back on.',
    'Send the print file to the printer.',
    'The 12 V supply and the 2300 V of nothing.',
    'The sundial and the razorbill.',
    'Tighten the clamp screw by a quarter turn.',
    'The rail is skilled work.',
  ])('finds nothing in “%s”', (text) => {
    expect(hazardsOfStep(text)).toEqual([]);
  });

  it('takes saw, scraper and file for tools in the list of tools only', () => {
    expect(hazardsOfTool('fine saw')).toEqual(['blade']);
    expect(hazardsOfTool('scraper')).toEqual(['blade']);
    expect(hazardsOfTool('small file')).toEqual(['dust']);
    expect(hazardsOfStep('The small file is on the disc.')).toEqual([]);
  });

  it('counts removal of material as near the optics only where both stand in one step', () => {
    const steps = ['Drill the bracket at the bench.', 'Put it on the telescope.'].map((text, index) => ({
      key: `step-aaa${index}`,
      text,
      photoId: null,
    }));
    expect(findHazards(withFix({ steps })).map((found) => found.hazard)).toEqual(['power-tool']);
  });

  it('gives the same answer each time it is asked', () => {
    const text = 'Drill with the camera on the tube.';
    expect(hazardsOfStep(text)).toEqual(['power-tool', 'swarf-near-optics']);
    expect(hazardsOfStep(text)).toEqual(['power-tool', 'swarf-near-optics']);
  });

  it('does not understand negations: what is said not to be used is found all the same', () => {
    expect(hazardsOfStep('No knife is needed.')).toEqual(['blade']);
  });

  it('has a rule for every hazard there is', () => {
    expect(new Set(hazardRules.map((rule) => rule.hazard))).toEqual(new Set(HazardKind.options));
  });
});

describe('where a hazard is named', () => {
  it('tells the fix, its steps apart from the rest of it, and each different word once', () => {
    const content = withFix({
      title: 'Trim the lip',
      tools: ['hobby knife', 'razor blade'],
      ...step('Turn the knife slowly.'),
    });
    const fix = { fixKey: 'fix-aaaa', fixTitle: 'Trim the lip' };
    expect(findHazards(content)).toEqual([
      { hazard: 'blade', ...fix, stepKey: null, step: null, words: ['knife', 'razor blade'] },
      { hazard: 'blade', ...fix, stepKey: 'step-aaaa', step: 1, words: ['knife'] },
    ]);
  });

  it('tells which step names it, by its key and by its number', () => {
    const steps = ['Wipe it.', 'Sand it flat.', 'Glue it.'].map((text, index) => ({
      key: `step-${index}aaa`,
      text,
      photoId: null,
    }));
    expect(
      findHazards(withFix({ steps })).map(({ hazard, stepKey, step }) => [hazard, stepKey, step]),
    ).toEqual([
      ['dust', 'step-1aaa', 2],
      ['adhesive', 'step-2aaa', 3],
    ]);
  });

  it('reads the write-up’s own text as well, but not its sources', () => {
    const content = {
      ...emptyContent,
      cause: 'Somebody used epoxy here.',
      sources: 'The acetone data sheet.',
    };
    expect(findHazards(content)).toEqual([
      { hazard: 'adhesive', fixKey: null, fixTitle: null, stepKey: null, step: null, words: ['epoxy'] },
    ]);
  });
});

describe('whether a caution answers a hazard', () => {
  const named = findHazards(withFix({ tools: ['knife'] }));
  const answered = (...cautions: Parameters<typeof answerHazards>[1]): boolean[] =>
    answerHazards(named, cautions).map((found) => found.answered);

  it('does when it lists the hazard and stands on the same fix or on the whole write-up', () => {
    expect(answered({ fixKey: 'fix-aaaa', stepKey: null, hazards: ['dust', 'blade'] })).toEqual([true]);
    expect(answered({ fixKey: null, stepKey: null, hazards: ['blade'] })).toEqual([true]);
  });

  it('does not when it stands on another fix, lists another hazard or is not there', () => {
    expect(answered({ fixKey: 'fix-bbbb', stepKey: null, hazards: ['blade'] })).toEqual([false]);
    expect(answered({ fixKey: 'fix-aaaa', stepKey: null, hazards: ['dust'] })).toEqual([false]);
    expect(answered()).toEqual([false]);
  });

  it('does not for the write-up’s own text when it stands on a fix', () => {
    const own = findHazards({ ...emptyContent, cause: 'A knife slipped.' });
    expect(answerHazards(own, [{ fixKey: 'fix-aaaa', stepKey: null, hazards: ['blade'] }])[0]?.answered).toBe(
      false,
    );
  });

  it('does for a step when it stands on that step, on all of the fix or on the write-up, and for no other step', () => {
    const ofStep = findHazards(withFix(step('Cut it with a knife.')));
    const answers = (fixKey: string | null, stepKey: string | null) =>
      answerHazards(ofStep, [{ fixKey, stepKey, hazards: ['blade'] }])[0]?.answered;
    expect(answers('fix-aaaa', 'step-aaaa')).toBe(true);
    expect(answers('fix-aaaa', null)).toBe(true);
    expect(answers(null, null)).toBe(true);
    expect(answers('fix-aaaa', 'step-bbbb')).toBe(false);
    expect(answers('fix-bbbb', 'step-aaaa')).toBe(false);
  });

  it('does not for all of the fix when it stands on one of its steps', () => {
    expect(answered({ fixKey: 'fix-aaaa', stepKey: 'step-aaaa', hazards: ['blade'] })).toEqual([false]);
  });
});
