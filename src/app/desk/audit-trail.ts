import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable } from '@angular/core/rxjs-interop';
import { map } from 'rxjs';
import { auditRoutes } from '../../../shared/contract/audit';
import { Api } from '../core/api';
import { loadEach } from '../core/load';
import { AuditLines } from '../ui/audit-lines/audit-lines';
import { LoadStateView } from '../ui/load-state/load-state';

/** What the audit log has on the thing at hand. */
@Component({
  selector: 'sl-audit-trail',
  imports: [AuditLines, LoadStateView],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (lines(); as lines) {
      @if (lines.length) {
        <sl-audit-lines [lines]="lines" [subjects]="subjects()" />
      } @else {
        <p class="sl-quiet">Nothing was decided on it yet.</p>
      }
    } @else {
      <sl-load-state [of]="loaded()" />
    }
  `,
})
export class AuditTrail {
  readonly kind = input.required<string>();
  readonly id = input.required<number>();
  /** Whether each entry says what it is about. */
  readonly subjects = input(false);
  /** Changes when something was decided, so that the entries are read anew. */
  readonly round = input(0);
  private readonly api = inject(Api);
  private readonly thing = computed(() => ({ kind: this.kind(), id: this.id(), round: this.round() }));
  protected readonly loaded = loadEach(toObservable(this.thing), ({ kind, id }) =>
    this.api.call(auditRoutes.readSubjectAudit, { params: { kind, id } }).pipe(map((answer) => answer.items)),
  );
  protected readonly lines = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value : null;
  });
}
