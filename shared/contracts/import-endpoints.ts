import * as z from 'zod';
import { id, nothing, programmeParams } from './common';
import { endpoint } from './endpoint';
import {
  IMPORT_PAGE_ROWS,
  VERDICTS,
  importMapping,
  verdictCounts,
  importSummary,
  importDetail,
  importRow,
  importFix,
} from './imports';

/** Query parameters arrive as text. */
const numeral = z.string().regex(/^\d{1,9}$/);

const importParams = z.strictObject({ programmeId: id, importId: id });

export const importUpload = endpoint({
  kind: 'upload',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports',
  summary:
    'Bring in a CSV file or a workbook (.xlsx) of results (multipart, field `file`, at most 25 MB and 20 000 rows); nothing counts yet',
  access: 'imports.run',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: importDetail,
  command: true,
  versioned: false,
  problems: ['too-large', 'unsupported-file', 'unusable-input'],
});

export const importList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/imports',
  summary: 'The imports of a programme, newest first',
  access: 'imports.run',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ imports: z.array(importSummary) }),
  command: false,
  versioned: false,
  problems: [],
});

export const importRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/imports/:importId',
  summary: 'One import: its columns, mapping, counts and progress',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: nothing,
  response: importDetail,
  command: false,
  versioned: false,
  problems: [],
});

export const importChooseSheet = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/programmes/:programmeId/imports/:importId/sheet',
  summary: 'Read another sheet of the workbook; what was assigned and corrected so far is given up',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: z.strictObject({ sheet: z.int().min(0).max(10_000) }),
  response: importDetail,
  command: true,
  versioned: true,
  problems: ['wrong-state', 'conflict', 'too-large', 'unsupported-file', 'unusable-input'],
});

export const importMap = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/programmes/:programmeId/imports/:importId/mapping',
  summary: 'Say what the columns mean and start checking every row',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: importMapping,
  response: importDetail,
  command: true,
  versioned: true,
  problems: ['wrong-state', 'conflict', 'unusable-input'],
});

export const importRows = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/imports/:importId/rows',
  summary: 'Rows of an import with their verdicts, by page and filter',
  access: 'imports.run',
  params: importParams,
  query: z.strictObject({
    verdict: z.enum(VERDICTS).optional(),
    search: z.string().max(200).optional(),
    column: numeral.optional(),
    offset: numeral.optional(),
    limit: numeral.optional().describe(`At most ${String(IMPORT_PAGE_ROWS)}`),
  }),
  body: nothing,
  response: z.strictObject({ rows: z.array(importRow), total: z.int(), counts: verdictCounts }),
  command: false,
  versioned: false,
  problems: [],
});

export const importFixRows = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports/:importId/fixes',
  summary: 'Correct cells or skip rows, one or many at once; what they touch is checked again',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: importFix,
  response: z.strictObject({
    changedRows: z.int(),
    checkedRows: z.int().describe('Rows checked again: those of every result that was touched'),
    import: importDetail,
  }),
  command: true,
  versioned: false,
  problems: ['wrong-state', 'unusable-input'],
});

export const importConfirm = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports/:importId/confirmation',
  summary: 'Store the accepted and cautioned rows, all of them or none',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: z.strictObject({
    /** Refused rows stay out; the person has seen how many. */
    leavingOutRefusedRows: z.int().min(0),
  }),
  response: importDetail,
  command: true,
  versioned: true,
  problems: ['wrong-state', 'conflict', 'already-exists', 'unusable-input'],
});

export const importStop = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports/:importId/stop',
  summary: 'Stop the check or the storing that runs; nothing of it is kept',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: nothing,
  response: importDetail,
  command: true,
  versioned: false,
  problems: ['wrong-state'],
});

export const importDiscard = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports/:importId/discard',
  summary: 'Lay an import aside that was not stored',
  access: 'imports.run',
  params: importParams,
  query: nothing,
  body: nothing,
  response: importDetail,
  command: true,
  versioned: false,
  problems: ['wrong-state'],
});

export const importWithdraw = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/imports/:importId/withdrawal',
  summary: 'Withdraw every result of an import, while nothing rests on any of them',
  access: 'results.withdraw',
  params: importParams,
  query: nothing,
  body: z.strictObject({ reason: z.string().trim().min(3).max(1000) }),
  response: importDetail,
  command: true,
  versioned: false,
  problems: ['wrong-state', 'still-in-use'],
});
