import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  importChooseSheet,
  importConfirm,
  importDiscard,
  importFixRows,
  importList,
  importMap,
  importRead,
  importRows,
  importStop,
  importUpload,
  importWithdraw,
} from '#shared/contracts/import-endpoints';
import {
  type ImportDetail,
  type ImportFix,
  type ImportMapping,
  type ImportRow,
  type ImportSummary,
  type RowFilter,
} from '#shared/contracts/imports';
import { ApiClient } from '../../core/api/api-client';

type Known = Pick<ImportDetail, 'id' | 'programmeId' | 'version'>;

export interface RowPage {
  readonly rows: readonly ImportRow[];
  readonly total: number;
  readonly counts: ImportDetail['counts'];
}

/** The imports of a programme, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ImportsApi {
  private readonly api = inject(ApiClient);

  list(programmeId: string): Observable<readonly ImportSummary[]> {
    return this.api.call(importList, { params: { programmeId } }).pipe(map((answer) => answer.imports));
  }

  read(programmeId: string, importId: string): Observable<ImportDetail> {
    return this.api.call(importRead, { params: { programmeId, importId } });
  }

  upload(programmeId: string, file: File): Observable<ImportDetail> {
    return this.api.call(importUpload, { params: { programmeId }, file });
  }

  chooseSheet(known: Known, sheet: number): Observable<ImportDetail> {
    return this.api.call(importChooseSheet, {
      params: paramsOf(known),
      body: { sheet },
      ifMatch: known.version,
    });
  }

  map(known: Known, body: ImportMapping): Observable<ImportDetail> {
    return this.api.call(importMap, { params: paramsOf(known), body, ifMatch: known.version });
  }

  rows(known: Known, filter: RowFilter, offset: number, limit: number): Observable<RowPage> {
    const { column, ...rest } = filter;
    const query = {
      ...rest,
      ...(column === undefined ? {} : { column: String(column) }),
      offset: String(offset),
      limit: String(limit),
    };
    return this.api.call(importRows, { params: paramsOf(known), query });
  }

  fix(
    known: Known,
    body: ImportFix,
  ): Observable<{ changedRows: number; checkedRows: number; import: ImportDetail }> {
    return this.api.call(importFixRows, { params: paramsOf(known), body });
  }

  confirm(known: Known, leavingOutRefusedRows: number): Observable<ImportDetail> {
    return this.api.call(importConfirm, {
      params: paramsOf(known),
      body: { leavingOutRefusedRows },
      ifMatch: known.version,
    });
  }

  stop(known: Known): Observable<ImportDetail> {
    return this.api.call(importStop, { params: paramsOf(known) });
  }

  discard(known: Known): Observable<ImportDetail> {
    return this.api.call(importDiscard, { params: paramsOf(known) });
  }

  withdraw(known: Known, reason: string): Observable<ImportDetail> {
    return this.api.call(importWithdraw, { params: paramsOf(known), body: { reason } });
  }
}

function paramsOf({ programmeId, id: importId }: Known): { programmeId: string; importId: string } {
  return { programmeId, importId };
}
