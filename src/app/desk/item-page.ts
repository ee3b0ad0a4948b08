import { signal } from '@angular/core';
import type { Observable } from 'rxjs';
import type { Problem } from '../../../shared/contract/problem';
import { toApiProblem } from '../core/api-problem';

/** An item of the desk as its page knows it: read anew on wish, shown until the answer is there. */
export class ItemReading<Item> {
  readonly item = signal<Item | null>(null);
  readonly problem = signal<Problem | null>(null);

  constructor(private readonly read: () => Observable<Item>) {}

  fetch(): void {
    this.problem.set(null);
    this.read().subscribe({
      next: (item) => this.item.set(item),
      error: (error: unknown) => this.failed(error),
    });
  }

  failed(error: unknown): void {
    this.problem.set(toApiProblem(error).problem);
  }
}
