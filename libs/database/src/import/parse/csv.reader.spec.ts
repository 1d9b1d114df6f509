import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readAll } from './testing/read-all.js';
import { zipBytes } from './testing/workbook-bytes.js';
import { UnreadableFile } from './unreadable-file.js';

const HEADER = 'fund,as_of,unit_price';

const rowsOf = async (file: string | Uint8Array, pieceBytes?: number) =>
  (await readAll(file, 'prices', pieceBytes)).rows.map(({ line, values }) => [
    line,
    values['fund'],
    values['as_of'],
    values['unit_price'],
  ]);

const refusal = async (file: string | Uint8Array, pieceBytes?: number) => {
  const error: unknown = await readAll(file, 'prices', pieceBytes).catch((caught: unknown) => caught);
  if (!(error instanceof UnreadableFile)) throw new Error(`not refused: ${JSON.stringify(error)}`);
  return { code: error.code, detail: error.detail, line: error.line };
};

describe('files that can be read', () => {
  const expected = [
    [2, 'larch', '2026-09-30', '12.5'],
    [3, 'alder', '2026-09-30', '7'],
  ];

  it.each([
    ['commas and line feeds', `${HEADER}\nlarch,2026-09-30,12.5\nalder,2026-09-30,7\n`],
    ['carriage returns too', `${HEADER}\r\nlarch,2026-09-30,12.5\r\nalder,2026-09-30,7\r\n`],
    ['carriage returns alone', `${HEADER}\rlarch,2026-09-30,12.5\ralder,2026-09-30,7\r`],
    ['no line end at the end', `${HEADER}\nlarch,2026-09-30,12.5\nalder,2026-09-30,7`],
    ['blank lines at the end', `${HEADER}\nlarch,2026-09-30,12.5\nalder,2026-09-30,7\n\n \n,,\n`],
    ['semicolons', `fund;as_of;unit_price\nlarch;2026-09-30;12.5\nalder;2026-09-30;7\n`],
    ['blanks around values', ` fund , AS_OF,Unit_Price\n larch ,2026-09-30 , 12.5\nalder, "2026-09-30" ,7\n`],
    ['quotes', `"fund","as_of","unit_price"\n"larch","2026-09-30","12.5"\nalder,"2026-09-30",7\n`],
    ['other columns', `note,as_of,unit_price,fund\n"a, b",2026-09-30,12.5,larch\nx,2026-09-30,7,alder\n`],
  ])('%s', async (_, file) => {
    expect(await rowsOf(file)).toEqual(expected);
    // cut at every byte, so that every character and every quote once stands at the edge of a piece
    expect(await rowsOf(file, 1)).toEqual(expected);
  });

  it('keeps separators, doubled quotes and line breaks within quotes, and counts lines by the file', async () => {
    const file = `${HEADER}\n\n"la""rch,\r\nsecond\nthird",2026-09-30,1\nplain,2026-09-30,2\n"x\ny",2026-09-30,3\n\nlast,2026-09-30,4`;
    const expectedRows = [
      [3, 'la"rch,\r\nsecond\nthird', '2026-09-30', '1'],
      [6, 'plain', '2026-09-30', '2'],
      [7, 'x\ny', '2026-09-30', '3'],
      [10, 'last', '2026-09-30', '4'],
    ];
    expect(await rowsOf(file)).toEqual(expectedRows);
    expect(await rowsOf(file, 1)).toEqual(expectedRows);
    expect(await rowsOf(file, 7)).toEqual(expectedRows);
  });

  it('removes a byte order mark, tells of it, of semicolons and of columns that it ignores', async () => {
    const file = '\ufefffund;Remark;as_of;unit_price;\nlarch;é;2026-09-30;1;\n';
    const { rows, notices, bytesRead } = await readAll(file, 'prices', 2);
    expect(rows).toEqual([
      {
        line: 2,
        values: { fund: 'larch', as_of: '2026-09-30', unit_price: '1', income_per_unit: '', split_factor: '' },
      },
    ]);
    expect(notices).toEqual([
      { code: 'byte-order-mark-removed', value: '' },
      { code: 'semicolon-separated', value: '' },
      { code: 'extra-column-ignored', value: 'Remark' },
    ]);
    expect(bytesRead).toBe(Buffer.byteLength(file));
  });

  it('gives the rows with another number of values than the header as errors and the others as rows', async () => {
    const file = `${HEADER}\nlarch,2026-09-30\nalder,2026-09-30,7\nelm,2026-09-30,7,8\n`;
    const { rows, errors } = await readAll(file, 'prices');
    expect(rows.map(({ line }) => line)).toEqual([3]);
    expect(errors).toEqual([
      expect.objectContaining({
        line: 2,
        code: 'column-count',
        value: 'larch | 2026-09-30',
        reason: 'The row has 2 values; the header has 3 columns.',
      }),
      expect.objectContaining({ line: 4, code: 'column-count' }),
    ]);
  });
});

describe('files that are refused as a whole', () => {
  it('names the columns that are missing, and what one may have been called instead', async () => {
    expect(await refusal('fund,Unit Price,date\nlarch,1,2026-09-30\n')).toEqual({
      code: 'import-columns-missing',
      detail:
        'The header row of a prices file needs as_of, unit_price, which are not there. “Unit Price” may have to be called unit_price.',
      line: 1,
    });
    expect((await refusal('fund\tas_of\tunit_price\nlarch\t2026-09-30\t1\n')).detail).toMatch(/separated by tabs/);
  });

  it('a column that stands twice', async () => {
    expect(await refusal('fund,as_of,FUND,unit_price\n')).toEqual({
      code: 'import-malformed-csv',
      detail: 'The header row names the column fund twice.',
      line: 1,
    });
  });

  it.each([
    ['nothing', ''],
    ['blanks only', '\n \n\r\n'],
    ['a header row only', `${HEADER}\n`],
    ['a header row and blank rows', `${HEADER}\n,,\n\n`],
    ['a byte order mark only', '\ufeff'],
  ])('%s', async (_, file) => {
    expect((await refusal(file)).code).toBe('import-empty');
  });

  it.each([
    ['a PDF document', Buffer.from('%PDF-1.7 and so on')],
    ['a gzip archive', gzipSync(HEADER)],
    ['a PNG picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a])],
    ['a JPEG picture', Buffer.from([0xff, 0xd8, 0xff, 0xe0])],
    ['an old Excel workbook', Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1])],
    ['text in UTF-16, not UTF-8', Buffer.from(`\ufeff${HEADER}`, 'utf16le')],
    ['a web page', Buffer.from('\n<!DOCTYPE html><html><body>Sign in</body></html>')],
  ])('%s', async (what, bytes) => {
    for (const pieceBytes of [1, 4096]) {
      const { code, detail } = await refusal(bytes, pieceBytes);
      expect(code).toBe('import-not-text');
      expect(detail).toContain(`“upload” looks like ${what}`);
    }
  });

  it('a ZIP archive that is no workbook', async () => {
    expect(await refusal(zipBytes({ 'prices.csv': HEADER }))).toMatchObject({
      code: 'import-not-text',
      detail: '“upload” is a ZIP archive, but not an Excel workbook (.xlsx).',
    });
  });

  it.each([1, 5, 4096])('characters that are not UTF-8, with the line (pieces of %i bytes)', async (pieceBytes) => {
    const file = Buffer.concat([
      Buffer.from(`${HEADER}\nlarch,2026-09-30,1\nb`),
      Buffer.from([0xe9]),
      Buffer.from('che,2026-09-30,1\n'),
    ]);
    expect(await refusal(file, pieceBytes)).toEqual({
      code: 'import-not-text',
      detail: 'Line 3 holds characters that are not UTF-8.',
      line: 3,
    });
  });

  it.each([1, 4096])('a character cut off by the end of the file (pieces of %i bytes)', async (pieceBytes) => {
    const file = Buffer.from(`${HEADER}\nlarch,2026-09-30,é`).subarray(0, -1);
    expect(await refusal(file, pieceBytes)).toMatchObject({ code: 'import-not-text', line: 2 });
  });

  it('zero bytes, with the line', async () => {
    expect(await refusal(`${HEADER}\nlarch,2026-09-30,1\nal\u0000der,2026-09-30,1\n`)).toMatchObject({
      code: 'import-not-text',
      line: 3,
    });
  });

  it('a quote that is never closed, with the line of its row', async () => {
    const rows = Array.from({ length: 200 }, (_, index) => `f${index},2026-09-30,1\n`).join('');
    const file = `${HEADER}\n\nlarch,2026-09-30,1\n"alder,2026-09-30,1\n${rows}`;
    for (const pieceBytes of [1, 50, 4096]) {
      expect(await refusal(file, pieceBytes)).toEqual({
        code: 'import-malformed-csv',
        detail: 'A quote that opens in the row at line 4 is never closed.',
        line: 4,
      });
    }
  });

  it('a quote that is never closed in a large file, without holding the rest of it', async () => {
    let served = 0;
    const { readCsv } = await import('./csv.reader.js');
    const piece = Buffer.from('f,2026-09-30,1\n'.repeat(4000));
    function* endless() {
      yield Buffer.from(`${HEADER}\nlarch,2026-09-30,1\n"alder,2026-09-30,1\n`);
      for (;;) {
        served += piece.length;
        yield piece;
      }
    }
    const reading = (async () => {
      for await (const batch of readCsv(endless(), { kind: 'prices', name: 'upload' })) void batch;
    })();
    await expect(reading).rejects.toMatchObject({ code: 'import-malformed-csv', line: 3 });
    expect(served).toBeLessThan(2 * 1024 * 1024);
  });

  it.each([
    ['a quote within a value', `${HEADER}\nlarch,2026-09-30,1\n5" pipe,2026-09-30,"1"\n`],
    ['text behind a closing quote', `${HEADER}\nlarch,2026-09-30,1\n"al"der,2026-09-30,1\n`],
  ])('%s, with the line', async (_, file) => {
    expect(await refusal(file)).toMatchObject({
      code: 'import-malformed-csv',
      detail: expect.stringMatching(/^The row at line 3 has a quote in the wrong place/),
      line: 3,
    });
  });

  it('a file without any line end', async () => {
    expect(await refusal('x'.repeat(3 * 1024 * 1024))).toMatchObject({ code: 'import-malformed-csv', line: 1 });
  });
});
