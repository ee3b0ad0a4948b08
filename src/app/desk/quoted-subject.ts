import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import { deskSubjectWords, type DeskSubject } from '../../../shared/contract/desk-subjects';
import type { TakenDownKind } from '../../../shared/contract/taken-down';
import { PhotoView } from '../ui/photo/photo';
import { TakenDownNote } from '../ui/taken-down-note/taken-down-note';
import { DeskItems } from './desk-items';
import { ReasonForm } from './reason-form';

/** What a member wrote, quoted as typed, with whose it is and where it stands. */
@Component({
  selector: 'sl-quoted-subject',
  imports: [PhotoView, ReasonForm, RouterLink, TakenDownNote],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let thing = subject();
    <p>
      <span>{{ words[thing.kind] }} by </span><strong>{{ thing.person.displayName }}</strong
      ><span>. </span><a [routerLink]="thing.path">See it in its place</a>
    </p>
    @if (thing.takenDown) {
      <sl-taken-down-note [of]="thing.takenDown" />
      @if (back()) {
        <p role="status">It is back on the pages; its writer gets your reason by mail.</p>
      } @else {
        <details>
          <summary>Put it back</summary>
          <sl-reason-form
            label="Why it comes back"
            hint="Goes to its writer by mail"
            verb="Put it back"
            [send]="putBack"
            (done)="back.set(true)"
          />
        </details>
      }
    }
    @if (thing.photo; as photo) {
      <sl-photo [photo]="photo" sizes="(min-width: 60rem) 40rem, 90vw" [eager]="true" />
      <p class="sl-quiet">Alternative text: “{{ thing.text }}”</p>
    } @else if (thing.text) {
      <blockquote>{{ thing.text }}</blockquote>
    } @else {
      <p class="sl-quiet">It has no words of its own.</p>
    }
  `,
  styles: `
    :host {
      display: block;
      max-inline-size: var(--sl-measure);
    }
    p:first-child::first-letter {
      text-transform: uppercase;
    }
    blockquote {
      margin: 0 0 1rem;
      padding: 0.25rem 0 0.25rem 1rem;
      border-inline-start: 3px solid var(--sl-ink);
      white-space: pre-line;
    }
    summary {
      min-block-size: 2.75rem;
      padding-block: 0.6rem;
      cursor: pointer;
    }
    sl-photo {
      margin-block-end: 0.5rem;
      max-inline-size: 40rem;
    }
  `,
})
export class QuotedSubject {
  readonly subject = input.required<DeskSubject>();
  private readonly items = inject(DeskItems);
  protected readonly words = deskSubjectWords;
  protected readonly back = signal(false);
  protected readonly putBack = (reason: string): Observable<unknown> => {
    const { kind, id } = this.subject();
    // Only such kinds are ever taken down.
    return this.items.putBack(kind as TakenDownKind, id, reason);
  };
}
