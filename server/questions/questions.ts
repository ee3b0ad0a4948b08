import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import { toPlainText } from '../text/render-text.js';
import type { Happenings } from '../watches/happenings.js';
import { createQuestionLinksStore } from './question-links.store.js';
import { createQuestionPhotosStore } from './question-photos.store.js';
import { createQuestionViews, type QuestionPhotos } from './question-view.js';
import { createQuestionStore } from './question.store.js';
import { questionBindings } from './questions.routes.js';
import { createQuestionService, type JointsBetween } from './questions.service.js';
import { createReplyService, type DraftStarter } from './replies.service.js';
import { createReplyStore } from './reply.store.js';
import { createSettlingService, type PublishedFixes } from './settling.service.js';

/** Open problems of members, what others say to them, and what settled them. */
export function createQuestions(needs: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  joints: JointsBetween;
  writeUps: PublishedFixes & DraftStarter;
  photos: QuestionPhotos;
  renderText: (source: string) => RichText;
  limits: RateLimits;
  deskInbox: DeskInbox;
  happenings: Happenings;
}): { bindings: RouteBinding[] } {
  const { knex, renderText } = needs;
  const around = {
    ...needs,
    store: createQuestionStore(knex),
    replies: createReplyStore(knex),
    attached: createQuestionPhotosStore(knex),
    links: createQuestionLinksStore(knex),
    plainText: (markdown: string) => toPlainText(renderText(markdown).html),
    newKey: () => randomUUID(),
  };
  const views = createQuestionViews(around);
  return {
    bindings: questionBindings(
      createQuestionService({ ...around, views }),
      createReplyService({ ...around, views }),
      createSettlingService({ ...around, views }),
      needs.limits,
    ),
  };
}
