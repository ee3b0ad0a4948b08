import { ChangeDetectionStrategy, Component, computed, inject, input, numberAttribute } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { catchError, map, of, switchMap } from 'rxjs';
import { jointOfWriteUp } from '../../../../shared/fit/joint-of-write-up';
import { loadEach } from '../../core/load';
import { Joints } from '../../joints/joints';
import { LoadStateView } from '../../ui/load-state/load-state';
import { EditionPage } from '../edition-page/edition-page';
import { JointHead } from '../joint-head';
import { Verdict } from '../verdict';
import { Drafts } from './drafts';

/** A draft drawn by the very components that draw its page once it is published, verdict and joint drawing included. */
@Component({
  selector: 'sl-preview-page',
  imports: [EditionPage, JointHead, LoadStateView, RouterLink, Verdict],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="bar">
      <strong>Preview: only you and the desk can see this.</strong>
      <a class="sl-plain-button" [routerLink]="['/drafts', id()]">Back to the draft</a>
    </p>
    @if (shown(); as shown) {
      <sl-verdict [joints]="shown.view.joints" />
      @if (shown.joint; as joint) {
        @defer (on idle) {
          <sl-joint-head [slug]="joint.slug" [view]="shown.view" />
        } @placeholder {
          <p class="sl-quiet">Drawing the joint …</p>
        }
      }
      <sl-edition-page [view]="shown.view" />
    } @else {
      <sl-load-state [of]="loaded()" />
    }
  `,
  styles: `
    .bar {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      justify-content: space-between;
      gap: 0.5rem 1rem;
      padding-block-end: 0.75rem;
      border-block-end: 1px solid var(--sl-ink);
    }
  `,
})
export class PreviewPage {
  readonly id = input.required({ transform: numberAttribute });
  private readonly drafts = inject(Drafts);
  private readonly joints = inject(Joints);
  /** The draft with the known joint between its parts, as its page will show it. */
  protected readonly loaded = loadEach(toObservable(this.id), (id) =>
    this.drafts.preview(id).pipe(
      switchMap(({ view }) => {
        const part = view.joints[0]?.a.part.slug;
        if (part === undefined) return of({ view, joint: null });
        return this.joints.list(part).pipe(
          map(({ items }) => ({ view, joint: jointOfWriteUp(items, view) })),
          catchError(() => of({ view, joint: null })),
        );
      }),
    ),
  );
  protected readonly shown = computed(() => {
    const loaded = this.loaded();
    return loaded.state === 'ready' ? loaded.value : null;
  });
}
