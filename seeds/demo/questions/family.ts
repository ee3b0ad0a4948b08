/** Questions on one fit problem of the demo, and what others said to them. */
export interface QuestionFamily {
  /** Slug of the write-up on it; its parts, symptoms and readings are the questions'. */
  readonly writeUp: string;
  /** One question for each. */
  readonly titles: readonly string[];
  /** What is noticed; told in turn. */
  readonly notices: readonly string[];
  /** What has been tried already. */
  readonly tried: readonly string[];
  /** What was said of a fix, by its key. */
  readonly answers: Readonly<Record<string, string>>;
  /** Further replies: things asked back or warned of. */
  readonly asides: readonly string[];
}

export function family(writeUp: string, parts: Omit<QuestionFamily, 'writeUp'>): QuestionFamily {
  return { writeUp, ...parts };
}
