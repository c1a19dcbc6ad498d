import { and, asc, desc, eq, inArray, ne, sql, type SQL } from 'drizzle-orm';
import type { Configuration, FrontalArea, Variant, VariantFields } from '#shared/contracts/variants';
import type { Tx } from '../../db/pools';
import { grouped } from '../../db/grouped';
import { present } from '../../db/returned-row';
import { configurations, frontalAreas, variants } from '../../db/tables/variants';
import { withNulls, withoutNulls } from '../../db/without-nulls';
import { writeConfigurations, writeFrontalAreas } from './variant-parts.repository';

const COLUMNS = [
  'name',
  'bodyShape',
  'description',
  'lengthMm',
  'widthMm',
  'heightMm',
  'wheelbaseMm',
  'aliases',
  'pictureAttachmentId',
] as const satisfies readonly (keyof VariantFields)[];

type Row = typeof variants.$inferSelect;

function variantOf(
  row: Row,
  areas: readonly FrontalArea[],
  itsConfigurations: readonly Configuration[],
): Variant {
  const { organisationId: _organisationId, createdAt: _createdAt, retiredAt, ...rest } = row;
  return {
    ...withoutNulls(rest),
    frontalAreas: [...areas],
    configurations: [...itsConfigurations],
    ...(retiredAt === null ? {} : { retiredAt: retiredAt.toISOString() }),
  };
}

/** Variants with their parts: three statements, however many variants there are. */
async function complete(tx: Tx, rows: readonly Row[]): Promise<readonly Variant[]> {
  const ids = rows.map((row) => row.id);
  if (ids.length === 0) return [];
  const areas = await tx
    .select()
    .from(frontalAreas)
    .where(inArray(frontalAreas.variantId, ids))
    .orderBy(desc(frontalAreas.date), asc(frontalAreas.position));
  const sold = await tx
    .select()
    .from(configurations)
    .where(inArray(configurations.variantId, ids))
    .orderBy(asc(configurations.position));
  const areasOf = grouped(areas, (area) => area.variantId);
  const soldAs = grouped(sold, (configuration) => configuration.variantId);
  return rows.map((row) =>
    variantOf(
      row,
      (areasOf.get(row.id) ?? []).map(frontalAreaOf),
      (soldAs.get(row.id) ?? []).map(configurationOf),
    ),
  );
}

function frontalAreaOf(row: typeof frontalAreas.$inferSelect): FrontalArea {
  const { areaM2, uM2, method, date, remark } = row;
  return withoutNulls({ areaM2, uM2, method, date, remark });
}

function configurationOf(row: typeof configurations.$inferSelect): Configuration {
  const { organisationId: _organisationId, variantId: _variantId, position: _position, ...rest } = row;
  return withoutNulls(rest);
}

async function select(tx: Tx, where: SQL | undefined): Promise<readonly Variant[]> {
  const rows = await tx
    .select()
    .from(variants)
    .where(where)
    .orderBy(sql`${variants.retiredAt} is not null`, sql`lower(${variants.name})`);
  return complete(tx, rows);
}

const theOne = (programmeId: string, id: string): SQL | undefined =>
  and(eq(variants.programmeId, programmeId), eq(variants.id, id));

/** All variants of a programme, retired ones last. */
export async function listVariants(tx: Tx, programmeId: string): Promise<readonly Variant[]> {
  return select(tx, eq(variants.programmeId, programmeId));
}

export async function findVariant(tx: Tx, programmeId: string, id: string): Promise<Variant | undefined> {
  const [variant] = await select(tx, theOne(programmeId, id));
  return variant;
}

/** As `findVariant`, and nobody else changes it or what it rests on until the transaction ends. */
export async function lockVariant(tx: Tx, programmeId: string, id: string): Promise<Variant | undefined> {
  const rows = await tx.select().from(variants).where(theOne(programmeId, id)).for('no key update');
  const [variant] = await complete(tx, rows);
  return variant;
}

export async function variantOfName(tx: Tx, programmeId: string, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: variants.id })
    .from(variants)
    .where(and(eq(variants.programmeId, programmeId), sql`lower(${variants.name}) = lower(${name})`));
  return row?.id;
}

/** Names and aliases of a programme's variants but one, in lower case, each with the variant's name. */
export async function takenNames(
  tx: Tx,
  programmeId: string,
  exceptId: string | undefined,
): Promise<ReadonlyMap<string, string>> {
  const rows = await tx
    .select({ name: variants.name, aliases: variants.aliases })
    .from(variants)
    .where(
      and(
        eq(variants.programmeId, programmeId),
        exceptId === undefined ? undefined : ne(variants.id, exceptId),
      ),
    );
  return new Map(
    rows.flatMap(({ name, aliases }) =>
      [name, ...aliases].map((known) => [known.trim().toLowerCase(), name]),
    ),
  );
}

export async function insertVariant(tx: Tx, programmeId: string, fields: VariantFields): Promise<Variant> {
  const [inserted] = await tx
    .insert(variants)
    .values({ ...withNulls(fields, COLUMNS), programmeId })
    .returning();
  const row = present(inserted);
  await writeFrontalAreas(tx, row.id, fields.frontalAreas);
  await writeConfigurations(tx, row.id, fields.configurations);
  return present((await complete(tx, [row]))[0]);
}

export async function updateVariant(tx: Tx, id: string, fields: VariantFields): Promise<Variant> {
  const rows = await tx
    .update(variants)
    .set({ ...withNulls(fields, COLUMNS), version: sql`${variants.version} + 1` })
    .where(eq(variants.id, id))
    .returning();
  await writeFrontalAreas(tx, id, fields.frontalAreas);
  await writeConfigurations(tx, id, fields.configurations);
  return present((await complete(tx, rows))[0]);
}

export async function setVariantRetired(tx: Tx, id: string, retiredAt: Date | null): Promise<Variant> {
  const rows = await tx
    .update(variants)
    .set({ retiredAt, version: sql`${variants.version} + 1` })
    .where(eq(variants.id, id))
    .returning();
  return present((await complete(tx, rows))[0]);
}
