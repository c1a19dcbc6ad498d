import type { ServerModule } from '../../http/module';
import { attachmentsRoutes } from './attachments.routes';

export { hasAttachment } from './attachments.repository';

export const attachmentsModule: ServerModule = { name: 'attachments', routes: attachmentsRoutes };
