import fc from 'fast-check';
import { Archive } from '../../apps/server/src/imports/reading/workbook/archive.ts';
import { zipOf } from '../../apps/server/src/imports/reading/workbook/testing/zip-builder.ts';
import { tagListBytes } from './brackwater-setup.ts';
import { mutated, type Mutation } from './mutations.ts';

const CSVS = ['brackwater-points.csv', 'brackwater-points-semicolon-1252.csv', 'brackwater-faults.csv', 'designations.csv'];
const WORKBOOK = 'brackwater-signals.xlsx';

/** A file and how it was made. */
export interface MutatedFile {
  readonly name: string;
  readonly bytes: Buffer;
}

const change: fc.Arbitrary<Mutation> = fc.record({
  kind: fc.constantFrom('flip', 'overwrite', 'cut', 'remove', 'insert', 'repeat', 'splice'),
  millionths: fc.noBias(fc.nat(999_999)),
  length: fc.oneof(fc.integer({ min: 1, max: 40 }), fc.integer({ min: 100, max: 5000 })),
  filler: fc.constantFrom('"', '""', ',', ';', '\n', '\r\n', '\0', '\ufeff', '=1+1', "'", '%QX4.0', '1e309', '-0', 'n/a', '\u00a0', '\ud83d\ude00', '<v>', '</row>', '&lol;', '<!DOCTYPE x>', 'GC1-L01'),
}).map((each) => ({ ...each, bit: each.length % 8 }));

const mutation = fc.record({ csv: fc.boolean(), which: fc.nat(CSVS.length - 1), inside: fc.boolean(), part: fc.noBias(fc.nat(999)), changes: fc.array(change, { minLength: 1, maxLength: 4 }) });

/** As many broken files as wanted, always the same for the same seed: lists and workbooks, half of the latter broken inside their parts. */
export async function* mutatedFiles(count: number, seed: number): AsyncGenerator<MutatedFile> {
  const parts = await partsOf(tagListBytes(WORKBOOK));
  for (const { csv, which, inside, part, changes } of fc.sample(mutation, { numRuns: count, seed })) {
    if (csv) yield { name: CSVS[which], bytes: changes.reduce(mutated, tagListBytes(CSVS[which])) };
    else if (!inside) yield { name: WORKBOOK, bytes: changes.reduce(mutated, tagListBytes(WORKBOOK)) };
    else {
      const at = part % parts.length;
      yield { name: `${parts[at][0]} of ${WORKBOOK}`, bytes: zipOf(parts.map(([name, text], i) => [name, i === at ? changes.reduce(mutated, Buffer.from(text)).toString() : text] as const)) };
    }
  }
}

async function partsOf(bytes: Buffer): Promise<[string, string][]> {
  const archive = new Archive(bytes);
  const parts: [string, string][] = [];
  for (const name of archive.names()) {
    let text = '';
    for await (const piece of archive.textOf(name)) text += piece;
    parts.push([name, text]);
  }
  return parts;
}
