import { jpeg } from '../../fixtures/photos.js';
import type { Photo } from '../../../shared/contract/photos.js';
import type { QuestionPage, Reply } from '../../../shared/contract/questions.js';
import type { MemberAgent } from './app.js';
import type { TestJoint } from './write-ups.js';

/** A question that lacks nothing, about the motor's second revision and a bracket of unknown revision. */
export function questionAbout({ motor, bracket, symptom }: TestJoint, over: object = {}) {
  return {
    title: 'Why does the bracket still rock?',
    text: 'It rocks about the *raised* lip, whatever I tighten.',
    parts: [
      { partId: motor.id, revisionId: motor.revisions[1]!.id },
      { partId: bracket.id, revisionId: null },
    ],
    symptoms: [symptom],
    readings: [{ dimension: 'lip diameter', value: 32.1, unit: 'mm', instrument: 'caliper' }],
    worksheet: null,
    ...over,
  };
}

export async function askAs(who: MemberAgent, question: object): Promise<QuestionPage> {
  return (await who.post('/api/questions').send(question).expect(201)).body;
}

export async function replyAs(who: MemberAgent, slug: string, over: object = {}): Promise<Reply> {
  const reply = { text: 'Lay a disc behind it.', worksheet: null, ...over };
  return (await who.post(`/api/questions/${slug}/replies`).send(reply).expect(201)).body;
}

let width = 600;

/** A new photo of the member's own. */
export async function photoOf(who: MemberAgent, alt: string): Promise<Photo> {
  width += 10;
  const file = await jpeg(width, 300);
  return (await who.post('/api/photos').field('alt', alt).attach('file', file, 'part.jpg').expect(201)).body;
}

export function fieldsOf(body: { fields: { path: string }[] }): string[] {
  return body.fields.map((field) => field.path);
}
