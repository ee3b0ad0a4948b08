import { DOCUMENT, Injectable, computed, inject, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { z } from 'zod';
import { OwnStock, ownStockRoutes } from '../../../shared/contract/own-stock';
import type { OwnPiece } from '../../../shared/contract/worksheet';
import { Api } from '../core/api';
import { Session } from '../core/session';

const storageKey = 'shimlore-stock';
const Kept = z.array(OwnStock);
const mostKept = 100;

/** The reader's own shim stock: a member's on the server, a visitor's in this browser. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class OwnStockStore {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly known = signal<readonly OwnStock[]>([]);

  /** Thinnest first. */
  readonly pieces = computed(() =>
    [...this.known()].sort((one, other) => one.thickness - other.thickness || one.id - other.id),
  );

  async load(): Promise<void> {
    this.known.set(
      this.isMember ? (await firstValueFrom(this.api.call(ownStockRoutes.listOwnStock))).items : this.read(),
    );
  }

  async add(piece: OwnPiece): Promise<OwnStock> {
    const added = this.isMember
      ? await firstValueFrom(this.api.call(ownStockRoutes.addOwnStock, { body: piece }))
      : { id: Math.max(0, ...this.known().map((one) => one.id)) + 1, ...piece };
    this.keep([...this.known(), added].slice(-mostKept));
    return added;
  }

  async remove(piece: OwnStock): Promise<void> {
    if (this.isMember)
      await firstValueFrom(this.api.call(ownStockRoutes.removeOwnStock, { params: { id: piece.id } }));
    this.keep(this.known().filter((one) => one.id !== piece.id));
  }

  private get isMember(): boolean {
    return this.session.account() !== null;
  }

  private keep(pieces: readonly OwnStock[]): void {
    this.known.set(pieces);
    if (this.isMember) return;
    try {
      this.window?.localStorage.setItem(storageKey, JSON.stringify(pieces));
    } catch {
      // A full or forbidden storage keeps the stock for this visit only.
    }
  }

  private read(): readonly OwnStock[] {
    try {
      const kept = Kept.safeParse(JSON.parse(this.window?.localStorage.getItem(storageKey) ?? '[]'));
      return kept.success ? kept.data : [];
    } catch {
      return [];
    }
  }
}
