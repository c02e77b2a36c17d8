import { assess, type Design } from '#calc';
import { ioList } from '#documents';
import fc from 'fast-check';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { text } from 'node:stream/consumers';
import { afterAll, describe, expect, it } from 'vitest';
import { brackwaterSetup, countingIds, tagListBytes } from '#support/brackwater-setup.ts';
import { nastyDesign } from '#support/nasty-design.ts';
import { runs } from '#support/property-runs.ts';
import { brackwaterDesign } from '../../db/seed/brackwater.ts';
import { seedIds } from '../../db/seed/seed-ids.ts';
import { ioListCsv, type CsvOptions } from '../../apps/server/src/documents/io-list-csv.ts';
import { writeIoListXlsx } from '../../apps/server/src/documents/io-list-xlsx.ts';
import { changesOf, type ImportPlan } from '../../apps/server/src/imports/reading/index.ts';
import { importOf } from '../../apps/server/src/imports/reading/testing/plan-of.ts';
import { withChanges } from '../../apps/server/src/imports/reading/testing/with-changes.ts';

const folder = mkdtempSync(join(tmpdir(), 'own-lists-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const listOf = (design: Design) => ioList(design, assess(design), '2026-05-04');

async function csvOf(design: Design, options: Partial<CsvOptions>): Promise<string> {
  return text(ioListCsv(listOf(design), { delimiter: ',', decimal: '.', bom: false, ...options }));
}

async function workbookOf(design: Design): Promise<Uint8Array> {
  const path = join(folder, 'list.xlsx');
  await writeIoListXlsx(listOf(design), path);
  return readFileSync(path);
}

/** What is not as before. */
function changed({ rows, counts }: ImportPlan, design: Design): unknown {
  expect(counts.same).toBe(design.points.length);
  return rows.filter(({ action, problems }) => action !== 'same' || problems.length > 0).map(({ values, changes, problems }) => ({ tag: values.tag, changes, problems }));
}

const demo = brackwaterDesign({ catalogue: seedIds('catalogue'), row: seedIds('row') });
const DIALECTS: readonly Partial<CsvOptions>[] = [{}, { bom: true }, { delimiter: ';', decimal: ',' }, { delimiter: '\t' }, { delimiter: ';', bom: true }];

async function withDesignations(): Promise<Design> {
  const setup = brackwaterSetup();
  return withChanges(setup, changesOf((await importOf(tagListBytes('designations.csv'), setup)).plan, setup, countingIds()));
}

describe('our own I/O list, imported again', () => {
  it.each(DIALECTS)('changes nothing as CSV: %j', async (options) => {
    for (const design of [demo, await withDesignations()]) {
      const { reading, plan } = await importOf(await csvOf(design, options), design);
      expect(reading.ownExport).toBe(true);
      expect(changed(plan, design)).toEqual([]);
    }
  });

  it('changes nothing as a workbook: all cabinets, neither summary nor derived columns', async () => {
    const { reading, plan } = await importOf(await workbookOf(demo), demo);
    expect(reading.sheets.map(({ name, taken }) => [name, taken])).toEqual([['Summary', false], ['+K1', true], ['+K2', true]]);
    expect(reading.columns.filter(({ heading, field }) => (field === null) !== heading.startsWith('Computed'))).toEqual([]);
    expect(changed(plan, demo)).toEqual([]);
    const designations = await withDesignations();
    expect(changed((await importOf(await workbookOf(designations), designations)).plan, designations)).toEqual([]);
  });

  it('gives the same points in a project that has none', async () => {
    const designations = await withDesignations();
    for (const file of [await csvOf(designations, {}), await workbookOf(designations)]) {
      const empty = brackwaterSetup();
      const after = withChanges(empty, changesOf((await importOf(file, empty)).plan, empty, countingIds()));
      // a workbook has line feeds only
      const plain = (remarks: string | null) => remarks?.replaceAll('\r\n', '\n') ?? null;
      const byTag = (design: Design) => new Map(design.points.map(({ id: _, ...rest }) => [rest.tag, { ...rest, remarks: plain(rest.remarks) }]));
      expect(byTag(after)).toEqual(byTag(designations));
    }
  });

  it('changes nothing as CSV, whatever the texts and numbers', async () => {
    await fc.assert(
      fc.asyncProperty(nastyDesign, fc.constantFrom(...DIALECTS), async (design, options) => {
        expect(changed((await importOf(await csvOf(design, options), design)).plan, design)).toEqual([]);
      }),
      { numRuns: runs(60) },
    );
  });

  it('changes nothing as a workbook, whatever the texts and numbers', async () => {
    await fc.assert(
      fc.asyncProperty(nastyDesign, async (design) => {
        expect(changed((await importOf(await workbookOf(design), design)).plan, design)).toEqual([]);
      }),
      { numRuns: runs(25) },
    );
  });
});
