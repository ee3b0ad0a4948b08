import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { ActivatedRoute, Router } from '@angular/router';
import { catchError, debounceTime, map, of, switchMap } from 'rxjs';
import { auditRoutes as routes, type AuditFilter, type AuditLine } from '../../../shared/contract/audit';
import type { Problem } from '../../../shared/contract/problem';
import { actionWords } from '../../../shared/text/audit-words';
import { Api } from '../core/api';
import { toApiProblem } from '../core/api-problem';
import { statesOf } from '../core/load';
import { AuditLines } from '../ui/audit-lines/audit-lines';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { AdminTabs } from './admin-tabs';

const fields = ['who', 'action', 'kind', 'words', 'from', 'to'] as const;

/** The audit log: searched, paged, and taken home as a file. The address holds what is asked for. */
@Component({
  selector: 'sl-audit-page',
  imports: [AdminTabs, AuditLines, ProblemNote, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './audit-page.html',
  styleUrl: './audit-page.scss',
})
export class AuditPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  protected readonly words = actionWords;
  protected readonly lines = signal<readonly AuditLine[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly busy = signal(true);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly names = toSignal(
    this.api.call(routes.listAuditNames).pipe(catchError(() => of({ actions: [], kinds: [] }))),
    { initialValue: { actions: [], kinds: [] } },
  );
  private readonly filter = toSignal(
    this.route.queryParamMap.pipe(
      map((query): AuditFilter =>
        Object.fromEntries(fields.flatMap((field) => (query.get(field) ? [[field, query.get(field)]] : []))),
      ),
    ),
    { requireSync: true },
  );
  protected readonly narrowed = computed(() => Object.keys(this.filter()).length > 0);
  protected readonly csv = computed(() => this.exportAddress('csv'));
  protected readonly jsonLines = computed(() => this.exportAddress('jsonl'));
  protected readonly form = new FormGroup(
    Object.fromEntries(
      fields.map((field) => [field, new FormControl(this.filter()[field] ?? '', { nonNullable: true })]),
    ) as Record<(typeof fields)[number], FormControl<string>>,
  );

  constructor() {
    this.form.valueChanges
      .pipe(debounceTime(250), takeUntilDestroyed())
      .subscribe((typed) => this.ask(typed));
    this.route.queryParamMap
      .pipe(
        switchMap(() => statesOf(this.page())),
        takeUntilDestroyed(),
      )
      .subscribe((now) => {
        this.busy.set(now.state === 'loading');
        this.problem.set(now.state === 'failed' ? now.problem : null);
        if (now.state !== 'ready') return;
        this.lines.set(now.value.items);
        this.next.set(now.value.next);
      });
  }

  protected clear(): void {
    this.form.reset();
  }

  protected more(): void {
    this.busy.set(true);
    this.problem.set(null);
    this.page(this.next() ?? undefined).subscribe({
      next: ({ items, next }) => {
        this.busy.set(false);
        this.lines.update((lines) => [...lines, ...items]);
        this.next.set(next);
      },
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(toApiProblem(error).problem);
      },
    });
  }

  protected kindWords(kind: string): string {
    return kind.replaceAll('-', ' ');
  }

  private ask(typed: Partial<Record<(typeof fields)[number], string>>): void {
    const queryParams = Object.fromEntries(
      fields.map((field) => [field, typed[field]?.trim() ? typed[field].trim() : null]),
    );
    void this.router.navigate([], { relativeTo: this.route, queryParams, replaceUrl: true });
  }

  private page(cursor?: string) {
    return this.api.call(routes.listAudit, { query: { ...this.filter(), cursor, limit: 50 } });
  }

  private exportAddress(form: 'csv' | 'jsonl'): string {
    const query = new URLSearchParams({ form, ...(this.filter() as Record<string, string>) });
    return `${routes.exportAudit.path}?${query}`;
  }
}
