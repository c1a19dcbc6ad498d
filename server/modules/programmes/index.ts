import type { ServerModule } from '../../http/module';
import { programmesRoutes } from './programmes.routes';

export { findProgramme, programmeExists } from './programmes.repository';

export const programmesModule: ServerModule = { name: 'programmes', routes: programmesRoutes };
