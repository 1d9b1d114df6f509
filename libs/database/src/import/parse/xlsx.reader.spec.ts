import { describe, expect, it } from 'vitest';
import { readAll } from './testing/read-all.js';
import { workbookBytes, type WorkbookParts } from './testing/workbook-bytes.js';
import { UnreadableFile } from './unreadable-file.js';
import { LARGEST_WORKBOOK_BYTES, readXlsx } from './xlsx.reader.js';
import { plainDecimal } from './xlsx-cells.js';

const text = (value: string) => `<c t="inlineStr"><is><t>${value}</t></is></c>`;
const number = (value: string, style = 0) => `<c s="${style}"><v>${value}</v></c>`;
const row = (...cells: string[]) => `<row>${cells.join('')}</row>`;
const HEADER = row(...['participant_number', 'as_of', 'source', 'fund', 'balance'].map(text));

const read = async (parts: WorkbookParts) => (await readAll(workbookBytes(parts), 'balances')).rows;

const refusal = async (file: Uint8Array) => {
  const error: unknown = await readAll(file, 'balances').catch((caught: unknown) => caught);
  if (!(error instanceof UnreadableFile)) throw new Error(`not refused: ${String(error)}`);
  return error;
};

describe('an XLSX workbook', () => {
  it('gives what a CSV file would: ISO dates, leading zeros, plain decimals', async () => {
    const rows = await read({
      sharedStrings:
        '<si><t>00417</t></si><si><r><t>lar</t></r><r><t xml:space="preserve">ch</t></r><rPh><t>x</t></rPh></si>',
      formats: { 164: 'yyyy\\-mm\\-dd', 165: '00000', 166: '"day" 0.00', 167: '[Red]#,##0.00' },
      cellStyles: [0, 14, 164, 165, 166, 167],
      sheetData:
        HEADER +
        row(
          '<c t="s"><v>0</v></c>',
          number('46295', 1),
          text('pretax'),
          '<c t="s"><v>1</v></c>',
          number('1250.4000000000001'),
        ) +
        row(number('418', 3), number('46295', 2), text('pre &amp; post'), text('a_x0041_'), number('12', 4)) +
        row(number('419'), text('2026-09-30'), text('pretax'), text('larch'), number('-0.07', 5)),
    });
    expect(rows.map(({ line, values }) => [line, ...Object.values(values)])).toEqual([
      [2, '00417', '2026-09-30', 'pretax', 'larch', '1250.4', ''],
      [3, '00418', '2026-09-30', 'pre & post', 'aA', '12', ''],
      [4, '419', '2026-09-30', 'pretax', 'larch', '-0.07', ''],
    ]);
  });

  it('places cells by their references, takes gaps as empty, and counts lines as the sheet does', async () => {
    const sheetData =
      '<row r="2">' +
      ['participant_number', 'as_of', 'source', 'fund', 'balance', 'earnings']
        .map((name, index) => `<c r="${'ABCDEF'[index]}2" t="inlineStr"><is><t>${name}</t></is></c>`)
        .join('') +
      '</row><row r="5"><c r="A5" t="str"><f>T(1)</f><v>7</v></c><c r="D5" t="inlineStr"><is><t>larch</t></is></c><c r="H5"/></row>' +
      '<row r="6"><c r="A6" s="1"/></row>';
    expect(await read({ sheetData })).toEqual([
      {
        line: 5,
        values: { participant_number: '7', as_of: '', source: '', fund: 'larch', balance: '', earnings: '' },
      },
    ]);
  });

  it('counts days from 1904 where the workbook says so, and leaves a time of day to be refused', async () => {
    const asOf = async (serial: string, workbookProperties = '') => {
      const sheetData = HEADER + row(text('1'), number(serial, 1), text('s'), text('f'), number('1'));
      return (await read({ sheetData, cellStyles: [0, 14], workbookProperties }))[0]?.values['as_of'];
    };
    expect(await asOf('44833', '<workbookPr date1904="1"/>')).toBe('2026-09-30');
    expect(await asOf('46295.5')).toBe('2026-09-30T12:00');
    expect(await asOf('59')).toBe('1900-02-28');
    expect(await asOf('61')).toBe('1900-03-01');
  });

  it('reports a row with values beyond the header, and keeps an error value to be refused', async () => {
    const cells = [text('1'), text('2026-09-30'), text('s'), text('f'), '<c t="e"><v>#REF!</v></c>'];
    const { rows, errors } = await readAll(
      workbookBytes({ sheetData: HEADER + row(...cells) + row(...cells, text('more')) }),
      'balances',
    );
    expect(rows[0]?.values['balance']).toBe('#REF!');
    expect(errors).toEqual([expect.objectContaining({ line: 3, code: 'column-count' })]);
  });

  it('is refused when columns are missing, when it is empty and when it is damaged', async () => {
    expect(await refusal(workbookBytes({ sheetData: row(text('fund')) }))).toMatchObject({
      code: 'import-columns-missing',
      line: 1,
    });
    expect((await refusal(workbookBytes({ sheetData: '' }))).code).toBe('import-empty');
    expect((await refusal(workbookBytes({ sheetData: HEADER }))).detail).toBe(
      'The first sheet of “upload” has a header row and nothing below it.',
    );
    const good = workbookBytes({ sheetData: HEADER });
    for (const bytes of [good.subarray(0, -40), workbookBytes({ sheetData: '<row><c></row>' })]) {
      expect(await refusal(bytes)).toMatchObject({
        code: 'import-not-text',
        detail: '“upload” cannot be opened as an Excel workbook; it is damaged.',
      });
    }
  });

  it('is refused above 50 MB', async () => {
    const megabyte = Buffer.alloc(1024 * 1024);
    const pieces = Array.from({ length: LARGEST_WORKBOOK_BYTES / megabyte.length + 1 }, () => megabyte);
    await expect(readXlsx(pieces, { kind: 'balances', name: 'it' }).next()).rejects.toMatchObject({
      code: 'import-too-large',
    });
  });
});

it.each([
  [0.1 + 0.2, '0.3'],
  [-0, '0'],
  [1e-7, '0.0000001'],
  [1.5e-8, '0.000000015'],
  [123456789012345, '123456789012345'],
  [1.2e21, '1200000000000000000000'],
  [-1234.5, '-1234.5'],
])('%d is %s in plain decimals', (value, expected) => {
  expect(plainDecimal(value)).toBe(expected);
});
