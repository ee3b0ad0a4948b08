import { ChangeDetectionStrategy, Component, DestroyRef, inject, input, output } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { debounceTime, distinctUntilChanged, map, of, switchMap } from 'rxjs';
import type { PartSummary } from '../../../shared/contract/hardware';
import { loading, statesOf, type LoadState } from '../core/load';
import { Hardware } from '../hardware/hardware';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';

const pauseInTyping = 150;
let made = 0;

/** A field that finds a part by its name. */
@Component({
  selector: 'sl-part-chooser',
  imports: [Icon, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label [attr.for]="id">{{ label() }}</label>
    <input
      class="sl-field"
      type="search"
      autocomplete="off"
      maxlength="100"
      [id]="id"
      [placeholder]="hint()"
      [formControl]="name"
    />
    @if (typed()) {
      @let now = found();
      <div class="offers" aria-live="polite">
        @switch (now.state) {
          @case ('loading') {
            <p class="sl-quiet">Looking …</p>
          }
          @case ('failed') {
            <sl-problem-note [problem]="now.problem" />
          }
          @case ('ready') {
            <ul class="sl-plain-list">
              @for (part of now.value; track part.id) {
                <li>
                  <button type="button" (click)="take(part)">
                    <sl-icon name="plus" /><b>{{ part.name }}</b>
                    <span class="sl-quiet">{{ part.maker.name }}</span>
                  </button>
                </li>
              } @empty {
                <li class="sl-quiet">No part has that name.</li>
              }
            </ul>
          }
        }
      </div>
    }
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: var(--sl-measure);
    }
    label {
      display: block;
      font-weight: 600;
      margin-block-end: 0.2rem;
    }
    .offers {
      border: 1px solid var(--sl-quiet);
      border-block-start: 0;
      padding-inline: 0.75rem;
    }
    button {
      display: flex;
      flex-wrap: wrap;
      gap: 0.1rem 0.6rem;
      align-items: center;
      inline-size: 100%;
      min-block-size: 2.75rem;
      border: 0;
      border-block-end: 1px solid var(--sl-hair);
      background: none;
      text-align: start;
      cursor: pointer;
      color: var(--sl-accent);
    }
    button:hover {
      background: var(--sl-accent-wash);
    }
  `,
})
export class PartChooser {
  readonly label = input.required<string>();
  readonly hint = input('');
  readonly chosen = output<PartSummary>();

  private readonly hardware = inject(Hardware);
  protected readonly id = `sl-part-chooser-${(made += 1)}`;
  protected readonly name = new FormControl('', { nonNullable: true });
  private readonly words = this.name.valueChanges.pipe(map((words) => words.trim()));
  protected readonly typed = toSignal(this.words, { initialValue: '' });
  protected readonly found = toSignal<LoadState<PartSummary[]>, LoadState<PartSummary[]>>(
    this.words.pipe(
      debounceTime(pauseInTyping),
      distinctUntilChanged(),
      switchMap((q) =>
        q === ''
          ? of(loading)
          : statesOf(this.hardware.parts({ q, limit: 8 }).pipe(map(({ items }) => items))),
      ),
      takeUntilDestroyed(inject(DestroyRef)),
    ),
    { initialValue: loading },
  );

  protected take(part: PartSummary): void {
    this.name.setValue('');
    this.chosen.emit(part);
  }
}
