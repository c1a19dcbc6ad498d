import type {
  Correlation,
  CorrelationPair,
  CorrelationSummary,
  CorrelationVersionFields,
} from '#shared/contracts/correlations';
import { fitCorrelation } from '#shared/core/correlation/correlation';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { dayOf } from '../../rules/clock';
import { demandFound, demandFreeName, refuseUnusable } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { knownFacilityIds } from '../facilities';
import { listUse, useByCorrelation } from './correlation-use.repository';
import { versionIssues } from './correlations.policy';
import {
  correlationOfName,
  findCorrelation,
  insertCorrelation,
  insertVersion,
  latestNumbers,
  listCorrelations,
  listVersions,
  lockCorrelation,
  pairedResults,
  type CorrelationRow,
} from './correlations.repository';
import { inUseOn } from './use-of-versions.policy';

export async function allCorrelations({ tx, now }: Work): Promise<readonly CorrelationSummary[]> {
  const rows = await listCorrelations(tx);
  const numbers = await latestNumbers(tx);
  const use = await useByCorrelation(tx);
  return rows.map((row) => summaryOf(row, numbers.get(row.id) ?? 0, use.get(row.id) ?? [], now));
}

function summaryOf(
  row: CorrelationRow,
  latestNumber: number,
  use: Parameters<typeof inUseOn>[0],
  now: Date,
): CorrelationSummary {
  const inUse = inUseOn(use, dayOf(now));
  return { ...row, latestNumber, ...(inUse === undefined ? {} : { inUse }) };
}

export async function oneCorrelation({ tx, now }: Work, id: string): Promise<Correlation> {
  const row = demandFound(await findCorrelation(tx, id));
  const versions = await listVersions(tx, id);
  const use = await listUse(tx, id);
  return {
    ...summaryOf(row, versions[0]?.number ?? 0, use, now),
    versions: [...versions],
    adoptions: use.map(({ versionId: _version, ...word }) => word).reverse(),
  };
}

/** Refuses pairs that contradict themselves, and pairs that no line can be laid through. */
async function demandLine(
  { tx }: Work,
  { facilityId, referenceFacilityId }: Omit<CorrelationRow, 'id' | 'name'>,
  pairs: readonly CorrelationPair[],
): Promise<void> {
  const ids = pairs.flatMap(({ resultId, referenceResultId }) =>
    [resultId, referenceResultId].filter((id) => id !== undefined),
  );
  const results = await pairedResults(tx, ids);
  refuseUnusable(versionIssues(pairs, { facilityId, referenceFacilityId, results }));
  fitCorrelation(pairs.filter(({ leftOutReason }) => leftOutReason === undefined));
}

export async function addCorrelation(
  work: Work,
  {
    name,
    facilityId,
    referenceFacilityId,
    ...version
  }: Omit<CorrelationRow, 'id'> & CorrelationVersionFields,
): Promise<Correlation> {
  const known = await knownFacilityIds(work.tx, [facilityId, referenceFacilityId]);
  refuseUnusable(
    Object.entries({ facilityId, referenceFacilityId })
      .filter(([, id]) => !known.has(id))
      .map(([where]) => ({ where, detail: 'There is no such facility. Choose one of the organisation’s.' })),
  );
  await demandLine(work, { facilityId, referenceFacilityId }, version.pairs);
  demandFreeName(await correlationOfName(work.tx, name), undefined, name);
  const id = await insertCorrelation(work, { name, facilityId, referenceFacilityId });
  await insertVersion(work, id, 1, version);
  await recordAudit(work, {
    action: 'correlation.added',
    entityKind: 'correlation',
    entityId: id,
    summary: [
      { field: 'name', after: name },
      { field: 'facilityId', after: facilityId },
      { field: 'referenceFacilityId', after: referenceFacilityId },
      ...versionSummary(version),
    ],
  });
  return oneCorrelation(work, id);
}

function versionSummary({ pairs, replaces, comment }: CorrelationVersionFields) {
  return [
    { field: 'pairs', after: pairs.length },
    { field: 'replaces', after: replaces },
    { field: 'comment', after: comment },
  ];
}

/** A version is never changed: what is found out later becomes the next one. */
export async function addVersion(
  work: Work,
  id: string,
  { basedOnNumber, ...version }: CorrelationVersionFields & { readonly basedOnNumber: number },
): Promise<Correlation> {
  const row = demandFound(await lockCorrelation(work.tx, id));
  const latest = (await latestNumbers(work.tx)).get(id) ?? 0;
  if (latest !== basedOnNumber) fail('conflict', { currentVersion: latest });
  await demandLine(work, row, version.pairs);
  await insertVersion(work, id, latest + 1, version);
  await recordAudit(work, {
    action: 'correlation.version-added',
    entityKind: 'correlation',
    entityId: id,
    summary: [{ field: 'number', after: latest + 1 }, ...versionSummary(version)],
  });
  return oneCorrelation(work, id);
}
