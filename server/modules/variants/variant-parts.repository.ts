import { and, eq, notInArray } from 'drizzle-orm';
import type { VariantFields } from '#shared/contracts/variants';
import type { Tx } from '../../db/pools';
import { configurations, frontalAreas } from '../../db/tables/variants';
import { withNulls } from '../../db/without-nulls';

/** The history is written whole: nothing points to one of its entries. */
export async function writeFrontalAreas(
  tx: Tx,
  variantId: string,
  wanted: VariantFields['frontalAreas'],
): Promise<void> {
  await tx.delete(frontalAreas).where(eq(frontalAreas.variantId, variantId));
  await tx.insert(frontalAreas).values(
    wanted.map((area, position) => ({
      ...withNulls(area, ['areaM2', 'uM2', 'method', 'date', 'remark']),
      variantId,
      position,
    })),
  );
}

/** A configuration keeps its id through every change; the order of the list is the order of sale, the first the base. */
export async function writeConfigurations(
  tx: Tx,
  variantId: string,
  wanted: VariantFields['configurations'],
): Promise<void> {
  const kept = wanted.flatMap((configuration) => (configuration.id === undefined ? [] : [configuration.id]));
  await tx
    .delete(configurations)
    .where(
      and(
        eq(configurations.variantId, variantId),
        kept.length === 0 ? undefined : notInArray(configurations.id, kept),
      ),
    );
  for (const [position, configuration] of wanted.entries()) {
    const { id } = configuration;
    const row = {
      ...withNulls(configuration, [
        'name',
        'massKg',
        'rollingResistance',
        'roadLoadReference',
        'electric',
        'combustion',
        'salesShare',
      ]),
      position,
    };
    if (id === undefined) await tx.insert(configurations).values({ ...row, variantId });
    else await tx.update(configurations).set(row).where(eq(configurations.id, id));
  }
}
