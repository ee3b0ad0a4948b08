import type { Knex } from 'knex';
import type { RouteBinding } from '../http/binding.js';
import type { MeasurementService } from '../measurements/measurements.js';
import type { Happenings } from '../watches/happenings.js';
import type { WriteUpService } from '../write-ups/write-ups.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import { createJointWriteUpStore } from './joint-write-ups.store.js';
import { createJointStore } from './joint.store.js';
import { jointBindings } from './joints.routes.js';
import { createJointService, type JointService } from './joints.service.js';

/** Joints of features, the fit table of their revisions, the fit check and the comparison. */
export function createJoints(around: {
  knex: Knex;
  clock: () => Date;
  measurements: MeasurementService;
  writeUps: WriteUpService;
  happenings: Happenings;
  deskInbox: DeskInbox;
}): {
  bindings: RouteBinding[];
  service: JointService;
} {
  const { knex } = around;
  const service = createJointService({
    ...around,
    store: createJointStore(knex),
    pairs: createJointWriteUpStore(knex),
  });
  return { bindings: jointBindings(service), service };
}
