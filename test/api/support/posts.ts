import type { MemberAgent } from './app.js';
import type { TestJoint } from './write-ups.js';

let asked = 0;

/** A question of the member about the joint; its slug and its identity. */
export async function askAbout(
  member: MemberAgent,
  joint: TestJoint,
  title = 'Why does the bracket still rock?',
): Promise<{ slug: string; id: number }> {
  asked += 1;
  const { body } = await member
    .post('/api/questions')
    .send({
      title: `${title} (${asked})`,
      text: 'It rocks about the raised lip, whatever I tighten.',
      parts: [{ partId: joint.motor.id, revisionId: null }],
      symptoms: [],
      readings: [],
      worksheet: null,
    })
    .expect(201);
  return { slug: body.slug, id: Number(/(\d+)$/.exec(body.slug)![1]) };
}

export async function replyTo(
  member: MemberAgent,
  slug: string,
  text = 'Try a thicker disc.',
): Promise<number> {
  const { body } = await member
    .post(`/api/questions/${slug}/replies`)
    .send({ text, worksheet: null })
    .expect(201);
  return body.id;
}

export async function reportTrialOf(
  member: MemberAgent,
  slug: string,
  fixKey: string,
  over: object = {},
): Promise<number> {
  const { body } = await member
    .post(`/api/write-ups/${slug}/trials`)
    .send({ fixKey, outcome: 'held', revisionIds: [], note: 'Sits flat.', figure: null, ...over })
    .expect(201);
  return body.id;
}
