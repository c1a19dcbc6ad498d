import type { ImportMapping } from '#shared/contracts/imports';
import type { ResultFields } from '#shared/contracts/results';
import type { Variant, VariantFields } from '#shared/contracts/variants';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import type { JobKind } from '../../jobs';
import { dayOf } from '../../rules/clock';
import { recordAudit } from '../audit';
import { takeEntrySequence } from '../results';
import { addVariant } from '../variants';
import { compiled } from './check-import.job';
import { surroundingsOf } from './check-surroundings';
import { nameKey } from './checking/check-context';
import { checkGroup } from './checking/check-group';
import { newVariantKey, variantLookup } from './checking/known-names';
import { groupPages } from './groups';
import { countVerdicts, countWhatCounts, pageOfGroups, textsIn } from './import-rows.repository';
import { changeImport, lockImport, type ImportRecord } from './imports.repository';
import { importIdOf } from './job-payload';
import { addAliases, storeResults, type ResultToStore } from './store-results.repository';

export const STORE_JOB = 'import-store';
const BATCH = 500;

type Report = (stored: number, total: number) => Promise<void>;

/**
 * Stores an import in one transaction: variants, aliases, sessions, results, points and the import's own state, all or
 * nothing. Progress is told outside of it. A server killed half-way leaves nothing, and the next one begins again; one
 * killed after the commit finds the import stored and is done.
 */
export const storeImportJob: JobKind = {
  kind: STORE_JOB,
  run: async (run) => {
    const importId = importIdOf(run.payload);
    await run.inTransaction(async (work) => {
      const record = await lockImport(work.tx, importId);
      if (record?.state !== 'storing') return;
      const stored = await storeImport(work, record, (done, total) =>
        run.progress(done, total, 'Storing results'),
      );
      await changeImport(work.tx, importId, {
        state: 'stored',
        resultCount: stored,
        storedAt: work.now,
        message: null,
      });
    });
  },
  onEnd: async ({ tx }, payload, outcome, reason) => {
    const record = await lockImport(tx, importIdOf(payload));
    if (record?.state !== 'storing') return;
    await changeImport(tx, record.id, {
      state: 'ready',
      message: outcome === 'cancelled' ? null : `Nothing was stored. ${reason}`,
    });
  },
};

async function storeImport(work: Work, record: ImportRecord, report: Report): Promise<number> {
  const { results: total } = await countWhatCounts(work.tx, record.id);
  // Taking the numbers first also makes every other entry of a result wait: names stay free from here on.
  let entrySequence = total === 0 ? 0 : await takeEntrySequence(work.tx, total);
  const created = await createVariants(work, record);
  await rememberAliases(work, record);
  const surroundings = await surroundingsOf(work, record);
  const mapping = compiled(record);
  const realId = (fields: ResultFields): ResultFields => ({
    ...fields,
    variantId: created.get(fields.variantId) ?? fields.variantId,
  });
  const expected = await countVerdicts(work.tx, record.id);
  let batch: ResultToStore[] = [];
  let stored = 0;
  let rows = 0;
  const flush = async () => {
    await storeResults(work, { importId: record.id, programmeId: record.programmeId }, batch);
    stored += batch.length;
    batch = [];
    await report(stored, total);
  };
  for await (const groups of groupPages((after, limit) => pageOfGroups(work.tx, record.id, after, limit))) {
    for (const group of groups) {
      const { draft } = checkGroup(group, mapping, surroundings.context);
      const [first] = group;
      if (draft === undefined || first === undefined) continue;
      batch.push({ fields: realId(draft), rowNumber: first.rowNumber, entrySequence });
      entrySequence += 1;
      rows += group.length;
      if (batch.length === BATCH) await flush();
    }
  }
  await flush();
  demandUnchanged(stored === total && rows === expected.accepted + expected.cautioned);
  await recordAudit(work, {
    action: 'import.stored',
    entityKind: 'import',
    entityId: record.id,
    summary: [
      { field: 'fileName', after: record.fileName },
      { field: 'sha256', after: record.sha256 },
      { field: 'results', after: stored },
      { field: 'variants', after: created.size },
    ],
  });
  return stored;
}

/** What was checked and what would be stored must be the same, whatever happened in between. */
function demandUnchanged(same: boolean): void {
  if (!same)
    fail('unusable-input', {
      detail:
        'The programme has changed since the rows were checked (a name, a variant or a facility), and some rows would be judged otherwise now. Check again.',
    });
}

/** Creates the chosen variants that rows to be stored name; returns placeholder → id. */
async function createVariants(work: Work, record: ImportRecord): Promise<ReadonlyMap<string, string>> {
  const wanted = await choicesInUse(work, record);
  const created = new Map<string, string>();
  const byName = new Map<string, Variant>();
  for (const choice of wanted) {
    if (choice.action !== 'create') continue;
    const twin = byName.get(nameKey(choice.name));
    if (twin !== undefined) await addAliases(work.tx, twin.id, [choice.text]);
    const variant =
      twin ?? (await addVariant(work, record.programmeId, variantFieldsOf(choice, dayOf(work.now))));
    byName.set(nameKey(choice.name), variant);
    created.set(newVariantKey(choice.text), variant.id);
  }
  return created;
}

type Choice = ImportMapping['variants'][number];

/** The choices that rows to be stored need, and that the programme has not answered by itself meanwhile. */
async function choicesInUse(work: Work, record: ImportRecord): Promise<readonly Choice[]> {
  const column = record.mapping.columns.find(({ field }) => field === 'variant');
  const constant = record.mapping.constants.find(({ field }) => field === 'variant');
  const texts =
    column === undefined
      ? [constant?.text ?? '']
      : (await textsIn(work.tx, record.id, column.index, 'stored')).map(({ text }) => text);
  const used = new Set(texts.map(nameKey));
  const { variants } = await surroundingsOf(work, record);
  const alone = variantLookup(variants, []);
  return record.mapping.variants.filter(({ text }) => used.has(nameKey(text)) && alone(text) === undefined);
}

function variantFieldsOf(choice: Extract<Choice, { action: 'create' }>, day: string): VariantFields {
  const { name, text, bodyShape, frontalAreaM2, frontalAreaUM2, massKg, rollingResistance } = choice;
  return {
    name,
    bodyShape,
    aliases: nameKey(text) === nameKey(name) ? [] : [text],
    frontalAreas: [{ areaM2: frontalAreaM2, uM2: frontalAreaUM2 ?? 0, method: 'estimate', date: day }],
    configurations:
      massKg === undefined || rollingResistance === undefined
        ? []
        : [
            {
              name: 'Base',
              massKg,
              rollingResistance,
              salesShare: 1,
            },
          ],
  };
}

async function rememberAliases(work: Work, record: ImportRecord): Promise<void> {
  const byVariant = new Map<string, string[]>();
  for (const choice of await choicesInUse(work, record)) {
    if (choice.action !== 'match') continue;
    byVariant.set(choice.variantId, [...(byVariant.get(choice.variantId) ?? []), choice.text]);
  }
  for (const [variantId, aliases] of byVariant) {
    await addAliases(work.tx, variantId, aliases);
    await recordAudit(work, {
      action: 'variant.changed',
      entityKind: 'variant',
      entityId: variantId,
      summary: [{ field: 'aliases', after: aliases }],
    });
  }
}
