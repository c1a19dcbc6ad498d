import type { CorrelationInput } from '#shared/core/ranking/ranking-input';
import type { Tx } from '../../db/pools';
import { useByCorrelation, versionsById } from './correlation-use.repository';
import { listCorrelations } from './correlations.repository';
import { wordOn } from './use-of-versions.policy';

/** A correlation as the ranking takes it, and what a person is told of it. */
export interface CorrelationInUse {
  /** Its id is that of the version; its name says which version it is and since when it is used, for every derivation. */
  readonly input: CorrelationInput;
  readonly correlationId: string;
  readonly name: string;
  readonly number: number;
  /** From when on this version is used. */
  readonly since: string;
  readonly adoptedBy: string;
}

/** The correlations to a reference facility that are used on a day, in the order in which the first that fits is used. */
export async function correlationsInUse(
  tx: Tx,
  referenceFacilityId: string | null,
  day: string,
): Promise<readonly CorrelationInUse[]> {
  if (referenceFacilityId === null) return [];
  const rows = (await listCorrelations(tx)).filter((row) => row.referenceFacilityId === referenceFacilityId);
  const use = await useByCorrelation(
    tx,
    rows.map(({ id }) => id),
  );
  const holding = rows.flatMap(({ id }) => {
    const word = wordOn(use.get(id) ?? [], day);
    return word?.versionId === undefined ? [] : [{ ...word, versionId: word.versionId, correlationId: id }];
  });
  const versions = new Map(
    (
      await versionsById(
        tx,
        holding.map(({ versionId }) => versionId),
      )
    ).map((version) => [version.id, version]),
  );
  return holding.flatMap(({ correlationId, versionId, versionNumber, effectiveDate, by }) => {
    const version = versions.get(versionId);
    if (version === undefined || versionNumber === undefined) return [];
    const { name, facilityId, replaces, pairs } = version;
    return {
      input: {
        id: versionId,
        name: `${name}, version ${versionNumber}, in use since ${effectiveDate}`,
        facilityId,
        referenceFacilityId,
        replaces,
        pairs: pairs
          .filter(({ leftOutReason }) => leftOutReason === undefined)
          .map(({ dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 }) => ({
            dragAreaM2,
            uM2,
            referenceDragAreaM2,
            referenceUM2,
          })),
      },
      correlationId,
      name,
      number: versionNumber,
      since: effectiveDate,
      adoptedBy: by,
    };
  });
}
