import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { worksheetKinds } from '../../../shared/contract/worksheet';
import { safetySentence, worksheetWords } from '../../../shared/fit/worksheet-words';
import { ShimloreTitles } from '../core/titles';

/** All worksheets, each with the question that it answers. */
@Component({
  selector: 'sl-worksheets-page',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <h1>Worksheets</h1>
    <p class="sl-narrow">
      Calculations with your own numbers, in millimetres or inches. Everything you type stands in the page's
      address, so a sheet can be sent on, kept, and run again. No account is needed.
    </p>
    <ul class="sl-plain-list">
      @for (sheet of sheets; track sheet.kind) {
        <li>
          <h2>
            <a [routerLink]="sheet.kind">{{ sheet.title }}</a>
          </h2>
          <p>{{ sheet.answers }}</p>
        </li>
      }
    </ul>
    <p class="sl-narrow sl-quiet">{{ safety }}</p>
  `,
  styles: `
    li {
      border-block-start: 1px solid var(--sl-ink);
      padding-block: 0.9rem;
      max-inline-size: var(--sl-measure);
    }
    h2 {
      margin: 0 0 0.25rem;
    }
    li p {
      margin: 0;
    }
    ul {
      margin-block: 1.5rem;
    }
  `,
})
export class WorksheetsPage {
  protected readonly safety = safetySentence;
  protected readonly sheets = worksheetKinds.map((kind) => ({ kind, ...worksheetWords[kind] }));

  constructor() {
    const titles = inject(ShimloreTitles);
    effect(() =>
      titles.describe({
        title: 'Worksheets',
        description:
          'Does it seat, which shim fills the gap, how much has to come off: worked out with your own readings.',
        path: '/worksheets',
      }),
    );
  }
}
