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
import { IMPORT_LIMIT_BYTES, IMPORT_PAGE_ROWS } from '#shared/contracts/imports';
import { route, uploadRoute, type Route } from '../../http/module';
import { fixRows } from './import-fixes.service';
import {
  allImports,
  bringIn,
  chooseSheet,
  confirm,
  discard,
  mapColumns,
  oneImport,
  rowsOf,
  stop,
  withdraw,
} from './imports.service';

export const importsRoutes: readonly Route[] = [
  uploadRoute(importUpload, IMPORT_LIMIT_BYTES, async ({ params, file }, context) =>
    bringIn(context, params.programmeId, file),
  ),
  route(importList, async ({ params }, context) => ({
    imports: [...(await allImports(context, params.programmeId))],
  })),
  route(importRead, async ({ params }, context) => oneImport(context, params.programmeId, params.importId)),
  route(importChooseSheet, async ({ params, body, expectedVersion }, context) =>
    chooseSheet(context, params.programmeId, params.importId, body.sheet, expectedVersion),
  ),
  route(importMap, async ({ params, body, expectedVersion }, context) =>
    mapColumns(context, params.programmeId, params.importId, body, expectedVersion),
  ),
  route(importRows, async ({ params, query }, context) => {
    const { column, offset, limit, ...filter } = query;
    return rowsOf(
      context,
      params.programmeId,
      params.importId,
      { ...filter, ...(column === undefined ? {} : { column: Number(column) }) },
      Number(offset ?? 0),
      Number(limit ?? IMPORT_PAGE_ROWS),
    );
  }),
  route(importFixRows, async ({ params, body }, context) =>
    fixRows(context, params.programmeId, params.importId, body),
  ),
  route(importConfirm, async ({ params, body, expectedVersion }, context) =>
    confirm(context, params.programmeId, params.importId, body.leavingOutRefusedRows, expectedVersion),
  ),
  route(importStop, async ({ params }, context) => stop(context, params.programmeId, params.importId)),
  route(importDiscard, async ({ params }, context) => discard(context, params.programmeId, params.importId)),
  route(importWithdraw, async ({ params, body }, context) =>
    withdraw(context, params.programmeId, params.importId, body.reason),
  ),
];
