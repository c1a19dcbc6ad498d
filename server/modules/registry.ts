import type { ServerModule } from '../http/module';
import { attachmentsModule } from './attachments';
import { auditModule } from './audit';
import { cyclesModule } from './cycles';
import { facilitiesModule } from './facilities';
import { importsModule } from './imports';
import { organisationsModule } from './organisations';
import { programmesModule } from './programmes';
import { rankingsModule } from './rankings';
import { resultsModule } from './results';
import { sessionModule } from './session';
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
  cyclesModule,
  resultsModule,
  attachmentsModule,
  importsModule,
  rankingsModule,
];
