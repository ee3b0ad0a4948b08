import type { Knex } from 'knex';
import type { FeatureKind } from '../../../shared/contract/vocabulary.js';
import type { JointKind } from '../../../shared/fit/joint-kinds.js';
import type { MemberAgent } from './app.js';
import type { TestPart } from './catalogue.js';

export interface TestFeature {
  readonly id: number;
  readonly slug: string;
}

let made = 0;

export async function insertFeature(
  knex: Knex,
  part: TestPart,
  kind: FeatureKind,
  process: 'machined' | 'printed' | 'cast' = 'machined',
): Promise<TestFeature> {
  made += 1;
  const slug = `${kind}-${made}`;
  const [id] = await knex('features').insert({
    part_id: part.id,
    slug,
    name: `${kind} ${made}`,
    kind,
    process,
  });
  return { id: id!, slug };
}

export async function insertJointOf(
  knex: Knex,
  kind: JointKind,
  a: TestFeature,
  b: TestFeature,
): Promise<string> {
  made += 1;
  const slug = `joint-${made}`;
  await knex('joints').insert({ slug, name: `Joint ${made}`, kind, feature_a: a.id, feature_b: b.id });
  return slug;
}

/** A caliper reading in mm as the form sends it. */
export function reading(feature: TestFeature, revisionId: number, dimension: string, ...values: number[]) {
  return {
    featureId: feature.id,
    revisionId,
    dimension,
    values,
    unit: 'mm',
    instrument: 'caliper',
    uncertainty: null,
    photoId: null,
  };
}

/** Records readings one after the other; each must be taken. */
export async function record(member: MemberAgent, ...readings: ReturnType<typeof reading>[]): Promise<void> {
  for (const body of readings) await member.post('/api/measurements').send(body).expect(201);
}
