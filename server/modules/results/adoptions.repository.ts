import { desc, eq, inArray } from 'drizzle-orm';
import type { Adoption } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { memberships } from '../../db/tables/organisations';
import { adoptions } from '../../db/tables/results';
import { variants } from '../../db/tables/variants';

const COLUMNS = {
  variantId: adoptions.variantId,
  resultId: adoptions.resultId,
  comment: adoptions.comment,
  at: adoptions.adoptedAt,
  by: memberships.displayName,
};

interface Row {
  readonly variantId: string;
  readonly resultId: string | null;
  readonly comment: string | null;
  readonly at: Date;
  readonly by: string;
}

function adoptionOf({ variantId, resultId, comment, at, by }: Row): Adoption {
  return {
    variantId,
    ...(resultId === null ? {} : { resultId }),
    comment: comment ?? '',
    at: at.toISOString(),
    by,
  };
}

/** Every choice of evidence in a programme, the newest first. */
export async function listAdoptions(tx: Tx, programmeId: string): Promise<readonly Adoption[]> {
  const rows = await tx
    .select(COLUMNS)
    .from(adoptions)
    .innerJoin(variants, eq(variants.id, adoptions.variantId))
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(eq(variants.programmeId, programmeId))
    .orderBy(desc(adoptions.adoptedAt));
  return rows.map(adoptionOf);
}

/** The choice that stands for each of these variants: the newest one; it may be a release, without a result. */
export async function currentAdoptions(
  tx: Tx,
  variantIds: readonly string[],
): Promise<ReadonlyMap<string, Adoption>> {
  if (variantIds.length === 0) return new Map();
  const rows = await tx
    .selectDistinctOn([adoptions.variantId], COLUMNS)
    .from(adoptions)
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(inArray(adoptions.variantId, [...variantIds]))
    .orderBy(adoptions.variantId, desc(adoptions.adoptedAt));
  return new Map(rows.map((row) => [row.variantId, adoptionOf(row)]));
}

/** Writes a choice, or with no result the release of the one that stood. */
export async function insertAdoption(
  work: Work,
  variantId: string,
  resultId: string | undefined,
  comment: string,
): Promise<Adoption> {
  await work.tx
    .insert(adoptions)
    .values({ variantId, resultId: resultId ?? null, comment, adoptedBy: work.userId });
  return present((await currentAdoptions(work.tx, [variantId])).get(variantId));
}
