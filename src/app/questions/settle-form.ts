import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { finalize } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import type { QuestionPage } from '../../../shared/contract/questions';
import { toApiProblem } from '../core/api-problem';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { WriteUps } from '../write-ups/write-ups';
import { Questions } from './questions';

interface Found {
  readonly slug: string;
  readonly title: string;
}

/** The asker names the fix that helped: a write-up is searched for, then one of its fixes is chosen. */
@Component({
  selector: 'sl-settle-form',
  imports: [ProblemNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section class="sl-section">
      <h2>This settled it</h2>
      <form
        role="search"
        aria-label="Find the write-up"
        (submit)="$event.preventDefault(); find(words.value)"
      >
        <label for="settle-words">Which write-up helped?</label>
        <input #words id="settle-words" class="sl-field" type="search" maxlength="200" />
        <button type="submit" class="sl-plain-button">Find</button>
      </form>
      <div role="status">
        @if (found(); as found) {
          @if (!found.length) {
            <p>No write-up is like that. Try other words.</p>
          }
        }
      </div>
      <ul class="sl-plain-list">
        @for (writeUp of found(); track writeUp.slug) {
          <li>
            <button type="button" class="sl-bare-button" (click)="choose(writeUp)">
              {{ writeUp.title }}
            </button>
          </li>
        }
      </ul>
      @if (chosen(); as chosen) {
        <fieldset>
          <legend>Which fix of “{{ chosen.title }}” settled it?</legend>
          @for (fix of chosen.fixes; track fix.key) {
            <button
              type="button"
              class="sl-plain-button"
              [disabled]="busy()"
              (click)="settle(chosen.slug, fix.key)"
            >
              {{ fix.title }}
            </button>
          }
        </fieldset>
      }
      <sl-problem-note [problem]="problem()" />
    </section>
  `,
  styles: `
    form {
      display: grid;
      gap: 0.5rem;
      justify-items: start;
      max-inline-size: var(--sl-measure);
    }
    label,
    legend {
      font-weight: 600;
    }
    fieldset {
      display: flex;
      flex-wrap: wrap;
      gap: 0.75rem;
      border: 0;
      padding: 0;
      margin: 0.75rem 0 0;
      min-inline-size: 0;
    }
    li button {
      text-align: start;
    }
  `,
})
export class SettleForm {
  readonly slug = input.required<string>();
  readonly settled = output<QuestionPage>();
  private readonly questions = inject(Questions);
  private readonly writeUps = inject(WriteUps);
  protected readonly found = signal<readonly Found[] | null>(null);
  protected readonly chosen = signal<
    (Found & { readonly fixes: readonly { key: string; title: string }[] }) | null
  >(null);
  protected readonly busy = signal(false);
  protected readonly problem = signal<Problem | null>(null);

  protected find(words: string): void {
    this.chosen.set(null);
    this.problem.set(null);
    this.questions.writeUpsLike(words).subscribe({
      next: (found) => this.found.set(found),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected choose(writeUp: Found): void {
    this.problem.set(null);
    this.writeUps.read(writeUp.slug).subscribe({
      next: ({ view }) => this.chosen.set({ ...writeUp, fixes: view.fixes }),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected settle(writeUpSlug: string, fixKey: string): void {
    this.busy.set(true);
    this.problem.set(null);
    this.questions
      .settle(this.slug(), { writeUpSlug, fixKey })
      .pipe(finalize(() => this.busy.set(false)))
      .subscribe({
        next: (question) => this.settled.emit(question),
        error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
      });
  }
}
