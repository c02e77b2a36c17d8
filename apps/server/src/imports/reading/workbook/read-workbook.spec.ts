import ExcelJS from 'exceljs';
import { PassThrough } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { describe, expect, it } from 'vitest';
import { isWorkbook, readWorkbook, type SheetReading } from './index.ts';
import { rowOf, stylesOf, workbookFiles, workbookOf, type WorkbookPieces } from './testing/workbook-files.ts';
import { zipOf } from './testing/zip-builder.ts';

async function sheetsOf(pieces: WorkbookPieces): Promise<readonly SheetReading[]> {
  return (await readWorkbook(workbookOf(pieces))).sheets;
}

async function firstRow(pieces: WorkbookPieces): Promise<readonly string[]> {
  return (await sheetsOf(pieces))[0].grid.rows[0].cells;
}

describe('cells', () => {
  it('show numbers, truth values, errors and texts as a person sees them', async () => {
    const cells = await firstRow({
      sheets: [
        rowOf(
          '<c r="A1"><v>0.30000000000000004</v></c><c r="B1" t="b"><v>1</v></c><c r="C1" t="b"><v>0</v></c>' +
            '<c r="D1" t="e"><v>#REF!</v></c><c r="E1" t="s"><v>1</v></c><c r="F1" t="str"><v>made</v></c>' +
            '<c r="G1" t="inlineStr"><is><t>in line</t></is></c><c r="H1" t="d"><v>2026-03-01T14:30:00</v></c>' +
            '<c r="I1" t="n"><v>1.5E-2</v></c><c r="J1"><v> </v></c><c r="K1" t="b"><v>false</v></c>',
        ),
      ],
      strings: '<si><t>nought</t></si><si><t>one</t></si>',
    });
    expect(cells).toEqual([
      '0.3',
      'TRUE',
      'FALSE',
      '#REF!',
      'one',
      'made',
      'in line',
      '2026-03-01 14:30',
      '0.015',
      '',
      'FALSE',
    ]);
  });

  it('join rich text and leave out the readings beside it', async () => {
    const rich = '<r><t>Grease </t></r><r><rPr><b/></rPr><t xml:space="preserve"> point</t></r>';
    const reading = '<rPh sb="0" eb="1"><t>READING</t></rPh><phoneticPr fontId="1"/>';
    const sheet = rowOf(`<c r="A1" t="s"><v>0</v></c><c r="B1" t="inlineStr"><is>${rich}${reading}</is></c>`);
    const cells = await firstRow({ sheets: [sheet], strings: `<si>${rich}${reading}</si>` });
    expect(cells).toEqual(['Grease  point', 'Grease  point']);
  });

  it('keep outer blanks and line ends, and read escapes back', async () => {
    const texts = [
      '  two  ',
      'a_x000D_b',
      'a&#10;b',
      '_x005F_x000D_',
      'bell_x0007_',
      '_xD83D_',
      '<![CDATA[<b>]]>',
      '&amp;amp;',
    ];
    const cells = texts.map((text) => `<c t="inlineStr"><is><t xml:space="preserve">${text}</t></is></c>`).join('');
    expect(await firstRow({ sheets: [rowOf(cells)] })).toEqual([
      ...['  two  ', 'a\rb', 'a\nb', '_x000D_', 'bell', '_xD83D_', '<b>', '&amp;'],
    ]);
  });

  it('take dates, times and percentages from the number format, written out or built in', async () => {
    const styles = stylesOf(['yyyy-mm-dd', '0.0%', '"GC1-L"00', '"-W"@']).replace(
      '</cellXfs>',
      '<xf numFmtId="22"/></cellXfs>',
    );
    const sheet = rowOf(
      '<c r="A1" s="1"><v>46082</v></c><c r="B1" s="2"><v>0.125</v></c><c r="C1" s="3"><v>7</v></c>' +
        '<c r="D1" s="4" t="inlineStr"><is><t>11</t></is></c><c r="E1" s="5"><v>46082.604166666664</v></c><c r="F1" s="99"><v>5</v></c>',
    );
    const shown = ['2026-03-01', '12.5%', 'GC1-L07', '-W11', '2026-03-01 14:30', '5'];
    expect(await firstRow({ sheets: [sheet], styles })).toEqual(shown);
    const from1904 = await firstRow({ sheets: [sheet], styles, workbook: '<workbookPr date1904="1"/>' });
    expect(from1904[0]).toBe('2030-03-02');
  });

  it('take a formula by its stored result and count those that have none', async () => {
    const sheet = rowOf(
      '<c r="A1"><f>1+1</f><v>2</v></c><c r="B1" t="str"><f>A1&amp;""</f><v></v></c>' +
        '<c r="C1"><f>SUM(A1)</f></c><c r="D1"><f>A1</f><v/></c><c r="E1" t="e"><f>1/0</f><v>#DIV/0!</v></c>',
    );
    const [{ grid, formulasWithoutValue }] = await sheetsOf({ sheets: [sheet] });
    expect(grid.rows[0].cells).toEqual(['2', '', '', '', '#DIV/0!']);
    expect(formulasWithoutValue).toBe(2);
  });
});

describe('sheets', () => {
  it('come in the order of their tabs with their state, wherever their parts are', async () => {
    const files = workbookFiles({
      sheets: [rowOf('<c><v>1</v></c>'), rowOf('<c><v>2</v></c>'), ''],
      state: ['', 'state="hidden"', 'state="veryHidden"'],
    });
    const swapped = files.map(([name, file]) => {
      if (name !== 'xl/_rels/workbook.xml.rels' || typeof file !== 'string') return [name, file] as const;
      return [name, file.replace('s1.xml', 'S9.xml').replace('s2.xml', 's1.xml').replace('S9.xml', 'S2.xml')] as const;
    });
    const { sheets } = await readWorkbook(zipOf(swapped));
    expect(sheets.map(({ name, hidden, grid }) => [name, hidden, grid.rows[0]?.cells])).toEqual([
      ['Sheet 1', false, ['2']],
      ['Sheet 2', true, ['1']],
      ['Sheet 3', true, undefined],
    ]);
  });

  it('have every row to the last with content, each padded to the widest', async () => {
    const sheet =
      '<sheetData><row r="2"><c r="B2"><v>1</v></c></row><row><c><v>3</v></c></row>' +
      '<row r="5"><c r="D5" t="inlineStr"><is><t> </t></is></c><c r="A5"><v>5</v></c></row>' +
      '<row r="9"><c r="A9" s="1"/><c r="B9" t="inlineStr"><is><t>  </t></is></c></row></sheetData>';
    const [{ grid }] = await sheetsOf({ sheets: [sheet] });
    expect(grid.rows).toEqual([
      { number: 1, line: 1, cells: ['', '', '', ''] },
      { number: 2, line: 2, cells: ['', '1', '', ''] },
      { number: 3, line: 3, cells: ['3', '', '', ''] },
      { number: 4, line: 4, cells: ['', '', '', ''] },
      { number: 5, line: 5, cells: ['5', '', '', ' '] },
    ]);
  });

  it('say which cells are merged', async () => {
    const merges = '<mergeCells count="2"><mergeCell ref="A1:C2"/><mergeCell ref="AA3:AB3"/></mergeCells>';
    const [sheet] = await sheetsOf({ sheets: [`${rowOf('<c><v>1</v></c>')}${merges}`] });
    expect(sheet.merges).toEqual([
      { top: 1, left: 0, bottom: 2, right: 2 },
      { top: 3, left: 26, bottom: 3, right: 27 },
    ]);
  });

  it('read the same under the strict namespaces and any prefix', async () => {
    const strict = 'http://purl.oclc.org/ooxml/spreadsheetml/main';
    const content = `<x:worksheet xmlns:x="${strict}"><x:sheetData><x:row r="1"><x:c r="A1" t="inlineStr"><x:is><x:t>tag</x:t></x:is></x:c></x:row></x:sheetData></x:worksheet>`;
    expect(await firstRow({ sheets: [{ content }] })).toEqual(['tag']);
    const files = workbookFiles({ sheets: [rowOf('<c><v>1</v></c>')] }).map(([name, file]) => {
      const text = typeof file === 'string' ? file : '';
      return [
        name,
        text.replaceAll(
          'schemas.openxmlformats.org/officeDocument/2006/relationships',
          'purl.oclc.org/ooxml/officeDocument/relationships',
        ),
      ] as const;
    });
    expect((await readWorkbook(zipOf(files))).sheets[0].grid.rows[0].cells).toEqual(['1']);
  });

  it('are read from UTF-16, stored parts and 64-bit sizes too', async () => {
    const xml = `<worksheet>${rowOf('<c t="inlineStr"><is><t>Größe µ</t></is></c>')}</worksheet>`;
    const content = Buffer.from(`\ufeff${xml}`, 'utf16le');
    for (const how of [{}, { stored: true }, { wide: true }])
      expect(await firstRow({ sheets: [{ content, ...how }] })).toEqual(['Größe µ']);
  });
});

describe('a written workbook', () => {
  it('reads as its writer meant it', async () => {
    const sink = new PassThrough();
    const writer = new ExcelJS.stream.xlsx.WorkbookWriter({ stream: sink, useStyles: true, useSharedStrings: true });
    const sheet = writer.addWorksheet('List');
    sheet.addRow(['Tag', 'Date', 'Share', 'Note', 'Link', 'Sum']).commit();
    const row = sheet.addRow([
      'GC1-L01',
      new Date(Date.UTC(2026, 2, 1, 14, 30)),
      0.25,
      { richText: [{ text: 'two ' }, { text: 'parts', font: { bold: true } }] },
      { text: 'shown', hyperlink: 'https://terminal.example/' },
      { formula: 'C2*2', result: 0.5 },
    ]);
    row.getCell(2).numFmt = 'dd.mm.yyyy hh:mm';
    row.getCell(3).numFmt = '0%';
    row.commit();
    await Promise.all([
      writer.commit(),
      buffer(sink).then(async (bytes) => {
        const { sheets } = await readWorkbook(bytes);
        expect(sheets.map(({ grid }) => grid.rows.at(-1)?.cells)).toEqual([
          ['GC1-L01', '2026-03-01 14:30', '25%', 'two parts', 'shown', '0.5'],
        ]);
      }),
    ]);
  });

  it('tells how far reading has come', async () => {
    const rows = Array.from({ length: 12_000 }, (_, i) => `<row><c t="inlineStr"><is><t>GC1-L${i}</t></is></c></row>`);
    const told: (readonly [number, number | null])[] = [];
    await readWorkbook(workbookOf({ sheets: [`<sheetData>${rows.join('')}</sheetData>`] }), {
      onProgress: (done, total) => told.push([done, total]),
    });
    expect(told.length).toBeGreaterThan(5);
    expect(told.at(-1)).toEqual([12_000, 12_000]);
    for (const [done, total] of told) {
      expect(total).toBeGreaterThanOrEqual(done);
      expect(total).toBeLessThan(13_500);
    }
  });
});

describe('isWorkbook', () => {
  it('goes by the content', () => {
    expect(isWorkbook(workbookOf({}))).toBe(true);
    expect(isWorkbook(Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1))).toBe(true);
    expect(isWorkbook(Buffer.from('Tag,Text\nPK,x\n'))).toBe(false);
    expect(isWorkbook(new Uint8Array())).toBe(false);
  });
});
