import type { ServerModule } from '../http/module';
import { adjustmentsModule } from './adjustments';
import { attachmentsModule } from './attachments';
import { auditModule } from './audit';
import { correlationPairsModule } from './correlation-pairs';
import { correlationsModule } from './correlations';
import { cyclesModule } from './cycles';
import { evaluationsModule } from './evaluations';
import { facilitiesModule } from './facilities';
import { importsModule } from './imports';
import { organisationsModule } from './organisations';
import { policiesModule } from './policies';
import { programmesModule } from './programmes';
import { proposalsModule } from './proposals';
import { rankingsModule } from './rankings';
import { resultsModule } from './results';
import { sessionModule } from './session';
import { testPlansModule } from './test-plans';
import { testSessionsModule } from './test-sessions';
import { variantsModule } from './variants';

/** Every module, once: its routes are mounted, described by OpenAPI and walked by the cross-tenant test from here. */
export const MODULES: readonly ServerModule[] = [
  sessionModule,
  organisationsModule,
  auditModule,
  programmesModule,
  variantsModule,
  facilitiesModule,
  testSessionsModule,
  adjustmentsModule,
  correlationsModule,
  correlationPairsModule,
  policiesModule,
  cyclesModule,
  resultsModule,
  evaluationsModule,
  testPlansModule,
  attachmentsModule,
  importsModule,
  rankingsModule,
  proposalsModule,
];
