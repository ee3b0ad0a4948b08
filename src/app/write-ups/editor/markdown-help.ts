import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'sl-markdown-help',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details>
      <summary>How to mark up text</summary>
      <dl>
        @for (mark of marks; track mark.typed) {
          <dt>
            <code>{{ mark.typed }}</code>
          </dt>
          <dd>{{ mark.gives }}</dd>
        }
      </dl>
    </details>
  `,
  styles: `
    details {
      font-size: var(--sl-small);
      color: var(--sl-quiet);
    }
    summary {
      display: inline-block;
      padding-block: 0.5rem;
      cursor: pointer;
      text-decoration: underline;
      text-underline-offset: 0.18em;
    }
    dl {
      display: grid;
      grid-template-columns: max-content 1fr;
      gap: 0.2rem 1.25rem;
      margin: 0 0 0.5rem;
    }
    dd {
      margin: 0;
    }
    code {
      white-space: pre;
    }
  `,
})
export class MarkdownHelp {
  protected readonly marks = [
    { typed: '**strong**', gives: 'strong words' },
    { typed: '*stressed*', gives: 'stressed words' },
    { typed: '- one', gives: 'a list; 1. makes it a numbered one' },
    { typed: '| a | b |', gives: 'a table; the second line is |---|---|' },
    { typed: '[words](https://…)', gives: 'a link' },
    { typed: '`M3 x 8`', gives: 'figures and names that must not be broken' },
    { typed: '> words', gives: 'somebody else’s words' },
  ];
}
