import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { catchError, of } from 'rxjs';
import type { Symptom } from '../../../../shared/contract/hardware';
import { redrawWith } from '../../core/redraw-with';
import { PartDirectory } from './part-directory';
import { fieldId } from './field-names';

const most = 12;

/** Symptoms from the controlled list, by group. */
@Component({
  selector: 'sl-symptoms-fields',
  imports: [ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset tabindex="-1" [id]="fieldId('symptoms')">
      <legend>What the owner notices</legend>
      <p class="sl-quiet sl-small">{{ chosen().value.length }} chosen; at most {{ most }}.</p>
      @for (group of groups(); track group.name) {
        <div class="group" role="group" [attr.aria-label]="group.name">
          <p class="sl-overline">{{ group.name }}</p>
          <div class="choices">
            @for (symptom of group.symptoms; track symptom.slug) {
              <label>
                <input
                  type="checkbox"
                  [checked]="chosen().value.includes(symptom.slug)"
                  [disabled]="chosen().value.length >= most && !chosen().value.includes(symptom.slug)"
                  (change)="toggle(symptom.slug)"
                />
                {{ symptom.label }}
              </label>
            }
          </div>
        </div>
      } @empty {
        <p class="sl-quiet" role="status">
          {{
            symptoms() === null
              ? 'Fetching the list …'
              : 'The list cannot be fetched at the moment; your own words below do as well.'
          }}
        </p>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      font-weight: 600;
    }
    p {
      margin: 0 0 0.25rem;
    }
    .group {
      margin-block-start: 0.75rem;
    }
    .choices {
      display: grid;
      grid-template-columns: repeat(auto-fill, minmax(min(100%, 19rem), 1fr));
      gap: 0 1.5rem;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.6rem;
      min-block-size: 2.75rem;
      cursor: pointer;
    }
  `,
})
export class SymptomsFields {
  readonly chosen = input.required<FormControl<string[]>>();
  protected readonly fieldId = fieldId;
  protected readonly most = most;
  /** Null until it is known. */
  protected readonly symptoms = toSignal(
    inject(PartDirectory)
      .symptoms()
      .pipe(catchError(() => of<Symptom[]>([]))),
    { initialValue: null },
  );

  protected readonly groups = computed(() => {
    const groups = new Map<string, Symptom[]>();
    for (const symptom of this.symptoms() ?? [])
      groups.set(symptom.group, [...(groups.get(symptom.group) ?? []), symptom]);
    return [...groups].map(([name, symptoms]) => ({ name, symptoms }));
  });

  constructor() {
    redrawWith(this.chosen);
  }

  protected toggle(slug: string): void {
    const slugs = this.chosen().value;
    this.chosen().setValue(slugs.includes(slug) ? slugs.filter((one) => one !== slug) : [...slugs, slug]);
  }
}
