import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { SearchResults } from '../../../shared/contract/search';
import { chosenCount, filterNames, type FilterName, type SearchState } from './search-state';

const titles: Record<FilterName, string> = {
  part: 'Part',
  revision: 'Revision of the chosen parts',
  symptom: 'Symptom',
  permanence: 'What the fix leaves',
  standing: 'How far it is borne out',
  kind: 'Kind of fix',
};
const shownAtOnce = 8;

/** Filters with counts. What is chosen stays listed even where nothing matches it any more. */
@Component({
  selector: 'sl-filter-panel',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (group of groups(); track group.name) {
      <fieldset>
        <legend>{{ group.title }}</legend>
        @for (value of group.first; track value.value) {
          <label
            ><input
              type="checkbox"
              [checked]="value.chosen"
              (change)="toggled.emit({ name: group.name, value: value.value })"
            /><span>{{ value.label }}</span
            ><span class="count">{{ value.count }}</span></label
          >
        }
        @if (group.rest.length) {
          <details>
            <summary>{{ group.rest.length }} more</summary>
            @for (value of group.rest; track value.value) {
              <label
                ><input
                  type="checkbox"
                  [checked]="value.chosen"
                  (change)="toggled.emit({ name: group.name, value: value.value })"
                /><span>{{ value.label }}</span
                ><span class="count">{{ value.count }}</span></label
              >
            }
          </details>
        }
      </fieldset>
    }
    @if (anyChosen()) {
      <button type="button" class="sl-plain-button" (click)="cleared.emit()">Clear all filters</button>
    }
  `,
  styles: `
    fieldset {
      border: 0;
      border-block-start: 1px solid var(--sl-rule);
      margin: 0;
      padding: 0.6rem 0 1rem;
      min-inline-size: 0;
    }
    legend {
      float: inline-start;
      inline-size: 100%;
      font: 600 1.1rem/1.3 var(--sl-heading);
      color: var(--sl-ink);
      padding: 0;
      margin-block-end: 0.25rem;
    }
    legend + * {
      clear: both;
    }
    label {
      display: flex;
      align-items: center;
      gap: 0.6rem;
      min-block-size: 2.75rem;
      cursor: pointer;
      line-height: 1.25;
      font-size: var(--sl-small);
    }
    @media (min-width: 60rem) and (pointer: fine) {
      label {
        min-block-size: 2rem;
      }
    }
    label:hover {
      color: var(--sl-accent);
    }
    input {
      inline-size: 1.15rem;
      block-size: 1.15rem;
      margin: 0;
      flex: none;
    }
    .count {
      margin-inline-start: auto;
      font: 400 0.875rem/1 var(--sl-mono);
      color: var(--sl-quiet);
    }
    summary {
      min-block-size: 2.75rem;
      display: flex;
      align-items: center;
      cursor: pointer;
      color: var(--sl-accent);
      font-size: var(--sl-small);
      text-decoration: underline;
    }
  `,
})
export class FilterPanel {
  readonly state = input.required<SearchState>();
  readonly facets = input.required<SearchResults['facets'] | undefined>();
  readonly toggled = output<{ name: FilterName; value: string }>();
  readonly cleared = output();

  protected readonly anyChosen = computed(() => chosenCount(this.state()) > 0);
  protected readonly groups = computed(() =>
    filterNames
      .map((name) => {
        const chosen = this.state()[name].map(String);
        const offered = this.facets()?.[name] ?? [];
        const gone = chosen
          .filter((value) => !offered.some((other) => other.value === value))
          .map((value) => ({ value, label: value, count: 0 }));
        const values = [...offered, ...gone].map((value) => ({
          ...value,
          chosen: chosen.includes(value.value),
        }));
        values.sort((one, other) => Number(other.chosen) - Number(one.chosen));
        return {
          name,
          title: titles[name],
          first: values.slice(0, shownAtOnce),
          rest: values.slice(shownAtOnce),
        };
      })
      .filter((group) => group.first.length > 0),
  );
}
