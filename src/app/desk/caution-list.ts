import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import type { Observable } from 'rxjs';
import type { DeskEdition } from '../../../shared/contract/moderation';
import type { Problem } from '../../../shared/contract/problem';
import type { Caution } from '../../../shared/contract/write-ups';
import { hasMovedUp, placeIn, type CautionPlace } from '../../../shared/safety/caution-places';
import { toApiProblem } from '../core/api-problem';
import { CautionBox } from '../ui/caution-box/caution-box';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { CautionForm } from './caution-form';
import { Desk, type CautionWords } from './desk';

/** The cautions that stand on the write-up, its fixes and their steps, to be worded anew, moved or taken off. */
@Component({
  selector: 'sl-caution-list',
  imports: [CautionBox, CautionForm, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (one of placed(); track one.caution.id) {
      <section [attr.aria-label]="'Caution on ' + one.where">
        <p class="sl-quiet">on {{ one.where }}</p>
        @if (one.movedUp; as stands) {
          <p class="moved">
            {{ stands.gone }} is gone from this edition. The caution stays, above {{ stands.now }}; it answers
            no hazard there until you leave it there.
            <button type="button" class="sl-plain-button" (click)="leaveThere(one.caution, stands.place)">
              Leave it there<span class="sl-visually-hidden">: {{ one.caution.hazard }}</span>
            </button>
          </p>
        }
        @if (changing() === one.caution.id) {
          <sl-caution-form
            verb="Keep these words"
            [words]="wordsOf(one.caution)"
            [send]="rewordOf(one.caution)"
            (done)="finish()"
            (cancelled)="changing.set(null)"
          />
        } @else {
          <sl-caution-box [caution]="one.caution" />
          <p class="ways">
            <button type="button" class="sl-bare-button" (click)="changing.set(one.caution.id)">
              Word it anew<span class="sl-visually-hidden">: {{ one.caution.hazard }}</span>
            </button>
            <button type="button" class="sl-bare-button" (click)="remove(one.caution)">
              Take it off<span class="sl-visually-hidden">: {{ one.caution.hazard }}</span>
            </button>
          </p>
        }
      </section>
    } @empty {
      <p class="sl-quiet">None stands yet.</p>
    }
    @if (problem(); as problem) {
      <sl-problem-note [problem]="problem" />
    }
  `,
  styles: `
    p {
      margin: 0.5rem 0 0;
    }
    .moved {
      border-inline-start: 3px solid var(--sl-danger);
      padding-inline-start: 0.75rem;
    }
    .moved button {
      display: flex;
      margin-block-start: 0.4rem;
    }
    .ways {
      display: flex;
      gap: 1rem;
    }
    sl-caution-box {
      margin-block: 0.25rem;
    }
  `,
})
export class CautionList {
  readonly edition = input.required<DeskEdition>();
  /** Something about the cautions is no longer as shown. */
  readonly changed = output();
  private readonly desk = inject(Desk);
  private readonly undo = inject(Undo);
  protected readonly changing = signal<number | null>(null);
  protected readonly problem = signal<Problem | null>(null);

  protected readonly placed = computed(() =>
    this.edition().cautions.map((caution) => ({
      caution,
      where: this.whereOf(caution),
      movedUp: this.movedUp(caution),
    })),
  );

  /** A caution that moved up because its place is gone is put where it stands for good. */
  protected leaveThere(caution: Caution, place: CautionPlace): void {
    this.problem.set(null);
    this.desk.move(caution.id, { editionId: this.edition().editionId, ...place }).subscribe({
      next: () => this.changed.emit(),
      error: (error: unknown) => this.failed(error),
    });
  }

  protected wordsOf({ signalWord, hazards, hazard, consequence, avoidance }: Caution): CautionWords {
    return { signalWord, hazards, hazard, consequence, avoidance };
  }

  protected rewordOf(caution: Caution): (words: CautionWords) => Observable<Caution> {
    return (words) => this.desk.reword(caution.id, words);
  }

  protected finish(): void {
    this.changing.set(null);
    this.changed.emit();
  }

  protected remove(caution: Caution): void {
    const { editionId } = this.edition();
    this.problem.set(null);
    this.desk.remove(caution.id).subscribe({
      next: () => {
        this.changed.emit();
        this.undo.offer('Caution taken off', () => {
          this.desk
            .place({
              editionId,
              ...placeIn(this.edition().view, caution),
              libraryId: null,
              ...this.wordsOf(caution),
            })
            .subscribe({ next: () => this.changed.emit(), error: (error: unknown) => this.failed(error) });
        });
      },
      error: (error: unknown) => this.failed(error),
    });
  }

  private failed(error: unknown): void {
    this.problem.set(toApiProblem(error).problem);
  }

  private whereOf({ fixKey, stepKey }: CautionPlace): string {
    if (fixKey === null) return 'the whole write-up';
    const fix = this.edition().view.fixes.find((each) => each.key === fixKey);
    if (!fix) return 'a fix that this edition no longer has';
    if (stepKey === null) return `“${fix.title}”`;
    const step = fix.steps.findIndex((each) => each.key === stepKey) + 1;
    return step > 0 ? `step ${step} of “${fix.title}”` : `a step that “${fix.title}” no longer has`;
  }

  /** What is gone and where it stands now; null while it stands where it was placed. */
  private movedUp(caution: Caution): { gone: string; now: string; place: CautionPlace } | null {
    const { view } = this.edition();
    if (!hasMovedUp(view, caution)) return null;
    const place = placeIn(view, caution);
    return { gone: place.fixKey === null ? 'Its fix' : 'Its step', now: this.whereOf(place), place };
  }
}
