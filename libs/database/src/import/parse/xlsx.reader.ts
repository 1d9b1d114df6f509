import type { ImportRowError } from '@quarterpoise/dto';
import type { RawRow } from '@quarterpoise/rules';
import type { CsvRow } from './csv-rows.js';
import type { ByteSource, ImportBatch, ReadOptions } from './import-batch.js';
import { isBlank, TableLayout } from './table-layout.js';
import { openArchive, parsePart, type XlsxArchive } from './xlsx-archive.js';
import { cellText, type CellStyle } from './xlsx-cells.js';
import { readWorkbook, textCollector, type XlsxWorkbook } from './xlsx-workbook.js';
import { UnreadableFile } from './unreadable-file.js';

/** Workbooks are opened from their end and so held in memory; CSV has no such bound. */
export const LARGEST_WORKBOOK_BYTES = 50 * 1024 * 1024;

const LAST_COLUMN = 16_384;
const LAST_ROW = 1_048_576;

/**
 * Reads the first sheet of an XLSX workbook, whose first row that holds anything is the header. The sheet itself is unpacked and parsed
 * piece by piece. Lines are the sheet's own row numbers.
 * @throws UnreadableFile when the workbook as a whole is not to be read, at the latest at its end.
 */
export async function* readXlsx(source: ByteSource, options: ReadOptions): AsyncGenerator<ImportBatch> {
  const bytes = await collect(source, options.name);
  try {
    const archive = await openArchive(bytes);
    const workbook = await readWorkbook(archive);
    if (workbook === null) {
      throw new UnreadableFile(
        'import-not-text',
        `${options.name} is a ZIP archive, but not an Excel workbook (.xlsx).`,
      );
    }
    yield* batches(archive, workbook, options, bytes.length);
  } catch (error) {
    if (error instanceof UnreadableFile) throw error;
    const detail = `${options.name} cannot be opened as an Excel workbook; it is damaged.`;
    throw new UnreadableFile('import-not-text', detail, null, { cause: error });
  }
}

async function collect(source: ByteSource, name: string): Promise<Buffer> {
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of source) {
    size += chunk.length;
    if (size > LARGEST_WORKBOOK_BYTES) {
      throw new UnreadableFile('import-too-large', `${name} is an Excel workbook of more than 50 MB.`);
    }
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

async function* batches(
  archive: XlsxArchive,
  workbook: XlsxWorkbook,
  { kind, name }: ReadOptions,
  size: number,
): AsyncGenerator<ImportBatch> {
  let layout: TableLayout | null = null;
  let width = 0;
  let isEmpty = true;
  for await (const { share, sheetRows } of sheetPieces(archive, workbook)) {
    const rows: RawRow[] = [];
    const errors: ImportRowError[] = [];
    let isHeaderHere = false;
    for (const { line, values } of sheetRows) {
      if (layout === null) {
        layout = new TableLayout(kind, values, line);
        width = values.length;
        isHeaderHere = true;
        continue;
      }
      while (values.length < width) values.push('');
      const row = layout.row(line, values);
      if ('values' in row) rows.push(row);
      else errors.push(row);
    }
    if (sheetRows.length === 0) continue;
    if (rows.length > 0 || errors.length > 0) isEmpty = false;
    yield { rows, errors, notices: isHeaderHere ? layout!.notices : [], bytesRead: Math.floor(share * size) };
  }
  if (isEmpty) {
    const what = layout === null ? 'holds nothing' : 'has a header row and nothing below it';
    throw new UnreadableFile('import-empty', `The first sheet of ${name} ${what}.`);
  }
}

/** The rows of the sheet as they are parsed, without blank cells at their ends and without blank rows. */
async function* sheetPieces(
  archive: XlsxArchive,
  { sheetPath, texts, styles, isFrom1904 }: XlsxWorkbook,
): AsyncGenerator<{ share: number; sheetRows: CsvRow[] }> {
  let sheetRows: CsvRow[] = [];
  let line = 0;
  let values: string[] = [];
  let column = -1;
  let type = 'n';
  let style: CellStyle | undefined;
  let text = '';
  let isValue = false;
  const inside = textCollector((part) => (text += part));
  const pieces = parsePart(archive, sheetPath, {
    open(name, { r, t, s }) {
      if (name === 'row') {
        line = placeWithin(r === undefined ? line + 1 : Number(r), LAST_ROW);
        values = [];
        column = -1;
      } else if (name === 'c') {
        column = placeWithin(r === undefined ? column + 1 : columnOf(r), LAST_COLUMN);
        type = t ?? 'n';
        style = s === undefined ? undefined : styles[Number(s)];
        text = '';
      }
      isValue = name === 'v';
      inside.open(name, {});
    },
    text(part) {
      if (isValue) text += part;
      else inside.text(part);
    },
    close(name) {
      isValue = false;
      inside.close(name);
      if (name === 'c' && text !== '') {
        while (values.length < column) values.push('');
        values[column] = cellText({ type, text, style }, texts, isFrom1904);
      } else if (name === 'row' && !isBlank(values)) {
        while (values.at(-1)?.trim() === '') values.pop();
        sheetRows.push({ line, values });
      }
    },
  });
  for await (const share of pieces) {
    yield { share, sheetRows };
    sheetRows = [];
  }
  if (sheetRows.length > 0) yield { share: 1, sheetRows };
}

/** `AB12` → 27. */
function columnOf(reference: string): number {
  let column = 0;
  for (const letter of /^[A-Z]+/.exec(reference)?.[0] ?? '') column = column * 26 + letter.charCodeAt(0) - 64;
  return column - 1;
}

function placeWithin(place: number, last: number): number {
  if (Number.isInteger(place) && place >= 0 && place <= last) return place;
  throw new Error('The sheet names a place that no sheet has');
}
