import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { ShimloreTitles } from './titles';

@Component({
  selector: 'sl-not-for-you-page',
  imports: [RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="sl-sheet sl-narrow">
      <h1>Your role does not cover this page</h1>
      <p>It belongs to the people who keep the desk. Ask an administrator if you should be one of them.</p>
      <p><a routerLink="/">Back to the search</a></p>
    </div>
  `,
})
export class NotForYouPage {
  constructor() {
    inject(ShimloreTitles).answerWith(403);
  }
}
