import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mutated, type Mutation } from '#support/mutations.ts';
import { runs } from '#support/property-runs.ts';
import { tagListBytes } from '#support/brackwater-setup.ts';
import { LIMITS } from '../grid.ts';
import { ImportRefusal } from '../import-refusal.ts';
import { readWorkbook } from './index.ts';
import { rowOf, stylesOf, workbookFiles } from './testing/workbook-files.ts';
import { zipOf } from './testing/zip-builder.ts';

const cells =
  '<c r="A1" t="s"><v>0</v></c><c r="B1" s="1"><v>46082.5</v></c><c r="C1" t="inlineStr"><is><t>x_x000D_y</t></is></c>' +
  '<c r="D1" s="2"><f>1/4</f><v>0.25</v></c><c r="E1" t="e"><v>#N/A</v></c>';
const PIECES = {
  sheets: [`${rowOf(cells)}<mergeCells><mergeCell ref="A1:B1"/></mergeCells>`, rowOf('<c><v>2</v></c>')],
  strings: '<si><r><t>Tag</t></r><rPh><t>z</t></rPh></si>',
  styles: stylesOf(['yyyy-mm-dd hh:mm', '0.0%']),
};
const FILES = workbookFiles(PIECES);
const WHOLE = [zipOf(FILES), tagListBytes('brackwater-signals.xlsx')];

const change: fc.Arbitrary<Mutation> = fc.record({
  kind: fc.constantFrom('flip', 'flip', 'flip', 'flip', 'overwrite', 'overwrite', 'cut', 'remove', 'insert', 'repeat'),
  millionths: fc.noBias(fc.nat(999_999)),
  length: fc.integer({ min: 1, max: 64 }),
  bit: fc.integer({ min: 0, max: 7 }),
}).map((each) => ({ ...each, filler: each.bit * 37 }));

/** Reads, and holds that what comes is a reading within its limits or a refusal, and nothing else. */
async function outcome(bytes: Buffer): Promise<'read' | 'refused'> {
  try {
    const { sheets } = await readWorkbook(bytes);
    const rows = sheets.flatMap(({ grid }) => grid.rows);
    expect(rows.length).toBeLessThanOrEqual(LIMITS.rows);
    expect(rows.every(({ cells: row }) => row.length <= LIMITS.columns)).toBe(true);
    return 'read';
  } catch (error) {
    if (!(error instanceof ImportRefusal)) throw error;
    return 'refused';
  }
}

describe('a workbook with something done to it', () => {
  it('is what the changes begin from', async () => {
    for (const bytes of WHOLE) expect(await outcome(bytes)).toBe('read');
  });

  it('is read or refused when its bytes change', async () => {
    const counts = { read: 0, refused: 0 };
    const changes = fc.array(change, { minLength: 1, maxLength: 3 });
    await fc.assert(
      fc.asyncProperty(fc.constantFrom(...WHOLE), changes, async (whole, each) => {
        counts[await outcome(each.reduce(mutated, whole))] += 1;
      }),
      { numRuns: runs(200), seed: 20260301 },
    );
    expect(counts.refused).toBeGreaterThan(counts.read);
  });

  it('is read or refused when the text of a part changes and the archive is sound', async () => {
    const counts = { read: 0, refused: 0 };
    const part = fc.integer({ min: 0, max: FILES.length - 1 });
    await fc.assert(
      fc.asyncProperty(part, fc.array(change, { minLength: 1, maxLength: 3 }), async (index, each) => {
        const files = FILES.map(([name, file], i) => {
          const content = Buffer.from(typeof file === 'string' ? file : file.content);
          return [name, { content: i === index ? each.reduce(mutated, content) : content }] as const;
        });
        counts[await outcome(zipOf(files))] += 1;
      }),
      { numRuns: runs(200), seed: 20260302 },
    );
    expect(Math.min(counts.read, counts.refused)).toBeGreaterThan(10);
  });
});
