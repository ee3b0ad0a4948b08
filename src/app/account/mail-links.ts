import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import type { z } from 'zod';
import { mailRoutes } from '../../../shared/contract/mail';
import { Api } from '../core/api';

export type MailChoice = z.input<typeof mailRoutes.makeMailChoice.body>;
type Choices = z.output<typeof mailRoutes.readMailChoices.response>;

/** What the link at the foot of a mail can change; its token is the proof, nobody need be signed in. */
@Injectable({ providedIn: 'root' })
export class MailLinks {
  private readonly api = inject(Api);

  choices(token: string, watch: string | undefined): Observable<Choices> {
    return this.api.call(mailRoutes.readMailChoices, { query: { token, watch } });
  }

  choose(body: MailChoice): Observable<unknown> {
    return this.api.call(mailRoutes.makeMailChoice, { body });
  }
}
