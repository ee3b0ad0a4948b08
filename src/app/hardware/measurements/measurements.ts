import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  measurementRoutes,
  type AddMeasurement,
  type DimensionConsensus,
  type DimensionReadings,
  type PartMeasurements,
} from '../../../../shared/contract/measurements';
import type { ResponseOf } from '../../../../shared/contract/route';
import { Api } from '../../core/api';

/** Readings of parts and what they come to. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Measurements {
  private readonly api = inject(Api);

  ofPart(slug: string): Observable<PartMeasurements> {
    return this.api.call(measurementRoutes.readPartMeasurements, { params: { slug } });
  }

  readings(slug: string, feature: string, dimension: string): Observable<DimensionReadings> {
    return this.api.call(measurementRoutes.readDimension, { params: { slug, feature, dimension } });
  }

  add(reading: AddMeasurement): Observable<ResponseOf<typeof measurementRoutes.addMeasurement>> {
    return this.api.call(measurementRoutes.addMeasurement, { body: reading });
  }

  setAside(id: number, reason: string): Observable<{ consensus: DimensionConsensus | null }> {
    return this.api.call(measurementRoutes.setAsideMeasurement, { params: { id }, body: { reason } });
  }

  takeBack(id: number): Observable<{ consensus: DimensionConsensus | null }> {
    return this.api.call(measurementRoutes.takeBackMeasurement, { params: { id } });
  }
}
