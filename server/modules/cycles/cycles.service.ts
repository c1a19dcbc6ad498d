import type * as z from 'zod';
import type { CycleDetail, CycleSummary, cycleCreate } from '#shared/contracts/cycles';
import { id as idSchema } from '#shared/contracts/common';
import { checkOwnCycle, type OwnCycle } from '#shared/core/cycles/own-cycle';
import { Refused } from '#shared/core/refusal';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound, demandFreeName, refuseUnusable } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { totalsOf } from './cycle-cautions.policy';
import { readCycleCsv, sourceWords, type CycleColumns } from './cycle-csv.policy';
import {
  cycleOfName,
  findBuiltInCycle,
  findOwnCycle,
  insertCycle,
  listCycles,
  setCycleRetired,
} from './cycles.repository';

type NewOwnCycle = z.output<(typeof cycleCreate)['body']>;

/** The key that a trace has while it is only being checked. */
const NOT_STORED = 'not-stored';

export async function allCycles(work: Work): Promise<readonly CycleSummary[]> {
  return listCycles(work.tx);
}

export async function oneCycle(work: Work, key: string): Promise<CycleDetail> {
  return demandFound((await findBuiltInCycle(work.tx, key)) ?? (await ownCycle(work, key)));
}

/** Own cycles are known by an id; anything else can only be unknown. */
async function ownCycle(work: Work, key: string): Promise<CycleDetail | undefined> {
  const id = idSchema.safeParse(key);
  return id.success ? findOwnCycle(work.tx, id.data) : undefined;
}

/** Checks a trace and, unless `checkOnly` is said, keeps it. */
export async function bringInCycle(work: Work, asked: NewOwnCycle): Promise<CycleDetail> {
  demandFreeName(await cycleOfName(work.tx, asked.name), undefined, asked.name);
  const columns = columnsOf(asked.csv);
  const checked = checkedTrace(columns, asked);
  const cycle = {
    name: asked.name,
    source: sourceWords(asked.timeUnit, asked.speedUnit, columns.time.length),
    timeS: Array.from(checked.trace.timeS),
    speedKmh: Array.from(checked.trace.speedKmh),
    totals: totalsOf(checked, columns.lines),
  };
  if (asked.checkOnly) {
    const { totals, ...rest } = cycle;
    return { ...rest, ...totals, key: NOT_STORED, origin: 'own', cautions: [...totals.cautions] };
  }

  const stored = await insertCycle(work, { ...cycle, remark: asked.remark });
  await recordAudit(work, {
    action: 'cycle.brought-in',
    entityKind: 'cycle',
    entityId: stored.key,
    summary: [
      { field: 'name', after: stored.name },
      { field: 'durationS', after: stored.durationS },
      { field: 'distanceM', after: stored.distanceM },
    ],
  });
  return stored;
}

function columnsOf(csv: string): CycleColumns {
  const reading = readCycleCsv(csv);
  if (reading.readable) return reading.columns;
  refuseUnusable(reading.issues);
  return fail('unusable-input', { where: 'csv' });
}

/** The method’s own refusals of a trace, as something that is wrong with the file. */
function checkedTrace(columns: CycleColumns, asked: NewOwnCycle): OwnCycle {
  try {
    return checkOwnCycle({ ...columns, timeUnit: asked.timeUnit, speedUnit: asked.speedUnit });
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return fail('unusable-input', { where: 'csv', detail: error.detail, reason: error.code });
  }
}

export async function retireCycle(work: Work, key: string, retired: boolean): Promise<CycleSummary> {
  if ((await findBuiltInCycle(work.tx, key)) !== undefined) {
    fail('wrong-state', {
      detail: 'Built-in cycles belong to everybody and stay. Only own cycles are retired.',
    });
  }
  const before = demandFound(await ownCycle(work, key));
  const after = await setCycleRetired(work.tx, before.key, retired ? work.now : null);
  await recordAudit(work, {
    action: retired ? 'cycle.retired' : 'cycle.brought-back',
    entityKind: 'cycle',
    entityId: before.key,
    summary: [{ field: 'retiredAt', before: before.retiredAt, after: after.retiredAt }],
  });
  return after;
}
