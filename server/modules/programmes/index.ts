import type { ServerModule } from '../../http/module';
import { programmesRoutes } from './programmes.routes';

export { findProgramme, lockProgramme, programmeExists } from './programmes.repository';
export { changeProgramme } from './programmes.service';

export const programmesModule: ServerModule = { name: 'programmes', routes: programmesRoutes };
