import type { ServerModule } from '../../http/module';
import { checkImportJob } from './check-import.job';
import { importsRoutes } from './imports.routes';
import { storeImportJob } from './store-import.job';

export const importsModule: ServerModule = {
  name: 'imports',
  routes: importsRoutes,
  jobs: [checkImportJob, storeImportJob],
};
