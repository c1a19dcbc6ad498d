import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { facilityCreate } from '#shared/contracts/facilities';
import {
  importConfirm,
  importDiscard,
  importFixRows,
  importList,
  importMap,
  importRead,
  importRows,
  importStop,
  importUpload,
  importWithdraw,
} from '#shared/contracts/import-endpoints';
import { type ImportDetail, type ImportFix, type ImportMapping } from '#shared/contracts/imports';
import { programmeCreate } from '#shared/contracts/programmes';
import { evidenceAdopt } from '#shared/contracts/adoptions';
import { resultEnter, resultList } from '#shared/contracts/results';
import { variantCreate, variantList } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { createJobRunner, type JobRunner } from '../../jobs/job-runner';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';
import { importsModule } from '.';

const corpus = (file: string): Buffer => readFileSync(join(__dirname, 'corpus', file));
const HEADINGS = 'Run,Variant,Facility,Date,Yaw [deg],CdA [m²],Scale,Speed [km/h],Air state,s [m²],n';
const line = (
  run: string,
  change: { variant?: string; yaw?: number; cda?: string; date?: string } = {},
): string =>
  `${run},${change.variant ?? 'Hatch'},Halmere,${change.date ?? '2026-04-01'},${String(change.yaw ?? 0)},${change.cda ?? '0.61'},1,140,ISA,0.001,5`;

describe('an import over HTTP', () => {
  let api: ApiHarness;
  let member: ApiMember;
  let runner: JobRunner;
  let facilityId: string;
  let counter = 0;

  beforeAll(async () => {
    api = await startApi();
    member = await api.asMember('aerodynamicist');
    runner = createJobRunner(api.container, importsModule.jobs ?? []);
    facilityId = (await member.ok(facilityCreate, { body: facilityFields() })).id;
  });
  afterAll(async () => {
    await runner.stop();
    await api.close();
  });

  async function programme(): Promise<{ readonly programmeId: string; readonly hatchId: string }> {
    counter += 1;
    const { id } = await member.ok(programmeCreate, {
      body: programmeFields({ name: `Dunlin ${String(counter)}` }),
    });
    const hatch = await member.ok(variantCreate, {
      params: { programmeId: id },
      body: variantFields({ name: 'Hatch', aliases: ['Five door'] }),
    });
    return { programmeId: id, hatchId: hatch.id };
  }

  const upload = (programmeId: string, content: Buffer | string, name = 'runs.csv') =>
    member.ok(importUpload, { params: { programmeId }, file: { name, content } });
  const where = (detail: ImportDetail) => ({ programmeId: detail.programmeId, importId: detail.id });
  const read = (detail: ImportDetail) => member.ok(importRead, { params: where(detail) });
  const rows = async (detail: ImportDetail, query: Record<string, string> = {}) =>
    member.ok(importRows, { params: where(detail), query });

  async function checked(detail: ImportDetail, change: Partial<ImportMapping> = {}): Promise<ImportDetail> {
    await member.ok(importMap, {
      params: where(detail),
      body: { ...detail.mapping, ...change },
      ifMatch: detail.version,
    });
    await runner.idle();
    return read(detail);
  }
  async function stored(detail: ImportDetail): Promise<ImportDetail> {
    await member.ok(importConfirm, {
      params: where(detail),
      body: { leavingOutRefusedRows: detail.counts.refused },
      ifMatch: detail.version,
    });
    await runner.idle();
    return read(detail);
  }
  const fix = (detail: ImportDetail, body: ImportFix) =>
    member.ok(importFixRows, { params: where(detail), body });
  const results = async (programmeId: string) =>
    (await member.ok(resultList, { params: { programmeId } })).results;

  it('goes from a file to results: guessed, checked, stored, with a yaw sweep as one result', async () => {
    const { programmeId, hatchId } = await programme();
    const text = [
      HEADINGS,
      line('A-1'),
      line('A-2', { yaw: -5, cda: '0.63' }),
      line('A-2'),
      line('A-2', { yaw: 5, cda: '0.64' }),
      '',
    ].join('\n');
    const fresh = await upload(programmeId, text);
    expect(fresh).toMatchObject({
      state: 'mapping',
      rowCount: 4,
      encoding: 'utf-8',
      delimiter: ',',
      decimalFound: 'point',
    });
    expect(await results(programmeId)).toEqual([]);

    const ready = await checked(fresh);
    expect(ready).toMatchObject({
      state: 'ready',
      willStore: { results: 2, points: 4, variants: 0, aliases: 0 },
    });
    expect(ready.counts.refused).toBe(0);
    expect(await results(programmeId)).toEqual([]);

    const done = await stored(ready);
    expect(done).toMatchObject({ state: 'stored', resultCount: 2 });
    const kept = await results(programmeId);
    expect(kept.map(({ name, points }) => [name, points.map(({ yawDeg }) => yawDeg)])).toEqual([
      ['A-1', [0]],
      ['A-2', [-5, 0, 5]],
    ]);
    expect(kept[0]).toMatchObject({
      variantId: hatchId,
      facilityId,
      importId: done.id,
      quantity: 'drag-area',
      speedKmh: 140,
      air: { state: 'iso-2533-sea-level' },
      condition: { ground: 'several-belts', wheels: 'rotating' },
    });
  });

  it('creates, matches and skips unknown variants, and remembers a match as an alias', async () => {
    const { programmeId, hatchId } = await programme();
    const text = [
      HEADINGS,
      line('B-1', { variant: 'H5' }),
      line('B-2', { variant: 'Speedster' }),
      line('B-3', { variant: 'Mule' }),
      line('B-4', { variant: 'five DOOR' }),
    ].join('\n');
    const unmatched = await checked(await upload(programmeId, text));
    expect(unmatched.counts).toMatchObject({ refused: 3 });
    expect(unmatched.unknownVariants.map((one) => one.text)).toEqual(['H5', 'Mule', 'Speedster']);

    const ready = await checked(unmatched, {
      variants: [
        { action: 'match', text: 'H5', variantId: hatchId },
        {
          action: 'create',
          text: 'Speedster',
          name: 'Dunlin Speedster',
          bodyShape: 'coupe',
          frontalAreaM2: 1.98,
          massKg: 1300,
          rollingResistance: 0.009,
        },
        { action: 'skip', text: 'Mule' },
      ],
    });
    expect(ready.counts).toMatchObject({ refused: 0, skipped: 1 });
    expect(ready.willStore).toMatchObject({ results: 3, variants: 1, aliases: 1 });
    await stored(ready);

    const { variants } = await member.ok(variantList, { params: { programmeId } });
    expect(variants.map(({ name, aliases }) => [name, aliases])).toEqual([
      ['Dunlin Speedster', ['Speedster']],
      ['Hatch', ['Five door', 'H5']],
    ]);
    expect(variants[0]?.configurations[0]).toMatchObject({ massKg: 1300, rollingResistance: 0.009 });
    expect((await results(programmeId)).map(({ name }) => name)).toEqual(['B-1', 'B-2', 'B-4']);
  });

  it('pages and filters its rows by verdict, text and column', async () => {
    const { programmeId } = await programme();
    const detail = await checked(
      await upload(
        programmeId,
        [
          HEADINGS,
          line('C-1'),
          line('C-2', { cda: '6.1' }),
          line('C-3', { cda: 'n/a' }),
          line('C-4', { date: '2026-02-31' }),
        ].join('\n'),
      ),
    );
    const numbers = async (query: Record<string, string>) =>
      (await rows(detail, query)).rows.map(({ rowNumber }) => rowNumber);
    expect((await rows(detail)).counts).toMatchObject({ accepted: 1, cautioned: 1, refused: 2 });
    expect(await numbers({ verdict: 'refused' })).toEqual([4, 5]);
    expect(await numbers({ column: '5' })).toEqual([3, 4]);
    expect(await numbers({ search: 'c-4' })).toEqual([5]);
    expect(await numbers({ search: '6.1', column: '5' })).toEqual([3]);
    expect(await numbers({ search: '%' })).toEqual([]);
    expect(await numbers({ offset: '1', limit: '2' })).toEqual([3, 4]);
    const [refused] = (await rows(detail, { verdict: 'refused' })).rows;
    expect(refused?.reasons[0]).toMatchObject({ column: 5, field: 'dragArea', code: 'unreadable-cell' });
  });

  it('mends one cell and checks only the result that it touches', async () => {
    const { programmeId } = await programme();
    const detail = await checked(
      await upload(
        programmeId,
        [HEADINGS, line('D-1', { cda: 'n/a' }), line('D-1', { yaw: 5, cda: '0.64' }), line('D-2')].join('\n'),
      ),
    );
    expect(detail.counts).toMatchObject({ refused: 2, accepted: 1 });
    const reply = await fix(detail, { kind: 'cell', rowNumber: 2, column: 5, text: ' 0.62 ' });
    expect(reply).toMatchObject({ changedRows: 1, checkedRows: 2 });
    expect(reply.import.counts).toMatchObject({ refused: 0, skipped: 0 });
    const [mended] = (await rows(detail)).rows;
    expect(mended).toMatchObject({ fixes: { '5': 'n/a' } });
    expect(mended?.cells[5]).toBe('0.62');
  });

  it('mends many rows at once, replaces text, skips rows and takes them back', async () => {
    const { programmeId } = await programme();
    const text = [
      HEADINGS,
      ...[1, 2, 3].map((n) =>
        line(`E-${String(n)}`, { cda: `0,6${String(n)}` }).replace(/"?0,6(\d)"?/, '"0,6$1"'),
      ),
      line('E-4', { date: 'later' }),
      line('E-5', { date: 'later' }),
    ].join('\n');
    const detail = await checked(await upload(programmeId, text), { decimal: 'point' });
    expect(detail.counts.refused).toBe(5);
    expect(
      await fix(detail, { kind: 'replace', column: 5, find: ',', text: '.', filter: { verdict: 'refused' } }),
    ).toMatchObject({ changedRows: 3 });
    const skip = await fix(detail, { kind: 'skip', filter: {}, rowNumbers: [5] });
    expect(skip.import.counts).toMatchObject({ skipped: 1, refused: 1 });
    expect(
      (await fix(detail, { kind: 'unskip', filter: { verdict: 'skipped' } })).import.counts,
    ).toMatchObject({ skipped: 0, refused: 2 });
    const set = await fix(detail, {
      kind: 'set',
      column: 3,
      text: '2026-04-02',
      filter: { verdict: 'refused', column: 3 },
    });
    expect(set).toMatchObject({ changedRows: 2 });
    expect(set.import.counts.refused).toBe(0);
  });

  it('moves a row to another result when its name is mended, and checks both', async () => {
    const { programmeId } = await programme();
    const detail = await checked(
      await upload(programmeId, [HEADINGS, line('F-1'), line('F-1'), line('F-2')].join('\n')),
    );
    expect(detail.counts.refused).toBe(2);
    const reply = await fix(detail, { kind: 'cell', rowNumber: 3, column: 0, text: 'F-3' });
    expect(reply.checkedRows).toBe(2);
    expect(reply.import).toMatchObject({ counts: { refused: 0 }, willStore: { results: 3 } });
  });

  it('recognises the same file, and refuses to store it twice until it is withdrawn', async () => {
    const { programmeId } = await programme();
    const text = [HEADINGS, line('G-1'), line('G-2')].join('\n');
    const first = await stored(await checked(await upload(programmeId, text)));
    const again = await upload(programmeId, text, 'other name.csv');
    expect(again.sameFileAs).toMatchObject({
      importId: first.id,
      state: 'stored',
      createdBy: 'aerodynamicist of First Motors',
    });
    const ready = await checked(again);
    expect(ready.counts.refused).toBe(2);
    const renamed = await fix(ready, { kind: 'replace', column: 0, find: 'G', text: 'GG', filter: {} });
    expect(
      await member.refused(importConfirm, {
        params: where(again),
        body: { leavingOutRefusedRows: 0 },
        ifMatch: renamed.import.version,
      }),
    ).toMatchObject({ code: 'already-exists', detail: expect.stringContaining('same file') as string });

    expect(
      await member.ok(importWithdraw, { params: where(first), body: { reason: 'Wrong area throughout' } }),
    ).toMatchObject({ state: 'withdrawn' });
    expect(
      (await results(programmeId)).every(({ withdrawn }) => withdrawn?.reason === 'Wrong area throughout'),
    ).toBe(true);
    const third = await stored(await checked(await upload(programmeId, text)));
    expect(third).toMatchObject({ state: 'stored', resultCount: 2 });
  });

  it('cannot be withdrawn while an adopted result rests on it', async () => {
    const { programmeId, hatchId } = await programme();
    const done = await stored(await checked(await upload(programmeId, [HEADINGS, line('H-1')].join('\n'))));
    const [only] = await results(programmeId);
    const adopt = (resultIds: string[], expectedAdoptionId?: string) =>
      member.ok(evidenceAdopt, {
        params: { programmeId },
        body: {
          adoptions: [{ variantId: hatchId, resultIds, rule: 'newest', expectedAdoptionId }],
          comment: 'The only one',
        },
      });
    const { adoptions } = await adopt([only?.id ?? '']);
    expect(
      await member.refused(importWithdraw, { params: where(done), body: { reason: 'Not wanted' } }),
    ).toMatchObject({
      code: 'still-in-use',
      detail: expect.stringContaining('H-1') as string,
    });
    await adopt([], adoptions[0]?.id);
    expect(
      await member.ok(importWithdraw, { params: where(done), body: { reason: 'Not wanted' } }),
    ).toMatchObject({ state: 'withdrawn' });
  });

  it('stores nothing when a name is taken between check and storing, and says so', async () => {
    const { programmeId, hatchId } = await programme();
    const ready = await checked(await upload(programmeId, [HEADINGS, line('I-1'), line('I-2')].join('\n')));
    await member.ok(resultEnter, {
      params: { programmeId },
      body: resultFields({ variantId: hatchId, facilityId }, { name: 'i-2' }),
    });
    const after = await stored(ready);
    expect(after).toMatchObject({
      state: 'ready',
      message: expect.stringContaining('Check again') as string,
    });
    expect((await results(programmeId)).map(({ name }) => name)).toEqual(['i-2']);
    expect((await checked(after)).counts).toMatchObject({ accepted: 1, refused: 1 });
  });

  it('is stopped while it waits, and is where it was before', async () => {
    const { programmeId } = await programme();
    const fresh = await upload(programmeId, [HEADINGS, line('J-1')].join('\n'));
    const checking = await member.ok(importMap, {
      params: where(fresh),
      body: fresh.mapping,
      ifMatch: fresh.version,
    });
    expect(checking).toMatchObject({ state: 'checking', progress: { done: 0, total: 1 } });
    expect(await member.refused(importDiscard, { params: where(fresh) })).toMatchObject({
      code: 'wrong-state',
    });
    await member.ok(importStop, { params: where(fresh) });
    await runner.idle();
    expect(await read(fresh)).toMatchObject({ state: 'mapping' });
    expect(await member.ok(importDiscard, { params: where(fresh) })).toMatchObject({ state: 'cancelled' });
    expect((await rows(fresh)).total).toBe(0);
  });

  it('remembers the mapping for files with the same headings', async () => {
    const { programmeId } = await programme();
    const odd = (run: string) =>
      `Was,Wer,Wo,Wann,Wieviel,Wie gross,Wie schnell,Welche Luft,Wie oft\n${run},Hatch,Halmere,2026-04-01,0.61,1,140,ISA,5\n`;
    const fresh = await upload(programmeId, odd('K-1'));
    expect(fresh.mappingRemembered).toBe(false);
    const fields = [
      'name',
      'variant',
      'facility',
      'testDate',
      'dragArea',
      'scale',
      'speed',
      'airState',
      'n',
    ] as const;
    await checked(fresh, { columns: fields.map((field, index) => ({ index, field })) });
    const next = await upload(programmeId, odd('K-2'));
    expect(next.mappingRemembered).toBe(true);
    expect(next.mapping.columns.map(({ field }) => field)).toEqual(fields);
  });

  it('refuses a mapping that leaves something needed open, and names every gap', async () => {
    const { programmeId } = await programme();
    const fresh = await upload(programmeId, corpus('ambiguous-numbers.csv'));
    const refused = await member.refused(importMap, {
      params: where(fresh),
      body: { ...fresh.mapping, columns: fresh.mapping.columns.filter(({ field }) => field !== 'variant') },
      ifMatch: fresh.version,
    });
    expect(refused.code).toBe('unusable-input');
    expect(refused.issues?.map((issue) => issue.where)).toEqual(['variant', 'decimal', 'dateOrder']);
  });

  it('notices a colleague’s change of the same import', async () => {
    const { programmeId } = await programme();
    const fresh = await upload(programmeId, [HEADINGS, line('L-1')].join('\n'));
    await checked(fresh);
    expect(
      await member.refused(importMap, { params: where(fresh), body: fresh.mapping, ifMatch: fresh.version }),
    ).toMatchObject({ code: 'conflict' });
  });

  it.each([
    ['renamed-program.csv', 'unsupported-file', 'Windows program'],
    ['cut-off-workbook.csv', 'unusable-input', 'damaged'],
    ['nul-bytes.csv', 'unsupported-file', 'NUL'],
    ['only-headings.csv', 'unusable-input', 'no row'],
    ['open-quotation-mark.csv', 'unusable-input', 'quotation mark'],
  ])('refuses %s and leaves nothing behind', async (file, code, words) => {
    const { programmeId } = await programme();
    const refused = await member.refused(importUpload, {
      params: { programmeId },
      file: { name: 'runs.csv', content: corpus(file) },
    });
    expect(refused).toMatchObject({ code, detail: expect.stringContaining(words) as string });
    expect((await member.ok(importList, { params: { programmeId } })).imports).toEqual([]);
  });

  it('refuses a file beyond the limit without keeping it', async () => {
    const { programmeId } = await programme();
    const refused = await member.refused(importUpload, {
      params: { programmeId },
      file: { name: 'huge.csv', content: Buffer.alloc(26 * 1024 * 1024, 'a,b\n') },
    });
    expect(refused).toMatchObject({ code: 'too-large', detail: expect.stringContaining('25 MB') as string });
  });

  it('is for those who run imports, and of another organisation it is not there', async () => {
    const { programmeId } = await programme();
    const detail = await upload(programmeId, [HEADINGS, line('M-1')].join('\n'));
    const viewer = await api.asMember('viewer');
    expect(await viewer.refused(importRead, { params: where(detail) })).toMatchObject({ code: 'forbidden' });
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect(await stranger.refused(importRead, { params: where(detail) })).toMatchObject({
      code: 'not-found',
    });
  });
});
