import type { Knex } from 'knex';
import type { AuditLog } from '../audit/audit.js';
import type { HardwareService } from '../hardware/hardware.js';
import type { RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { DeskInbox } from '../moderation/desk-inbox.js';
import type { Happenings } from '../watches/happenings.js';
import { createMeasurementStore } from './measurement.store.js';
import { measurementBindings } from './measurements.routes.js';
import {
  createMeasurementService,
  type KnownDimensions,
  type MeasurementService,
} from './measurements.service.js';

export type { KnownDimensions, MeasurementService };

/** Readings of dimensions, and the consensus kept of them. */
export function createMeasurements(around: {
  knex: Knex;
  clock: () => Date;
  hardware: HardwareService;
  limits: RateLimits;
  audit: AuditLog;
  happenings: Happenings;
  deskInbox: DeskInbox;
}): {
  bindings: RouteBinding[];
  service: MeasurementService;
} {
  const service = createMeasurementService({ ...around, store: createMeasurementStore(around.knex) });
  return { bindings: measurementBindings(service, around.limits), service };
}
