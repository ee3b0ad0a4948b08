import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Outlines on a grid of 24, drawn with one pen. */
const outlines = {
  search: 'M10.5 4a6.5 6.5 0 1 0 0 13 6.5 6.5 0 0 0 0-13zM15.5 15.5 21 21',
  bench: 'M3 9h18M5 9v11M19 9v11M5 15h14M8 9V5h5v4',
  part: 'M4 8h5V4h6v4h5v8h-5v4H9v-4H4zM12 12h.01',
  account: 'M12 4a4 4 0 1 0 0 8 4 4 0 0 0 0-8zM4 21c0-4 3.5-6 8-6s8 2 8 6',
  desk: 'M4 5h16v14H4zM4 14h5l1 2h4l1-2h5M8 9h8',
  night: 'M20 14.5A8.5 8.5 0 0 1 9.5 4 8.5 8.5 0 1 0 20 14.5z',
  day: 'M12 7.5a4.5 4.5 0 1 0 0 9 4.5 4.5 0 0 0 0-9zM12 2v2.5M12 19.5V22M2 12h2.5M19.5 12H22M5 5l1.7 1.7M17.3 17.3 19 19M5 19l1.7-1.7M17.3 6.7 19 5',
  close: 'M5 5l14 14M19 5 5 19',
  plus: 'M12 4v16M4 12h16',
  check: 'M4 12.5 9.5 18 20 6',
  question: 'M8.5 9a3.5 3.5 0 1 1 5.3 3c-1.2.8-1.8 1.4-1.8 3M12 18.5v.5',
  warning: 'M12 3.5 22 20.5H2zM12 10v5M12 17.5v.5',
  print: 'M7 9V4h10v5M7 17H4V9h16v8h-3M7 14h10v6H7z',
  filter: 'M3 6h18M6.5 12h11M10 18h4',
  right: 'M9 5l7 7-7 7',
  left: 'M15 5l-7 7 7 7',
  down: 'M5 9l7 7 7-7',
  edit: 'M4 20l1-4L16 5l3 3L8 19zM13.5 7.5l3 3',
  history: 'M4 12a8 8 0 1 0 2.5-5.8L4 8.5M4 4v4.5h4.5M12 8v4.5l3 2',
  remove: 'M5 7h14M9 7V4h6v3M7 7l1 13h8l1-13M10.5 11v5M13.5 11v5',
  up: 'M12 20V5M6 11l6-6 6 6',
  photo: 'M4 6h4l1.5-2h5L16 6h4v13H4zM12 9a3.5 3.5 0 1 0 0 7 3.5 3.5 0 0 0 0-7z',
  joint: 'M2 12h5v8h10v-8h5M9 3h6v13H9z',
  watch: 'M4 11V4h7l9 9-7 7zM8 8h.01',
  watching: 'M4 11V4h7l9 9-7 7zM8 8h.01M9.5 13l2 2 3.5-3.5',
  measure: 'M3 8h18v8H3zM7 8v4M11 8v3M15 8v4M19 8v3',
} as const;

export type IconName = keyof typeof outlines;

/** A small line drawing beside words; without a label it is hidden from screen readers. */
@Component({
  selector: 'sl-icon',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <svg
      viewBox="0 0 24 24"
      [attr.role]="label() ? 'img' : null"
      [attr.aria-label]="label() || null"
      [attr.aria-hidden]="label() ? null : true"
      focusable="false"
    >
      <path [attr.d]="outline()" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      inline-size: 1.25em;
      block-size: 1.25em;
      flex: none;
      vertical-align: -0.22em;
    }
    svg {
      inline-size: 100%;
      block-size: 100%;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.75;
      stroke-linecap: square;
      stroke-linejoin: miter;
    }
  `,
})
export class Icon {
  readonly name = input.required<IconName>();
  readonly label = input('');
  protected readonly outline = computed(() => outlines[this.name()]);
}
