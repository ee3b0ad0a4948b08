import {
  HttpEventType,
  HttpHeaders,
  HttpRequest,
  HttpXhrBackend,
  HttpXsrfTokenExtractor,
} from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { catchError, filter, map, throwError, type Observable } from 'rxjs';
import { photoRoutes, type Photo } from '../../../../shared/contract/photos';
import { toApiProblem } from '../../core/api-problem';

export type UploadStep =
  | { kind: 'sending'; /** 0 to 1; null where the browser cannot tell. */ share: number | null }
  | { kind: 'stored'; photo: Photo };

/** Sends photos. By XMLHttpRequest, because fetch tells nothing about how far an upload has come. */
@Injectable({ providedIn: 'root' })
export class PhotoUpload {
  private readonly backend = inject(HttpXhrBackend);
  private readonly token = inject(HttpXsrfTokenExtractor);

  send(file: File, alt: string): Observable<UploadStep> {
    const form = new FormData();
    form.append('alt', alt);
    form.append('file', file, file.name);
    const request = new HttpRequest('POST', photoRoutes.addPhoto.path, form, {
      reportProgress: true,
      headers: new HttpHeaders({ 'X-XSRF-TOKEN': this.token.getToken() ?? '' }),
    });
    return this.backend.handle(request).pipe(
      map((event): UploadStep | null => {
        if (event.type === HttpEventType.UploadProgress) {
          return { kind: 'sending', share: event.total ? event.loaded / event.total : null };
        }
        return event.type === HttpEventType.Response ? { kind: 'stored', photo: event.body as Photo } : null;
      }),
      filter((step) => step !== null),
      catchError((error: unknown) => throwError(() => toApiProblem(error))),
    );
  }
}
