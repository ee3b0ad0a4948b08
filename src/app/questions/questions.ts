import { Injectable, inject } from '@angular/core';
import { map, type Observable } from 'rxjs';
import {
  questionRoutes,
  type AddReply,
  type ChangeQuestion,
  type QuestionLine,
  type QuestionPage,
  type Reply,
  type Settle,
  type WriteUpRef,
} from '../../../shared/contract/questions';
import type { CallOf, ResponseOf } from '../../../shared/contract/route';
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

  ask(body: CallOf<typeof questionRoutes.askQuestion>['body']): Observable<QuestionPage> {
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

  change(slug: string, body: ChangeQuestion): Observable<QuestionPage> {
    return this.api.call(questionRoutes.changeQuestion, { params: { slug }, body });
  }

  changeReply(id: number, text: string): Observable<Reply> {
    return this.api.call(questionRoutes.changeReply, { params: { id }, body: { text } });
  }

  /** A draft of the caller's from a reply; the one under way, where there is one. */
  draftFrom(replyId: number): Observable<{ draftId: number }> {
    return this.api.call(questionRoutes.draftFromReply, { params: { id: replyId } });
  }

  /** Questions like one that is being written, and the joints between its parts. */
  alike(words: string, partIds: readonly number[]): Observable<ResponseOf<typeof questionRoutes.listAlike>> {
    return this.api.call(questionRoutes.listAlike, {
      query: { q: words.slice(0, 400), part: [...new Set(partIds)].slice(0, 8) },
    });
  }

  /** Questions that a write-up settled or was made from. */
  coveredBy(writeUpSlug: string): Observable<{ items: QuestionLine[] }> {
    return this.api.call(questionRoutes.listCovered, { params: { slug: writeUpSlug } });
  }

  /** Write-ups that may be about the same, the likeliest first; of these parts only, where some are named. */
  writeUpsLike(words: string, partSlugs: readonly string[] = []): Observable<WriteUpRef[]> {
    return this.api
      .call(searchRoutes.search, {
        query: { q: words.slice(0, 200), part: [...new Set(partSlugs)].slice(0, 20), limit: offered },
      })
      .pipe(map(({ items }) => items.map((hit) => ({ slug: hit.slug, title: titleOf(hit) }))));
  }
}

function titleOf(hit: SearchHit): string {
  return hit.title.map((run) => run.text).join('');
}
