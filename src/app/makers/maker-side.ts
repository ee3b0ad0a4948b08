import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { Subject, combineLatest, startWith } from 'rxjs';
import type { MakerAnswer, MakerSide as Side } from '../../../shared/contract/makers';
import type { EditionView } from '../../../shared/contract/write-ups';
import { loadEach } from '../core/load';
import { redrawnWhile } from '../hardware/measurements/stay-while-loading';
import { AnswerForm } from './answer-form';
import { MadeRightForm } from './made-right-form';
import { MakerNote } from './maker-note';
import { Makers } from './makers';

/** What the makers of its parts say on a write-up; whoever speaks for one says it here, authors tell them of it. */
@Component({
  selector: 'sl-maker-side',
  imports: [AnswerForm, DatePipe, MadeRightForm, MakerNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (side(); as side) {
      @if (side.answers.length || speaking().length || side.mayTell) {
        <section class="sl-section" aria-labelledby="makers">
          <h2 id="makers">{{ side.makers.length > 1 ? 'The makers' : 'The maker' }}</h2>
          @for (answer of side.answers; track answer.maker.id) {
            <sl-maker-note [answer]="answer" />
          }
          @for (of of speaking(); track of.maker.id) {
            <div class="speak sl-off-paper">
              <p>
                You speak for <a [routerLink]="['/makers', of.maker.slug]">{{ of.maker.name }}</a>.
              </p>
              @if (open() === of.maker.slug + '/answer') {
                <sl-answer-form
                  [slug]="slug()"
                  [maker]="of.maker"
                  [answer]="answerOf(side, of.maker.slug)"
                  (changed)="refresh()"
                />
              } @else if (open() === of.maker.slug + '/right') {
                <sl-made-right-form
                  [slug]="slug()"
                  [of]="of"
                  [fixes]="view().fixes"
                  (changed)="refresh(); changed.emit()"
                />
              }
              <div class="ways">
                @if (open() !== of.maker.slug + '/answer') {
                  <button type="button" class="sl-plain-button" (click)="open.set(of.maker.slug + '/answer')">
                    {{ answerOf(side, of.maker.slug) ? 'Change the answer' : 'Answer on this' }}
                  </button>
                }
                @if (open() !== of.maker.slug + '/right' && view().fixes.length) {
                  <button type="button" class="sl-plain-button" (click)="open.set(of.maker.slug + '/right')">
                    Made right from …
                  </button>
                }
                @if (open()) {
                  <button type="button" class="sl-bare-button" (click)="open.set(null)">Close</button>
                }
              </div>
            </div>
          }
          @if (side.mayTell) {
            <ul class="tell sl-plain-list sl-off-paper">
              @for (of of side.makers; track of.maker.id) {
                <li>
                  <a [routerLink]="['/write-ups', slug(), 'tell', of.maker.slug]"
                    >Tell {{ of.maker.name }} of this</a
                  >
                  @if (of.letters[0]; as last) {
                    <span class="sl-quiet"
                      >told on {{ last.sentAt | date: 'yyyy-MM-dd' : 'UTC' }} by
                      {{ last.person.displayName }}</span
                    >
                  } @else if (!of.canBeTold) {
                    <span class="sl-quiet">no address of it is known yet</span>
                  }
                </li>
              }
            </ul>
          }
        </section>
      }
    }
  `,
  styles: `
    .speak {
      border-inline-start: 3px solid var(--sl-ink);
      padding-inline-start: 1rem;
      margin-block: 1.25rem;
    }
    .ways {
      display: flex;
      flex-wrap: wrap;
      gap: 0.5rem 1rem;
      margin-block-start: 0.75rem;
    }
    .tell li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 1rem;
    }
    .tell a {
      display: inline-flex;
      align-items: center;
      min-block-size: 2.75rem;
    }
  `,
})
export class MakerSide {
  readonly slug = input.required<string>();
  readonly view = input.required<EditionView>();
  /** The standing of fixes has changed. */
  readonly changed = output();

  private readonly makers = inject(Makers);
  private readonly again = new Subject<void>();
  /** Which form is open: `<maker>/answer` or `<maker>/right`. */
  protected readonly open = signal<string | null>(null);
  private readonly loaded = redrawnWhile(
    loadEach(combineLatest([toObservable(this.slug), this.again.pipe(startWith(undefined))]), ([slug]) =>
      this.makers.side(slug),
    ),
  );
  /** Null while it is not known; the page is worth reading without it. */
  protected readonly side = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
  protected readonly speaking = computed(() => this.side()?.makers.filter(({ iSpeak }) => iSpeak) ?? []);

  protected answerOf(side: Side, makerSlug: string): MakerAnswer | null {
    return side.answers.find(({ maker }) => maker.slug === makerSlug) ?? null;
  }

  protected refresh(): void {
    this.open.set(null);
    this.again.next();
  }
}
