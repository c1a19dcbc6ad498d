import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Variant,
  type VariantFields,
  variantCreate,
  variantList,
  variantRetire,
  variantUpdate,
  variantRead,
} from '#shared/contracts/variants';
import { ApiClient } from '../../core/api/api-client';

/** The variants of a programme, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class VariantsApi {
  private readonly api = inject(ApiClient);

  list(programmeId: string): Observable<readonly Variant[]> {
    return this.api.call(variantList, { params: { programmeId } }).pipe(map((answer) => answer.variants));
  }

  read(programmeId: string, variantId: string): Observable<Variant> {
    return this.api.call(variantRead, { params: { programmeId, variantId } });
  }

  create(programmeId: string, body: VariantFields, commandKey: string): Observable<Variant> {
    return this.api.call(variantCreate, { params: { programmeId }, body, commandKey });
  }

  update(
    { programmeId, id: variantId, version: ifMatch }: Pick<Variant, 'programmeId' | 'id' | 'version'>,
    body: VariantFields,
    commandKey: string,
  ): Observable<Variant> {
    return this.api.call(variantUpdate, { params: { programmeId, variantId }, body, ifMatch, commandKey });
  }

  retire(
    { programmeId, id: variantId, version: ifMatch }: Pick<Variant, 'programmeId' | 'id' | 'version'>,
    retired: boolean,
  ): Observable<Variant> {
    return this.api.call(variantRetire, { params: { programmeId, variantId }, body: { retired }, ifMatch });
  }
}
