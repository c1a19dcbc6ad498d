import * as z from 'zod';
import { id, nothing, timestamp } from './common';
import { endpoint } from './endpoint';

export const ATTACHMENT_LIMIT_BYTES = 10 * 1024 * 1024;
export const ATTACHMENT_TYPES = [
  'application/pdf',
  'image/png',
  'image/jpeg',
  'image/webp',
  'text/csv',
  'text/plain',
] as const;

/**
 * What a file is for decides who may read it: a picture whoever may see variants, evidence whoever may see results. It
 * may be brought in by whoever may edit variants or enter results.
 */
export const ATTACHMENT_PURPOSES = ['picture', 'evidence'] as const;
export const attachmentPurpose = z.enum(ATTACHMENT_PURPOSES);
export type AttachmentPurpose = z.infer<typeof attachmentPurpose>;

export const attachment = z.strictObject({
  id,
  purpose: attachmentPurpose,
  fileName: z.string(),
  mediaType: z.enum(ATTACHMENT_TYPES),
  sizeBytes: z.int(),
  sha256: z.string(),
  createdAt: timestamp,
});
export type Attachment = z.infer<typeof attachment>;

const attachmentParams = z.strictObject({ attachmentId: id });

export const attachmentUpload = endpoint({
  kind: 'upload',
  method: 'POST',
  path: '/api/v1/attachments',
  summary: 'Bring in a file for a result or a variant’s picture (multipart, field `file`)',
  access: 'signed-in',
  params: nothing,
  query: z.strictObject({ purpose: attachmentPurpose }),
  body: nothing,
  response: attachment,
  command: true,
  versioned: false,
  problems: ['forbidden', 'too-large', 'unsupported-file', 'unusable-input'],
});

export const attachmentRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/attachments/:attachmentId',
  summary: 'What an attachment is',
  access: 'signed-in',
  params: attachmentParams,
  query: nothing,
  body: nothing,
  response: attachment,
  command: false,
  versioned: false,
  problems: ['forbidden'],
});

export const attachmentDownload = endpoint({
  kind: 'download',
  method: 'GET',
  path: '/api/v1/attachments/:attachmentId/content',
  summary: 'The file itself',
  access: 'signed-in',
  params: attachmentParams,
  query: nothing,
  body: nothing,
  response: nothing,
  command: false,
  versioned: false,
  problems: ['forbidden'],
});
