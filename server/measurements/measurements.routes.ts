import { measurementRoutes as routes } from '../../shared/contract/measurements.js';
import { bind, memberOf, type RouteBinding } from '../http/binding.js';
import type { RateLimits } from '../http/rate-limits.js';
import type { MeasurementService } from './measurements.service.js';

export function measurementBindings(measurements: MeasurementService, limits: RateLimits): RouteBinding[] {
  return [
    bind(routes.readPartMeasurements, ({ params }) => measurements.partMeasurements(params.slug)),
    bind(routes.readDimension, ({ params }) =>
      measurements.dimensionReadings(params.slug, params.feature, params.dimension),
    ),
    bind(routes.addMeasurement, async ({ caller, body }) => {
      const { accountId } = memberOf(caller);
      await limits.take('measurement', String(accountId));
      return measurements.add(accountId, body);
    }),
    bind(routes.setAsideMeasurement, ({ params, caller, body }) =>
      measurements.setAside(params.id, memberOf(caller).accountId, body.reason),
    ),
    bind(routes.takeBackMeasurement, ({ params, caller }) =>
      measurements.takeBack(params.id, memberOf(caller).accountId),
    ),
  ];
}
