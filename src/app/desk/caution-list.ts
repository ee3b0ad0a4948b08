import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import type { Observable } from 'rxjs';
import type { DeskEdition } from '../../../shared/contract/moderation';
import type { Problem } from '../../../shared/contract/problem';
import type { Caution } from '../../../shared/contract/write-ups';
import { toApiProblem } from '../core/api-problem';
import { CautionBox } from '../ui/caution-box/caution-box';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { CautionForm } from './caution-form';
import { Desk, type CautionWords } from './desk';

/** The cautions that stand on the write-up and its fixes, to be worded anew or taken off. */
@Component({
  selector: 'sl-caution-list',
  imports: [CautionBox, CautionForm, ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (one of placed(); track one.caution.id) {
      <section [attr.aria-label]="'Caution on ' + one.where">
        <p class="sl-quiet">on {{ one.where }}</p>
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
      where: caution.fixKey === null ? 'the whole write-up' : `“${this.fixTitle(caution.fixKey)}”`,
    })),
  );

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
            .place({ editionId, fixKey: caution.fixKey, libraryId: null, ...this.wordsOf(caution) })
            .subscribe({ next: () => this.changed.emit(), error: (error: unknown) => this.failed(error) });
        });
      },
      error: (error: unknown) => this.failed(error),
    });
  }

  private failed(error: unknown): void {
    this.problem.set(toApiProblem(error).problem);
  }

  private fixTitle(key: string): string {
    return (
      this.edition().view.fixes.find((fix) => fix.key === key)?.title ??
      'a fix that this edition no longer has'
    );
  }
}
