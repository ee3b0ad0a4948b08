import { describe, expect, it } from 'vitest';
import { AddReply, AskQuestion } from '../../shared/contract/questions.js';
import { planQuestions } from './plan-questions.js';
import { seededNumbers } from './random.js';
import { demoWriteUps } from './write-ups.js';

const people = ['owner', 'author', 'bram', 'calla', 'dov', 'edda', 'fenno'];
const planned = planQuestions(demoWriteUps, people, seededNumbers(150));

describe('the questions of the demo', () => {
  it('are 150, each with words of its own, and some six in ten are settled', () => {
    expect(planned).toHaveLength(150);
    expect(new Set(planned.map(({ title }) => title)).size).toBe(150);
    const settled = planned.filter(({ settledBy }) => settledBy !== null).length;
    expect(settled).toBeGreaterThanOrEqual(80);
    expect(settled).toBeLessThanOrEqual(100);
  });

  it('are the same in every run', () => {
    expect(planQuestions(demoWriteUps, people, seededNumbers(150))).toEqual(planned);
  });

  it.each(planned.map((question) => [question.title, question] as const))(
    '“%s” could have been asked and answered on the site',
    (_, question) => {
      const asked = AskQuestion.safeParse({
        title: question.title,
        text: question.text,
        parts: question.parts.map((_part, index) => ({ partId: index + 1, revisionId: null })),
        symptoms: question.symptoms,
        readings: question.readings,
        worksheet: null,
      });
      expect(asked.error?.issues ?? []).toEqual([]);
      for (const { text, worksheet } of question.replies)
        expect(AddReply.safeParse({ text, worksheet }).error?.issues ?? []).toEqual([]);
    },
  );
});
