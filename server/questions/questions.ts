import type { Knex } from 'knex';
import type { RichText } from '../../shared/contract/write-ups.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import { createQuestionStore } from './question.store.js';
import { questionBindings } from './questions.routes.js';
import { createQuestionService, type PublishedFixes } from './questions.service.js';

/** Open problems of members, and what others say to them. */
export function createQuestions(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  writeUps: PublishedFixes;
  renderText: (source: string) => RichText;
  limits: RateLimits;
  deskInbox: DeskInbox;
}): { bindings: RouteBinding[] } {
  const service = createQuestionService({ ...around, store: createQuestionStore(around.knex) });
  return { bindings: questionBindings(service, around.limits) };
}
