import type { Attachment, AttachmentPurpose } from '#shared/contracts/attachments';
import type { Download, UploadedFile } from '../../http/module';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { findAttachment, insertAttachment, readContent } from './attachments.repository';
import { mediaTypeOf, safeFileName } from './media-type.policy';

export async function bringIn(
  context: MemberContext,
  file: UploadedFile,
  purpose: AttachmentPurpose,
): Promise<Attachment> {
  if (!context.may('variants.edit') && !context.may('results.enter')) fail('forbidden');
  const verdict = mediaTypeOf(file.content, file.fileName, purpose);
  if (!verdict.accepted) fail('unsupported-file', { where: 'file', detail: verdict.detail });

  const attachment = await insertAttachment(context, {
    purpose,
    fileName: safeFileName(file.fileName),
    mediaType: verdict.type,
    sha256: file.sha256,
    content: file.content,
  });
  await recordAudit(context, {
    action: 'attachment.brought-in',
    entityKind: 'attachment',
    entityId: attachment.id,
    summary: [
      { field: 'fileName', after: attachment.fileName },
      { field: 'purpose', after: purpose },
      { field: 'sha256', after: attachment.sha256 },
    ],
  });
  return attachment;
}

export async function describeAttachment(context: MemberContext, id: string): Promise<Attachment> {
  const attachment = demandFound(await findAttachment(context.tx, id));
  const readable =
    attachment.purpose === 'picture' ? context.may('variants.read') : context.may('results.read');
  if (!readable) fail('forbidden', { detail: 'Evidence may be read by those who may read results.' });
  return attachment;
}

export async function attachmentContent(context: MemberContext, id: string): Promise<Download> {
  const { fileName, mediaType } = await describeAttachment(context, id);
  return { fileName, mediaType, body: demandFound(await readContent(context.tx, id)) };
}
