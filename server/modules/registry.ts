import type { ServerModule } from '../http/module';
import { attachmentsModule } from './attachments';
import { cyclesModule } from './cycles';
import { facilitiesModule } from './facilities';
import { programmesModule } from './programmes';
import { resultsModule } from './results';
import { variantsModule } from './variants';

/** Every module, once: its routes are mounted, described by OpenAPI and walked by the cross-tenant test from here. */
export const MODULES: readonly ServerModule[] = [
  programmesModule,
  variantsModule,
  facilitiesModule,
  cyclesModule,
  resultsModule,
  attachmentsModule,
];
