import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type {
  DeskEdition,
  FoundHazard,
  LibraryCaution,
  PlaceCaution,
} from '../../../shared/contract/moderation';
import type { Caution } from '../../../shared/contract/write-ups';
import { Desk } from './desk';
import { HazardPanel } from './hazard-panel';

const rotary: FoundHazard = {
  hazard: 'power-tool',
  fixKey: 'fix-key-1',
  fixTitle: 'Trim the lip',
  stepKey: null,
  step: null,
  words: ['rotary tool'],
  answered: false,
};
const goggles: LibraryCaution = {
  id: 4,
  name: 'Eye protection',
  signalWord: 'warning',
  hazards: ['power-tool'],
  hazard: 'Flying chips',
  consequence: 'can blind an eye.',
  avoidance: 'Wear goggles.',
};
const mask: LibraryCaution = { ...goggles, id: 5, name: 'Dust mask', hazards: ['dust'] };

function panelWith(hazards: FoundHazard[]) {
  const placed: PlaceCaution[] = [];
  const answer = new Subject<Caution>();
  const told: Caution[] = [];
  TestBed.configureTestingModule({
    providers: [
      { provide: Desk, useValue: { place: (caution: PlaceCaution) => (placed.push(caution), answer) } },
    ],
  });
  const fixture = TestBed.createComponent(HazardPanel);
  fixture.componentRef.setInput('edition', { editionId: 9, hazards } as DeskEdition);
  fixture.componentRef.setInput('library', [goggles, mask]);
  fixture.componentInstance.placed.subscribe((caution) => told.push(caution));
  fixture.detectChanges();
  const element = fixture.nativeElement as HTMLElement;
  const button = (name: string) =>
    [...element.querySelectorAll('button')].find((one) => one.textContent?.includes(name));
  return { fixture, element, button, placed, answer, told };
}

describe('hazards on the desk', () => {
  it('when a fix names a hazard without a caution, then it shows the words, and the entries of the library that answer it', () => {
    const { element, button } = panelWith([rotary]);

    expect(element.querySelector('q')?.textContent).toBe('rotary tool');
    expect(element.textContent).toContain('in “Trim the lip”');
    expect(element.textContent).toContain('no caution yet');
    expect(button('Eye protection')).toBeDefined();
    expect(button('Dust mask')).toBeUndefined();
  });

  it('when an entry is taken and its wording changed, then the changed words are placed on the fix', () => {
    const { fixture, element, button, placed, answer, told } = panelWith([rotary]);
    button('Eye protection')?.click();
    fixture.detectChanges();
    const avoidance = element.querySelector<HTMLTextAreaElement>('textarea[formControlName=avoidance]');
    expect(avoidance?.value).toBe('Wear goggles.');
    avoidance!.value = 'Wear goggles that close at the sides.';
    avoidance!.dispatchEvent(new Event('input'));

    button('Place the caution')?.click();
    fixture.detectChanges();

    expect(placed).toEqual([
      {
        editionId: 9,
        fixKey: 'fix-key-1',
        stepKey: null,
        libraryId: 4,
        signalWord: 'warning',
        hazards: ['power-tool'],
        hazard: 'Flying chips',
        consequence: 'can blind an eye.',
        avoidance: 'Wear goggles that close at the sides.',
      },
    ]);
    const caution: Caution = { id: 1, ...placed[0]! };
    answer.next(caution);
    answer.complete();
    expect(told).toEqual([caution]);
  });

  it('when a caution answers the hazard, then nothing is asked for', () => {
    const { element, button } = panelWith([{ ...rotary, answered: true }]);

    expect(element.textContent).toContain('a caution answers it');
    expect(button('Eye protection')).toBeUndefined();
  });
});
