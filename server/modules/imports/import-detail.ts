import type { ImportDetail, ImportSummary } from '#shared/contracts/imports';
import type { Tx } from '../../db/pools';
import { readJob } from '../../jobs';
import { listFacilities } from '../facilities';
import { listVariants } from '../variants';
import { facilityLookup, likeliest, variantLookup } from './checking/known-names';
import { nameKey } from './checking/check-context';
import { countVerdicts, countWhatCounts, textsIn, type Counts } from './import-rows.repository';
import { sameFile, type ImportRecord } from './imports.repository';

const NOTHING: Counts = { accepted: 0, cautioned: 0, refused: 0, skipped: 0 };
const AT_REST = new Set(['mapping', 'ready']);

export async function summaryOf(tx: Tx, record: ImportRecord): Promise<ImportSummary> {
  const { id, version, programmeId, fileName, sizeBytes, state, rowCount, resultCount, message } = record;
  return {
    id,
    version,
    programmeId,
    fileName,
    sizeBytes,
    state,
    rowCount,
    counts: state === 'mapping' || state === 'cancelled' ? NOTHING : await countVerdicts(tx, id),
    resultCount,
    createdAt: record.createdAt.toISOString(),
    createdBy: record.createdBy,
    ...(message === undefined ? {} : { message }),
  };
}

/** Everything about one import but its rows. */
export async function detailOf(tx: Tx, record: ImportRecord): Promise<ImportDetail> {
  const summary = await summaryOf(tx, record);
  const same = await sameFile(tx, record);
  const names = AT_REST.has(record.state) ? await unknownNames(tx, record) : NO_NAMES;
  const counted = record.state === 'ready' ? await countWhatCounts(tx, record.id) : { results: 0, points: 0 };
  return {
    ...summary,
    sha256: record.sha256,
    ...record.facts,
    mapping: record.mapping,
    ...names.unknown,
    willStore: { ...counted, ...names.fresh },
    ...(await progressOf(tx, record)),
    ...(same === undefined
      ? {}
      : {
          sameFileAs: {
            importId: same.id,
            programmeId: same.programmeId,
            state: same.state,
            createdAt: same.createdAt.toISOString(),
            createdBy: same.createdBy,
          },
        }),
  };
}

async function progressOf(tx: Tx, record: ImportRecord): Promise<Pick<ImportDetail, 'progress'>> {
  if ((record.state !== 'checking' && record.state !== 'storing') || record.jobId === undefined) return {};
  const job = await readJob(tx, record.jobId);
  if (job === undefined) return {};
  const waiting = record.state === 'checking' ? 'Waiting to check rows' : 'Waiting to store results';
  return {
    progress: {
      done: Math.round(job.progress),
      total: Math.round(job.total ?? record.rowCount),
      words: job.message ?? waiting,
    },
  };
}

interface Names {
  readonly unknown: Pick<ImportDetail, 'unknownVariants' | 'unknownFacilities'>;
  readonly fresh: Pick<ImportDetail['willStore'], 'variants' | 'aliases'>;
}

const NO_NAMES: Names = {
  unknown: { unknownVariants: [], unknownFacilities: [] },
  fresh: { variants: 0, aliases: 0 },
};

/**
 * Names in the file that the programme does not know by itself, chosen or not: a choice that was made stays on the list,
 * so that it can be changed.
 */
async function unknownNames(tx: Tx, record: ImportRecord): Promise<Names> {
  const variants = await listVariants(tx, record.programmeId);
  const facilities = await listFacilities(tx);
  const byName = variantLookup(variants, []);
  const byPlace = facilityLookup(facilities, []);
  const inVariants = (await texts(tx, record, 'variant')).filter(({ text }) => byName(text) === undefined);
  const inFacilities = (await texts(tx, record, 'facility')).filter(
    ({ text }) => byPlace(text) === undefined,
  );
  const missing = new Set(inVariants.map(({ text }) => nameKey(text)));
  const chosen = record.mapping.variants.filter(({ text }) => missing.has(nameKey(text)));
  const created = chosen.flatMap((choice) => (choice.action === 'create' ? [nameKey(choice.name)] : []));
  return {
    unknown: {
      unknownVariants: inVariants.map((one) => withSuggestion(one, likeliest(one.text, variants))),
      unknownFacilities: inFacilities.map((one) => withSuggestion(one, likeliest(one.text, facilities))),
    },
    fresh: {
      variants: new Set(created).size,
      aliases: chosen.filter(({ action }) => action === 'match').length,
    },
  };
}

const withSuggestion = (
  one: { readonly text: string; readonly rows: number },
  suggestedId: string | undefined,
) => ({ ...one, ...(suggestedId === undefined ? {} : { suggestedId }) });

async function texts(tx: Tx, record: ImportRecord, field: 'variant' | 'facility') {
  const column = record.mapping.columns.find((one) => one.field === field);
  if (column !== undefined) return textsIn(tx, record.id, column.index, 'all');
  const constant = record.mapping.constants.find((one) => one.field === field);
  return constant === undefined ? [] : [{ text: constant.text, rows: record.rowCount }];
}
