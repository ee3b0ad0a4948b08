import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { fitVerdictWords } from '../../../shared/contract/joints';
import { FitMark } from '../joints/fit-mark';
import type { Alike } from './alike-search';

/** What may answer a question before it is asked: where its parts meet and how they fit, write-ups, questions. */
@Component({
  selector: 'sl-alike-panel',
  imports: [FitMark, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let found = alike();
    @if (found.places.length) {
      <section aria-labelledby="alike-places">
        <h2 id="alike-places">Where these parts meet</h2>
        <ul class="sl-plain-list">
          @for (place of found.places; track $index) {
            <li class="place">
              @if (place.line; as line) {
                <sl-fit-mark [verdict]="line.verdict" />
                <p>
                  <b>{{ words[line.verdict] }}</b>
                  <a
                    [routerLink]="['/joints', place.joint.slug]"
                    [queryParams]="{ a: line.revisionA.id, b: line.revisionB.id }"
                    >{{ place.joint.name }}</a
                  >
                  <span class="sl-quiet">
                    {{ place.joint.a.name }} {{ line.revisionA.label }}, {{ place.joint.b.name }}
                    {{ line.revisionB.label }}
                  </span>
                </p>
              } @else {
                <sl-fit-mark verdict="not-known" />
                <p>
                  <b>revision not known</b>
                  <a [routerLink]="['/joints', place.joint.slug]">{{ place.joint.name }}</a>
                </p>
              }
            </li>
          }
        </ul>
        @if (found.revisionIds.length > 1) {
          <p>
            <a routerLink="/bench/check" [queryParams]="{ revision: found.revisionIds }"
              >The whole fit check</a
            >
          </p>
        }
      </section>
    }
    @if (found.writeUps.length) {
      <section aria-labelledby="alike-write-ups">
        <h2 id="alike-write-ups">Write-ups that may answer it already</h2>
        <ul class="sl-plain-list">
          @for (writeUp of found.writeUps; track writeUp.slug) {
            <li>
              <a [routerLink]="['/write-ups', writeUp.slug]">{{ writeUp.title }}</a>
            </li>
          }
        </ul>
      </section>
    }
    @if (found.questions.length) {
      <section aria-labelledby="alike-questions">
        <h2 id="alike-questions">Questions like it</h2>
        <ul class="sl-plain-list">
          @for (question of found.questions; track question.slug) {
            <li>
              <a [routerLink]="['/questions', question.slug]">{{ question.title }}</a>
              <span class="sl-quiet">{{ question.settledBy ? 'settled' : 'open' }}</span>
            </li>
          }
        </ul>
      </section>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 1.5rem;
      align-content: start;
    }
    h2 {
      margin: 0 0 0.25rem;
      font-size: 1.2rem;
    }
    ul {
      border-block-start: 1px solid var(--sl-ink);
    }
    li {
      padding-block: 0.55rem;
      border-block-end: 1px solid var(--sl-hair);
    }
    li > a,
    .place a {
      display: block;
    }
    .place {
      display: grid;
      grid-template-columns: auto minmax(0, 1fr);
      gap: 0.7rem;
    }
    p {
      margin: 0;
    }
    section > p {
      margin-block-start: 0.5rem;
    }
    .sl-quiet {
      font-size: var(--sl-small);
    }
  `,
})
export class AlikePanel {
  readonly alike = input.required<Alike>();
  protected readonly words = fitVerdictWords;
}
