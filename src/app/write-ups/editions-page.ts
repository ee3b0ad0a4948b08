import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, linkedSignal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { loadEach } from '../core/load';
import { ShimloreTitles } from '../core/titles';
import { LoadStateView } from '../ui/load-state/load-state';
import { WriteUps } from './write-ups';

/** Every edition with who, when and why; two can be picked to be laid over each other. */
@Component({
  selector: 'sl-editions-page',
  imports: [DatePipe, LoadStateView, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './editions-page.html',
  styleUrl: './editions-page.scss',
})
export class EditionsPage {
  private readonly route = inject(ActivatedRoute);
  private readonly router = inject(Router);
  private readonly titles = inject(ShimloreTitles);
  private readonly writeUps = inject(WriteUps);

  protected readonly slug = toSignal(this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')), {
    initialValue: '',
  });
  protected readonly loaded = loadEach(
    this.route.paramMap.pipe(map((params) => params.get('slug') ?? '')),
    (slug) => this.writeUps.editions(slug),
  );
  protected readonly editions = computed(() => {
    const now = this.loaded();
    return now.state === 'ready' ? now.value.items : null;
  });
  protected readonly to = linkedSignal(() => this.editions()?.[0]?.number ?? 0);
  protected readonly from = linkedSignal(() => this.editions()?.[1]?.number ?? 0);

  constructor() {
    effect(() => {
      const now = this.loaded();
      if (now.state === 'failed') this.titles.failed(now.problem);
      const title = this.editions()?.[0]?.title;
      if (title)
        this.titles.describe({
          title: `Editions of “${title}”`,
          description: `Who changed “${title}”, when and why.`,
        });
    });
  }

  protected compare(event: Event): void {
    event.preventDefault();
    const [from, to] = [this.from(), this.to()].sort((one, other) => one - other);
    void this.router.navigate(['/write-ups', this.slug(), 'compare'], { queryParams: { from, to } });
  }
}
