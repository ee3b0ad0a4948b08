/**
 * What becomes of each row that names an account when that account is deleted. `goes`: the row is deleted. `stays`: it
 * goes on under “a former member”. A feature with a table of its own adds its line here.
 */
export const whatBecomes = {
  'account_tokens.account_id': 'goes',
  'sessions.account_id': 'goes',
  'bench_items.account_id': 'goes',
  'own_stock.account_id': 'goes',
  'watches.account_id': 'goes',
  'notices.account_id': 'goes',
  'digests.account_id': 'goes',
  'happening_people.account_id': 'goes',
  'mail_outbox.account_id': 'goes',
  'mail_bounces.account_id': 'goes',
  'maker_members.account_id': 'goes',
  'maker_requests.account_id': 'goes',
  'desk_claims.moderator_id': 'goes',
  // Told to the desk in confidence; the case itself and its decision stay.
  'flags.account_id': 'goes',
  // Drafts go before; photos that nothing shows any more go after.
  'editions.author_id': 'stays',
  'write_ups.created_by': 'stays',
  'photos.owner_id': 'stays',
  'edition_opinions.account_id': 'stays',
  'measurements.account_id': 'stays',
  'trials.account_id': 'stays',
  'fit_reports.account_id': 'stays',
  'questions.account_id': 'stays',
  'question_replies.account_id': 'stays',
  'hardware_proposals.account_id': 'stays',
  'maker_answers.account_id': 'stays',
  'maker_answer_texts.account_id': 'stays',
  'maker_letters.account_id': 'stays',
  'cautions.placed_by': 'stays',
  'caution_library_versions.changed_by': 'stays',
  'member_limits.account_id': 'stays',
  'hand_overs.from_id': 'stays',
  'hand_overs.to_id': 'stays',
  'happenings.actor_id': 'stays',
  'first_posts.account_id': 'stays',
  'flagged.writer_id': 'stays',
  // Who decided what, for the desk.
  'audit_log.actor_id': 'stays',
  'measurements.set_aside_by': 'stays',
  'hardware_proposals.decided_by': 'stays',
  'maker_requests.decided_by': 'stays',
  'write_ups.withdrawn_by': 'stays',
  'questions.taken_down_by': 'stays',
  'question_replies.taken_down_by': 'stays',
  'trials.taken_down_by': 'stays',
  'fit_reports.taken_down_by': 'stays',
  'photos.taken_down_by': 'stays',
  'member_limits.set_by': 'stays',
  'member_limits.lifted_by': 'stays',
  'flagged.decided_by': 'stays',
  'first_posts.decided_by': 'stays',
  'photo_looks.decided_by': 'stays',
} as const satisfies Record<string, 'goes' | 'stays'>;

/** Table and column of the rows that go. */
export const goingRows = Object.entries(whatBecomes).flatMap(([name, becomes]) => {
  const [table = '', column = ''] = name.split('.');
  return becomes === 'goes' ? [{ table, column }] : [];
});
