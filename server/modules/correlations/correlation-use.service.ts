import type { Correlation } from '#shared/contracts/correlations';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { dayOf } from '../../rules/clock';
import { demandFound, refuseUnusable } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { insertUse, listUse, useByCorrelation, type UseRow } from './correlation-use.repository';
import { oneCorrelation } from './correlations.service';
import {
  findCorrelation,
  listVersions,
  lockCorrelationsBetween,
  type CorrelationRow,
} from './correlations.repository';
import { inUseOn, usedFrom, wordOn } from './use-of-versions.policy';

interface Ending {
  readonly effectiveDate: string;
  readonly comment: string;
}

/** Words already said stay in force up to the new date: a date before the last one would change what was. */
function demandLaterDate(use: readonly UseRow[], effectiveDate: string): void {
  const last = wordOn(use, '9999-12-31');
  refuseUnusable(
    last !== undefined && effectiveDate < last.effectiveDate
      ? [
          {
            where: 'effectiveDate',
            reason: 'before-last-date',
            detail: `The use of this correlation is laid down up to ${last.effectiveDate}. Take that date or a later one, so that what was used before stays as it was.`,
          },
        ]
      : [],
  );
}

/** Two in use between the same facilities would leave open which of them was meant. */
async function demandAlone(
  { tx }: Work,
  row: CorrelationRow,
  siblings: readonly CorrelationRow[],
  effectiveDate: string,
): Promise<void> {
  const others = siblings.filter(({ id }) => id !== row.id);
  const use = await useByCorrelation(
    tx,
    others.map(({ id }) => id),
  );
  const rival = others.find(({ id }) => usedFrom(use.get(id) ?? [], effectiveDate));
  if (rival !== undefined) {
    fail('wrong-state', {
      reason: 'another-in-use',
      detail: `“${rival.name}” is used between the same two facilities. End its use first, then adopt this one.`,
    });
  }
}

export async function adoptVersion(
  work: Work,
  id: string,
  { versionNumber, effectiveDate, comment }: Ending & { readonly versionNumber: number },
): Promise<Correlation> {
  const row = demandFound(await findCorrelation(work.tx, id));
  const siblings = await lockCorrelationsBetween(work.tx, row);
  const version = (await listVersions(work.tx, id)).find(({ number }) => number === versionNumber);
  if (version === undefined) {
    fail('unusable-input', {
      where: 'versionNumber',
      detail: 'There is no such version of this correlation.',
    });
  }
  demandLaterDate(await listUse(work.tx, id), effectiveDate);
  await demandAlone(work, row, siblings, effectiveDate);
  await insertUse(work, id, { versionId: version.id, effectiveDate, comment });
  await recordAudit(work, {
    action: 'correlation.adopted',
    entityKind: 'correlation',
    entityId: id,
    summary: [
      { field: 'versionNumber', after: versionNumber },
      { field: 'effectiveDate', after: effectiveDate },
      { field: 'comment', after: comment },
    ],
  });
  return oneCorrelation(work, id);
}

export async function endUse(
  work: Work,
  id: string,
  { effectiveDate, comment }: Ending,
): Promise<Correlation> {
  const row = demandFound(await findCorrelation(work.tx, id));
  await lockCorrelationsBetween(work.tx, row);
  const use = await listUse(work.tx, id);
  if (!usedFrom(use, dayOf(work.now)) && inUseOn(use, effectiveDate) === undefined) {
    fail('wrong-state', { detail: 'No version of this correlation is in use, so there is nothing to end.' });
  }
  demandLaterDate(use, effectiveDate);
  await insertUse(work, id, { versionId: null, effectiveDate, comment });
  await recordAudit(work, {
    action: 'correlation.ended',
    entityKind: 'correlation',
    entityId: id,
    summary: [
      { field: 'effectiveDate', after: effectiveDate },
      { field: 'comment', after: comment },
    ],
  });
  return oneCorrelation(work, id);
}
