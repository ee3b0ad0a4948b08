import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  type OnInit,
  computed,
  inject,
  input,
  numberAttribute,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { MemberPage as Member } from '../../../shared/contract/members';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';
import { ShimloreTitles } from '../core/titles';
import { Icon } from '../ui/icon/icon';
import { ProblemNote } from '../ui/problem-note/problem-note';
import { Undo } from '../ui/undo/undo';
import { AuditTrail } from './audit-trail';
import { LiftForm } from './lift-form';
import { LimitForm } from './limit-form';
import { limitWords } from './limit-words';
import { Members } from './members';

/** A member as the desk sees them: what they wrote, what holds on the account, and what did before. */
@Component({
  selector: 'sl-member-page',
  imports: [AuditTrail, DatePipe, Icon, LiftForm, LimitForm, ProblemNote, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './member-page.html',
  styleUrl: './member-page.scss',
})
export class MemberPageView implements OnInit {
  readonly id = input.required({ transform: numberAttribute });
  private readonly members = inject(Members);
  private readonly titles = inject(ShimloreTitles);
  private readonly undo = inject(Undo);
  protected readonly limitWords = limitWords;
  protected readonly member = signal<Member | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  protected readonly round = signal(0);
  protected readonly holding = computed(() => this.member()?.limits.find((limit) => limit.holds) ?? null);
  protected readonly earlier = computed(() => this.member()?.limits.filter((limit) => !limit.holds) ?? []);
  protected readonly counts = computed(() => {
    const works = this.member()?.works;
    if (!works) return [];
    return [
      ['questions', works.questions],
      ['replies', works.replies],
      ['trials', works.trials],
      ['readings', works.readings],
      ['fit reports', works.fitReports],
      ['photos', works.photos],
    ] as const;
  });

  ngOnInit(): void {
    this.fetch();
  }

  protected fetch(): void {
    this.problem.set(null);
    this.members.read(this.id()).subscribe({
      next: (member) => this.take(member),
      error: (error: unknown) => this.problem.set(toApiProblem(error).problem),
    });
  }

  protected decided(member: Member, what: string): void {
    this.take(member);
    this.undo.tell(what);
  }

  private take(member: Member): void {
    this.member.set(member);
    this.round.update((round) => round + 1);
    this.titles.describe({ title: member.displayName });
  }
}
