import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { facilityCreate } from '#shared/contracts/facilities';
import {
  importChooseSheet,
  importConfirm,
  importDiscard,
  importList,
  importMap,
  importRead,
  importRows,
  importUpload,
} from '#shared/contracts/import-endpoints';
import type { ImportDetail } from '#shared/contracts/imports';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultList } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, variantFields } from '#shared/testing/domain-fields';
import { createJobRunner, type JobRunner } from '../../jobs/job-runner';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';
import { importsModule } from '.';
import { GOOD_ROW, resultsSheet, rowXml, workbookOf } from './corpus/workbook-builder';

const corpus = (file: string): Buffer => readFileSync(join(__dirname, 'corpus', file));

describe('a workbook over HTTP', () => {
  let api: ApiHarness;
  let member: ApiMember;
  let runner: JobRunner;
  let programmeId: string;
  let counter = 0;

  beforeAll(async () => {
    api = await startApi();
    member = await api.asMember('aerodynamicist');
    runner = createJobRunner(api.container, importsModule.jobs ?? []);
    await member.ok(facilityCreate, { body: facilityFields({ name: 'Halmere' }) });
  });
  beforeEach(async () => {
    counter += 1;
    const body = programmeFields({ name: `Dunlin ${String(counter)}` });
    programmeId = (await member.ok(programmeCreate, { body })).id;
    await member.ok(variantCreate, { params: { programmeId }, body: variantFields({ name: 'Liftback' }) });
  });
  afterAll(async () => {
    await runner.stop();
    await api.close();
  });

  const upload = (content: Buffer, name = 'runs.xlsx') =>
    member.ok(importUpload, { params: { programmeId }, file: { name, content } });
  const where = (detail: ImportDetail) => ({ programmeId, importId: detail.id });
  const choose = (detail: ImportDetail, sheet: number) =>
    member.ok(importChooseSheet, { params: where(detail), body: { sheet }, ifMatch: detail.version });
  const cells = async (detail: ImportDetail) =>
    (await member.ok(importRows, { params: where(detail), query: {} })).rows.map((row) => row.cells);

  async function checked(detail: ImportDetail): Promise<ImportDetail> {
    await member.ok(importMap, { params: where(detail), body: detail.mapping, ifMatch: detail.version });
    await runner.idle();
    return member.ok(importRead, { params: where(detail) });
  }
  async function stored(detail: ImportDetail): Promise<ImportDetail> {
    await member.ok(importConfirm, {
      params: where(detail),
      body: { leavingOutRefusedRows: detail.counts.refused },
      ifMatch: detail.version,
    });
    await runner.idle();
    return member.ok(importRead, { params: where(detail) });
  }

  it('goes from merged cells to a yaw sweep of each name, and says what was merged', async () => {
    const fresh = await upload(corpus('workbook-merged.xlsx'));
    expect(fresh).toMatchObject({ state: 'mapping', rowCount: 6, decimalFound: 'point', sheet: 0 });
    expect(fresh.encoding).toBeUndefined();
    expect(fresh.delimiter).toBeUndefined();
    expect(fresh.notes.join('\n')).toMatch(/Merged cells: .* \(16 cells\)/);

    const done = await stored(await checked(fresh));
    expect(done).toMatchObject({ state: 'stored', resultCount: 3 });
    const { results } = await member.ok(resultList, { params: { programmeId } });
    expect(results.map(({ name, testDate, points }) => [name, testDate, points.length])).toEqual([
      ['M-1', '2026-05-04', 3],
      ['M-2', '2026-05-04', 1],
      ['M-3', '2026-05-04', 2],
    ]);
    expect(results[0]?.points.map(({ yawDeg, value }) => [yawDeg, value])).toEqual([
      [-5, 0.6],
      [0, 0.576],
      [5, 0.61],
    ]);
  });

  it('stores the cached value of a formula and the percentage that a cell shows', async () => {
    const ready = await checked(await upload(corpus('workbook-formulas.xlsx')));
    expect(ready.counts).toMatchObject({ accepted: 4, refused: 3 });
    await stored(ready);
    const { results } = await member.ok(resultList, { params: { programmeId } });
    expect(results.map(({ name, points, testDate }) => [name, points[0]?.value, testDate])).toEqual([
      ['F-1', 533.5, '2026-03-04'],
      ['F-2', 538.835, '2026-03-04'],
      ['F-3', 539.835, '2026-03-04'],
      ['F-6', 533.5, '2026-03-25'],
    ]);
    expect(results.map(({ air }) => air?.relativeHumidity)).toEqual([0.45, 0.07, 0.455, 0.45]);
  });

  const several = (): Buffer =>
    workbookOf({
      sheets: [
        resultsSheet(),
        { name: 'Notes', xml: `<sheetData>${rowXml(1, ['Only words'])}</sheetData>` },
        resultsSheet(rowXml(3, ['R-2', ...GOOD_ROW.slice(1)]), '', 'More'),
      ],
    });

  it('proposes the first sheet with a table; another one takes its place, rows and all', async () => {
    const fresh = await upload(several());
    expect(fresh.sheets?.map(({ name, hasTable }) => [name, hasTable])).toEqual([
      ['Results', true],
      ['Notes', false],
      ['More', true],
    ]);
    expect([fresh.sheet, fresh.rowCount]).toEqual([0, 1]);
    const ready = await checked(fresh);
    const other = await choose(ready, 2);
    expect(other).toMatchObject({ state: 'mapping', sheet: 2, rowCount: 2 });
    expect(other.version).toBeGreaterThan(ready.version);
    expect((await cells(other)).map(([name]) => name)).toEqual(['R-1', 'R-2']);
    expect(await choose(other, 0)).toMatchObject({ sheet: 0, rowCount: 1 });
  });

  it('stores one sheet of a workbook after another, but none of them twice', async () => {
    await stored(await checked(await upload(several())));
    const again = await checked(await upload(several()));
    expect(again.sameFileAs).toMatchObject({ state: 'stored' });
    expect(
      await member.refused(importConfirm, {
        params: where(again),
        body: { leavingOutRefusedRows: again.counts.refused },
        ifMatch: again.version,
      }),
    ).toMatchObject({ code: expect.stringMatching(/already-exists|unusable-input/) as string });

    const other = await choose(again, 2);
    expect(other.sameFileAs).toBeUndefined();
    // The name that both sheets hold is taken by now; the other row is stored.
    const done = await stored(await checked(other));
    expect(done).toMatchObject({ state: 'stored', resultCount: 1 });
  });

  it('refuses a sheet without a table and keeps the one that was read', async () => {
    const fresh = await upload(several());
    const problem = await member.refused(importChooseSheet, {
      params: where(fresh),
      body: { sheet: 1 },
      ifMatch: fresh.version,
    });
    expect(problem).toMatchObject({ code: 'unusable-input', where: 'body.sheet' });
    expect(problem.detail).toContain('The sheet “Notes” holds no table');
    expect(await member.ok(importRead, { params: where(fresh) })).toMatchObject({
      sheet: 0,
      version: fresh.version,
    });
    expect(await cells(fresh)).toHaveLength(1);
  });

  it('has no other sheet to offer where there is only one, or none any more, or a colleague was faster', async () => {
    const single = await upload(corpus('workbook-plain.xlsx'));
    expect(
      await member.refused(importChooseSheet, {
        params: where(single),
        body: { sheet: 0 },
        ifMatch: single.version,
      }),
    ).toMatchObject({ code: 'unusable-input' });

    const fresh = await upload(several());
    expect(
      await member.refused(importChooseSheet, {
        params: where(fresh),
        body: { sheet: 2 },
        ifMatch: fresh.version + 1,
      }),
    ).toMatchObject({ code: 'conflict' });
    const aside = await member.ok(importDiscard, { params: where(fresh) });
    expect(
      await member.refused(importChooseSheet, {
        params: where(fresh),
        body: { sheet: 2 },
        ifMatch: aside.version,
      }),
    ).toMatchObject({ code: 'wrong-state' });
  });

  it('keeps the file only while another sheet of it can be asked for', async () => {
    const kept = async (detail: ImportDetail): Promise<boolean> => {
      const rows = await api.database.query<{ kept: boolean }>(
        'maintenance',
        'select content is not null as kept from imports where id = $1',
        [detail.id],
      );
      return rows[0]?.kept ?? false;
    };
    const single = await upload(corpus('workbook-plain.xlsx'));
    expect(await kept(single)).toBe(false);
    const fresh = await upload(several());
    expect(await kept(fresh)).toBe(true);
    await stored(await checked(fresh));
    expect(await kept(fresh)).toBe(false);
  });

  it('is refused without a trace where it means harm', async () => {
    const content = workbookOf({
      parts: [{ name: 'xl/media/a.xml', content: '<!DOCTYPE x SYSTEM "http://127.0.0.1:1/x"><x/>' }],
    });
    const problem = await member.refused(importUpload, {
      params: { programmeId },
      file: { name: 'runs.xlsx', content },
    });
    expect(problem).toMatchObject({ code: 'unsupported-file', where: 'body.file' });
    expect(problem.detail).toContain('DOCTYPE');
    expect((await member.ok(importList, { params: { programmeId } })).imports).toEqual([]);
  });
});
