import type { ServerModule } from '../../http/module';
import { variantsRoutes } from './variants.routes';

export { variantIssues } from './variants.policy';
export { findVariant, listVariants, lockVariant } from './variants.repository';
export { addVariant } from './variants.service';

export const variantsModule: ServerModule = { name: 'variants', routes: variantsRoutes };
