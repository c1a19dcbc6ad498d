import { asc, eq, sql } from 'drizzle-orm';
import type { CycleDetail, CycleSummary } from '#shared/contracts/cycles';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { cycles, referenceCycles, type CycleTotals } from '../../db/tables/cycles';

const OWN = {
  key: cycles.id,
  name: cycles.name,
  source: cycles.source,
  totals: cycles.totals,
  retiredAt: cycles.retiredAt,
};
const BUILT_IN = {
  key: referenceCycles.key,
  name: referenceCycles.name,
  source: referenceCycles.source,
  totals: referenceCycles.totals,
};

interface Row {
  readonly key: string;
  readonly name: string;
  readonly source: string;
  readonly totals: CycleTotals;
  readonly retiredAt?: Date | null;
}

function summaryOf(origin: CycleSummary['origin'], row: Row): CycleSummary {
  const { key, name, source, totals, retiredAt } = row;
  return {
    key,
    origin,
    name,
    source,
    ...totals,
    cautions: [...totals.cautions],
    ...(retiredAt ? { retiredAt: retiredAt.toISOString() } : {}),
  };
}

/** Built-in cycles in the order in which they are offered, then own ones by name. */
export async function listCycles(tx: Tx): Promise<readonly CycleSummary[]> {
  const builtIn = await tx.select(BUILT_IN).from(referenceCycles).orderBy(asc(referenceCycles.position));
  const own = await tx
    .select(OWN)
    .from(cycles)
    .orderBy(sql`lower(${cycles.name})`);
  return [...builtIn.map((row) => summaryOf('built-in', row)), ...own.map((row) => summaryOf('own', row))];
}

export async function findBuiltInCycle(tx: Tx, key: string): Promise<CycleDetail | undefined> {
  const [row] = await tx
    .select({ ...BUILT_IN, timeS: referenceCycles.timeS, speedKmh: referenceCycles.speedKmh })
    .from(referenceCycles)
    .where(eq(referenceCycles.key, key));
  return row && { ...summaryOf('built-in', row), timeS: row.timeS, speedKmh: row.speedKmh };
}

export async function findOwnCycle(tx: Tx, id: string): Promise<CycleDetail | undefined> {
  const [row] = await tx
    .select({ ...OWN, timeS: cycles.timeS, speedKmh: cycles.speedKmh })
    .from(cycles)
    .where(eq(cycles.id, id));
  return row && { ...summaryOf('own', row), timeS: row.timeS, speedKmh: row.speedKmh };
}

/** A name means one cycle, be it built in or one’s own. */
export async function cycleOfName(tx: Tx, name: string): Promise<string | undefined> {
  const found = await tx.execute<{ key: string }>(sql`
    select ${cycles.id}::text as key from ${cycles} where lower(${cycles.name}) = lower(${name})
    union all
    select ${referenceCycles.key} from ${referenceCycles} where lower(${referenceCycles.name}) = lower(${name})`);
  return found.rows[0]?.key;
}

export interface NewCycle {
  readonly name: string;
  readonly source: string;
  readonly remark: string | undefined;
  readonly timeS: readonly number[];
  readonly speedKmh: readonly number[];
  readonly totals: CycleTotals;
}

export async function insertCycle(work: Work, cycle: NewCycle): Promise<CycleDetail> {
  const [row] = await work.tx
    .insert(cycles)
    .values({
      ...cycle,
      timeS: [...cycle.timeS],
      speedKmh: [...cycle.speedKmh],
      createdBy: work.userId,
    })
    .returning({ ...OWN, timeS: cycles.timeS, speedKmh: cycles.speedKmh });
  const stored = present(row);
  return { ...summaryOf('own', stored), timeS: stored.timeS, speedKmh: stored.speedKmh };
}

export async function setCycleRetired(tx: Tx, id: string, retiredAt: Date | null): Promise<CycleSummary> {
  const [row] = await tx.update(cycles).set({ retiredAt }).where(eq(cycles.id, id)).returning(OWN);
  return summaryOf('own', present(row));
}
