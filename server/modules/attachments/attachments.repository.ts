import { and, eq } from 'drizzle-orm';
import type { Attachment, AttachmentPurpose } from '#shared/contracts/attachments';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { attachments } from '../../db/tables/attachments';
import type { AttachmentType } from './media-type.policy';

export interface NewAttachment {
  readonly purpose: AttachmentPurpose;
  readonly fileName: string;
  readonly mediaType: AttachmentType;
  readonly sha256: string;
  readonly content: Buffer;
}

// Never the content: what an attachment is must not cost ten megabytes to know.
const DESCRIPTION = {
  id: attachments.id,
  purpose: attachments.purpose,
  fileName: attachments.fileName,
  mediaType: attachments.mediaType,
  sizeBytes: attachments.bytes,
  sha256: attachments.sha256,
  createdAt: attachments.createdAt,
};

interface Row {
  readonly id: string;
  readonly purpose: AttachmentPurpose;
  readonly fileName: string;
  readonly mediaType: string;
  readonly sizeBytes: number;
  readonly sha256: string;
  readonly createdAt: Date;
}

function attachmentOf(row: Row): Attachment {
  // Only media types that `media-type.policy.ts` found have ever been stored.
  return { ...row, mediaType: row.mediaType as AttachmentType, createdAt: row.createdAt.toISOString() };
}

export async function findAttachment(tx: Tx, id: string): Promise<Attachment | undefined> {
  const [row] = await tx.select(DESCRIPTION).from(attachments).where(eq(attachments.id, id));
  return row && attachmentOf(row);
}

export async function readContent(tx: Tx, id: string): Promise<Buffer | undefined> {
  const [row] = await tx
    .select({ content: attachments.content })
    .from(attachments)
    .where(eq(attachments.id, id));
  return row?.content;
}

export async function hasAttachment(tx: Tx, id: string, purpose: AttachmentPurpose): Promise<boolean> {
  const rows = await tx
    .select({ id: attachments.id })
    .from(attachments)
    .where(and(eq(attachments.id, id), eq(attachments.purpose, purpose)));
  return rows.length > 0;
}

export async function insertAttachment(work: Work, file: NewAttachment): Promise<Attachment> {
  const [row] = await work.tx
    .insert(attachments)
    .values({ ...file, bytes: file.content.length, createdBy: work.userId })
    .returning(DESCRIPTION);
  return attachmentOf(present(row));
}
