import {
  variantCreate,
  variantList,
  variantRead,
  variantRetire,
  variantUpdate,
} from '#shared/contracts/variants';
import { route, type Route } from '../../http/module';
import { addVariant, allVariants, changeVariant, oneVariant, retireVariant } from './variants.service';

export const variantsRoutes: readonly Route[] = [
  route(variantList, async ({ params }, work) => ({
    variants: [...(await allVariants(work, params.programmeId))],
  })),
  route(variantRead, async ({ params }, work) => oneVariant(work, params.programmeId, params.variantId)),
  route(variantCreate, async ({ params, body }, work) => addVariant(work, params.programmeId, body)),
  route(variantUpdate, async ({ params, body, expectedVersion }, work) =>
    changeVariant(work, params.programmeId, params.variantId, body, expectedVersion),
  ),
  route(variantRetire, async ({ params, body, expectedVersion }, work) =>
    retireVariant(work, params.programmeId, params.variantId, body.retired, expectedVersion),
  ),
];
