import type { ServerModule } from '../http/module';

/** Every module, once: its routes are mounted, described by OpenAPI and walked by the cross-tenant test from here. */
export const MODULES: readonly ServerModule[] = [];
