import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { type Observable, catchError, map, throwError } from 'rxjs';
import { asApiProblem } from '../../core/api/api-problem';
import { type OpenApiDocument, openApiDocument } from './openapi-document';

/** Where the document lies; also a link on the page, for machines. */
export const OPENAPI_ADDRESS = '/api/v1/openapi.json';

@Injectable({ providedIn: 'root' })
export class OpenApiApi {
  private readonly http = inject(HttpClient);

  read(): Observable<OpenApiDocument> {
    return this.http.get<unknown>(OPENAPI_ADDRESS).pipe(
      map((document) => openApiDocument.parse(document)),
      catchError((error: unknown) => throwError(() => asApiProblem(error))),
    );
  }
}
