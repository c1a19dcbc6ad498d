import {
  ATTACHMENT_LIMIT_BYTES,
  attachmentDownload,
  attachmentRead,
  attachmentUpload,
} from '#shared/contracts/attachments';
import { downloadRoute, route, uploadRoute, type Route } from '../../http/module';
import { bringIn, attachmentContent, describeAttachment } from './attachments.service';

export const attachmentsRoutes: readonly Route[] = [
  uploadRoute(attachmentUpload, ATTACHMENT_LIMIT_BYTES, async ({ file, query }, context) =>
    bringIn(context, file, query.purpose),
  ),
  route(attachmentRead, async ({ params }, context) => describeAttachment(context, params.attachmentId)),
  downloadRoute(attachmentDownload, async ({ params }, context) =>
    attachmentContent(context, params.attachmentId),
  ),
];
