import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { tap, type Observable } from 'rxjs';
import type { DeskEdition, FoundHazard, LibraryCaution } from '../../../shared/contract/moderation';
import { hazardKindWords } from '../../../shared/contract/vocabulary';
import type { Caution } from '../../../shared/contract/write-ups';
import { Icon } from '../ui/icon/icon';
import { CautionForm } from './caution-form';
import { Desk, type CautionWords } from './desk';

interface Opened {
  hazard: FoundHazard;
  libraryId: number | null;
  words: CautionWords;
}

/** The hazards that were found in the texts, the words that name them, and the cautions of the library that answer each. */
@Component({
  selector: 'sl-hazard-panel',
  imports: [CautionForm, Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './hazard-panel.html',
  styleUrl: './hazard-panel.scss',
})
export class HazardPanel {
  readonly edition = input.required<DeskEdition>();
  readonly library = input.required<readonly LibraryCaution[]>();
  readonly placed = output<Caution>();
  private readonly desk = inject(Desk);
  protected readonly kinds = hazardKindWords;
  protected readonly opened = signal<Opened | null>(null);
  /** Whether the caution goes above the one step, not above all of the fix. */
  protected readonly onStep = signal(true);

  protected readonly found = computed(() =>
    this.edition().hazards.map((hazard) => ({
      hazard,
      id: `hazard-${hazard.hazard}-${hazard.stepKey ?? hazard.fixKey ?? 'write-up'}`,
      where: whereOf(hazard),
      fitting: this.library().filter((entry) => entry.hazards.includes(hazard.hazard)),
    })),
  );
  protected readonly send = (words: CautionWords): Observable<Caution> => {
    const { hazard, libraryId } = this.opened()!;
    return this.desk
      .place({
        editionId: this.edition().editionId,
        fixKey: hazard.fixKey,
        stepKey: this.onStep() ? hazard.stepKey : null,
        libraryId,
        ...words,
      })
      .pipe(tap(() => this.opened.set(null)));
  };

  protected isOpened(hazard: FoundHazard): boolean {
    const opened = this.opened()?.hazard;
    return (
      opened?.hazard === hazard.hazard && opened.fixKey === hazard.fixKey && opened.stepKey === hazard.stepKey
    );
  }

  protected take(hazard: FoundHazard, entry: LibraryCaution): void {
    const { id, signalWord, hazards, hazard: named, consequence, avoidance } = entry;
    this.onStep.set(true);
    this.opened.set({
      hazard,
      libraryId: id,
      words: { signalWord, hazards, hazard: named, consequence, avoidance },
    });
  }

  protected wordOwn(hazard: FoundHazard): void {
    const words: CautionWords = {
      signalWord: 'caution',
      hazards: [hazard.hazard],
      hazard: '',
      consequence: '',
      avoidance: '',
    };
    this.onStep.set(true);
    this.opened.set({ hazard, libraryId: null, words });
  }
}

/** Where its words stand: "in the write-up", "in “Trim the lip”", "in step 2 of “Trim the lip”". */
function whereOf({ fixTitle, step }: FoundHazard): string {
  if (fixTitle === null) return 'in the write-up';
  return step === null ? `in “${fixTitle}”` : `in step ${step} of “${fixTitle}”`;
}
