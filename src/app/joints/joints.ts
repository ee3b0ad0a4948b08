import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import {
  jointRoutes,
  type ComparedPart,
  type FitCell,
  type JointPage,
  type JointRef,
} from '../../../shared/contract/joints';
import type { CallOf, ResponseOf } from '../../../shared/contract/route';
import { Api } from '../core/api';

/** What the fit check answers: the lines, and which parts and revisions were meant. */
export type FitCheck = ResponseOf<typeof jointRoutes.checkFit>;

/** Joints, their fit tables, the fit check and the comparison. Failures are `ApiProblem`s. */
@Injectable({ providedIn: 'root' })
export class Joints {
  private readonly api = inject(Api);

  /** All known joints, or those of one part. */
  list(part?: string): Observable<{ items: JointRef[] }> {
    return this.api.call(jointRoutes.listJoints, { query: { part } });
  }

  read(slug: string): Observable<JointPage> {
    return this.api.call(jointRoutes.readJoint, { params: { slug } });
  }

  /** One voice a person and pair; a second one replaces the first. */
  report(slug: string, report: CallOf<typeof jointRoutes.reportFit>['body']): Observable<FitCell> {
    return this.api.call(jointRoutes.reportFit, {
      params: { slug },
      body: report,
    });
  }

  check(revision: number[]): Observable<FitCheck> {
    return this.api.call(jointRoutes.checkFit, { query: { revision } });
  }

  compare(part: string[], revision: number[]): Observable<{ items: ComparedPart[] }> {
    return this.api.call(jointRoutes.compareParts, {
      query: { part, revision },
    });
  }
}
