import { desc, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { Adoption } from '#shared/contracts/adoptions';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { memberships } from '../../db/tables/organisations';
import { adoptionResults, adoptions, results } from '../../db/tables/results';
import { variants } from '../../db/tables/variants';

const COLUMNS = {
  id: adoptions.id,
  variantId: adoptions.variantId,
  resultIds: sql<string[]>`array(select ar.result_id::text from adoption_results ar
    join results r on r.id = ar.result_id where ar.adoption_id = ${adoptions.id} order by r.entry_sequence)`,
  rule: adoptions.evidence,
  comment: adoptions.comment,
  at: adoptions.adoptedAt,
  by: memberships.displayName,
};

interface Row extends Omit<Adoption, 'comment' | 'at'> {
  readonly comment: string | null;
  readonly at: Date;
}

const adoptionOf = ({ comment, at, ...row }: Row): Adoption => ({
  ...row,
  comment: comment ?? '',
  at: at.toISOString(),
});

/** Every choice of evidence in a programme, the newest first. */
export async function listAdoptions(tx: Tx, programmeId: string): Promise<readonly Adoption[]> {
  const rows = await tx
    .select(COLUMNS)
    .from(adoptions)
    .innerJoin(variants, eq(variants.id, adoptions.variantId))
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(eq(variants.programmeId, programmeId))
    .orderBy(desc(adoptions.adoptedAt), desc(adoptions.id));
  return rows.map(adoptionOf);
}

/** Every choice of evidence of one variant, the newest first. */
export async function listAdoptionsOfVariant(tx: Tx, variantId: string): Promise<readonly Adoption[]> {
  const rows = await tx
    .select(COLUMNS)
    .from(adoptions)
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(eq(adoptions.variantId, variantId))
    .orderBy(desc(adoptions.adoptedAt), desc(adoptions.id));
  return rows.map(adoptionOf);
}

/** The newest choice of each of these variants; it may be a release, without results. */
async function newestAdoptions(tx: Tx, variantIds: readonly string[]): Promise<readonly Adoption[]> {
  if (variantIds.length === 0) return [];
  const rows = await tx
    .selectDistinctOn([adoptions.variantId], COLUMNS)
    .from(adoptions)
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(inArray(adoptions.variantId, [...variantIds]))
    .orderBy(adoptions.variantId, desc(adoptions.adoptedAt), desc(adoptions.id));
  return rows.map(adoptionOf);
}

/** The choice that stands for each of these variants; one that was released has none. */
export async function standingAdoptions(
  tx: Tx,
  variantIds: readonly string[],
): Promise<ReadonlyMap<string, Adoption>> {
  const newest = await newestAdoptions(tx, variantIds);
  return new Map(
    newest.filter(({ resultIds }) => resultIds.length > 0).map((adoption) => [adoption.variantId, adoption]),
  );
}

/** Those of the results that a condition picks that their variant rested on at some time. */
export async function everAdopted(tx: Tx, where: SQL | undefined): Promise<ReadonlySet<string>> {
  const rows = await tx
    .selectDistinct({ id: adoptionResults.resultId })
    .from(adoptionResults)
    .innerJoin(results, eq(results.id, adoptionResults.resultId))
    .where(where);
  return new Set(rows.map(({ id }) => id));
}

export interface AdoptionToStore {
  readonly variantId: string;
  readonly resultIds: readonly string[];
  readonly rule: Adoption['rule'];
}

/** Writes a choice, or without results the release of the one that stood. */
export async function insertAdoption(
  work: Work,
  { variantId, resultIds, rule }: AdoptionToStore,
  comment: string,
): Promise<Adoption> {
  const [row] = await work.tx
    .insert(adoptions)
    .values({ variantId, evidence: rule, comment, adoptedBy: work.userId })
    .returning({ id: adoptions.id });
  const { id: adoptionId } = present(row);
  if (resultIds.length > 0) {
    await work.tx
      .insert(adoptionResults)
      .values(resultIds.map((resultId) => ({ adoptionId, variantId, resultId })));
  }
  const [adoption] = await newestAdoptions(work.tx, [variantId]);
  return present(adoption);
}
