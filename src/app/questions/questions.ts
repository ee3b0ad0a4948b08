import { Injectable, inject } from '@angular/core';
import { map, type Observable } from 'rxjs';
import {
  questionRoutes,
  type AddReply,
  type AskQuestion,
  type QuestionLine,
  type QuestionPage,
  type Reply,
  type Settle,
} from '../../../shared/contract/questions';
import type { CallOf } from '../../../shared/contract/route';
import { searchRoutes, type SearchHit } from '../../../shared/contract/search';
import { Api } from '../core/api';

const offered = 5;

/** Questions of members and the replies to them. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Questions {
  private readonly api = inject(Api);

  list(
    query: CallOf<typeof questionRoutes.listQuestions>['query'],
  ): Observable<{ items: QuestionLine[]; next: string | null }> {
    return this.api.call(questionRoutes.listQuestions, { query });
  }

  read(slug: string): Observable<QuestionPage> {
    return this.api.call(questionRoutes.readQuestion, { params: { slug } });
  }

  ask(body: AskQuestion): Observable<QuestionPage> {
    return this.api.call(questionRoutes.askQuestion, { body });
  }

  reply(slug: string, body: AddReply): Observable<Reply> {
    return this.api.call(questionRoutes.addReply, { params: { slug }, body });
  }

  settle(slug: string, body: Settle): Observable<QuestionPage> {
    return this.api.call(questionRoutes.settleQuestion, { params: { slug }, body });
  }

  reopen(slug: string): Observable<QuestionPage> {
    return this.api.call(questionRoutes.reopenQuestion, { params: { slug } });
  }

  /** Write-ups that may be about the same, the likeliest first. */
  writeUpsLike(words: string): Observable<{ slug: string; title: string }[]> {
    return this.api
      .call(searchRoutes.search, { query: { q: words.slice(0, 200), limit: offered } })
      .pipe(map(({ items }) => items.map((hit) => ({ slug: hit.slug, title: titleOf(hit) }))));
  }
}

function titleOf(hit: SearchHit): string {
  return hit.title.map((run) => run.text).join('');
}
