import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { AuditLine } from '../../../../shared/contract/audit';
import { actionWords } from '../../../../shared/text/audit-words';

/** Entries of the audit log, each readable as it is: when, who, what was done to what, why, and what it changed. */
@Component({
  selector: 'sl-audit-lines',
  imports: [DatePipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ol class="sl-plain-list">
      @for (line of lines(); track line.id) {
        <li>
          <p class="when">
            <time [attr.datetime]="line.at">{{ line.at | date: 'd MMM y, HH:mm' }}</time>
          </p>
          <div>
            <p>
              <strong>{{ line.actor?.displayName ?? 'the site' }}</strong>: {{ words(line.action) }}
            </p>
            @if (subjects()) {
              <p class="thing">
                <span class="sl-quiet">{{ kind(line.subject.kind) }}</span> {{ line.subject.name }}
              </p>
            }
            @if (line.reason) {
              <p class="reason">“{{ line.reason }}”</p>
            }
            @if (line.details.length) {
              <ul class="details">
                @for (detail of line.details; track $index) {
                  <li>{{ detail }}</li>
                }
              </ul>
            }
          </div>
        </li>
      }
    </ol>
  `,
  styles: `
    ol > li {
      display: grid;
      gap: 0 1.5rem;
      padding-block: 0.6rem;
      border-block-end: 1px solid var(--sl-hair);
      break-inside: avoid;
    }
    ol > li > div {
      min-inline-size: 0;
    }
    p {
      margin: 0;
      max-inline-size: var(--sl-measure);
      overflow-wrap: anywhere;
    }
    .when {
      font: 400 0.875rem/1.7 var(--sl-mono);
      color: var(--sl-quiet);
      white-space: nowrap;
    }
    .details {
      display: flex;
      flex-wrap: wrap;
      gap: 0 1rem;
      margin: 0;
      padding: 0;
      list-style: none;
      color: var(--sl-quiet);
      font-size: var(--sl-small);
      overflow-wrap: anywhere;
    }
    @media (min-width: 48rem) {
      ol > li {
        grid-template-columns: 11rem minmax(0, 1fr);
      }
    }
  `,
})
export class AuditLines {
  readonly lines = input.required<readonly AuditLine[]>();
  /** Whether each says what it is about; off where all are about the thing at hand. */
  readonly subjects = input(true);
  protected readonly words = actionWords;

  protected kind(name: string): string {
    return name.replaceAll('-', ' ');
  }
}
