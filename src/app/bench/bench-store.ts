import { Injectable, computed, signal } from '@angular/core';

@Injectable({ providedIn: 'root' })
export class BenchStore {
  private readonly items = signal<readonly unknown[]>([]);
  readonly size = computed(() => this.items().length);
}
