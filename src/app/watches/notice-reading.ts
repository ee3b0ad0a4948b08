import { Injectable } from '@angular/core';
import { Subject } from 'rxjs';

/** Tells the header that notices were marked on the page of notices. */
@Injectable({ providedIn: 'root' })
export class NoticeReading {
  readonly changed = new Subject<void>();
}
