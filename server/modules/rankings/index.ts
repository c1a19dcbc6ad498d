import type { ServerModule } from '../../http/module';
import { rankingsRoutes } from './rankings.routes';

export {
  readEvidenceDocument,
  readRankingContext,
  readRankingInputs,
  type EvidenceDocument,
} from './rankings.service';

export const rankingsModule: ServerModule = { name: 'rankings', routes: rankingsRoutes };
