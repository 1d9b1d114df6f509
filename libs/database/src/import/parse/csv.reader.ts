import type { ImportRowError } from '@quarterpoise/dto';
import type { RawRow } from '@quarterpoise/rules';
import { contentType, SNIFFED_BYTES } from './content-type.js';
import { csvRows, type Separator, separatorOf } from './csv-rows.js';
import type { ByteSource, ImportBatch, ImportNotice, ReadOptions } from './import-batch.js';
import { isBlank, TableLayout } from './table-layout.js';
import { textBlocks } from './text-blocks.js';
import { UnreadableFile } from './unreadable-file.js';

/**
 * Reads a CSV file (UTF-8, RFC 4180, header row, `,` or `;`) piece by piece: memory does not grow with the file. Rows without any value
 * are passed over; rows with the wrong number of values come as errors of their line.
 * @throws UnreadableFile when the file as a whole is not to be read, at the latest at its end: nothing is final before the last batch.
 */
export async function* readCsv(source: ByteSource, { kind, name }: ReadOptions): AsyncGenerator<ImportBatch> {
  const notices: ImportNotice[] = [];
  let separator: Separator | null = null;
  let layout: TableLayout | null = null;
  let isEmpty = true;
  for await (const block of textBlocks(checked(source, name))) {
    let { text } = block;
    if (block.isFirst && text.startsWith('\ufeff')) {
      text = text.slice(1);
      notices.push({ code: 'byte-order-mark-removed', value: '' });
    }
    if (text.trim() === '') continue;
    separator ??= separatorOf(text);
    const rows: RawRow[] = [];
    const errors: ImportRowError[] = [];
    const fresh: ImportNotice[] = [];
    for (const { line, values } of csvRows({ ...block, text }, separator)) {
      if (isBlank(values)) continue;
      if (layout === null) {
        layout = new TableLayout(kind, values, line);
        if (separator === ';') notices.push({ code: 'semicolon-separated', value: '' });
        fresh.push(...notices, ...layout.notices);
        continue;
      }
      const row = layout.row(line, values);
      if ('values' in row) rows.push(row);
      else errors.push(row);
    }
    if (rows.length > 0 || errors.length > 0) isEmpty = false;
    yield { rows, errors, notices: fresh, bytesRead: block.bytesRead };
  }
  if (isEmpty) throw new UnreadableFile('import-empty', emptySentence(name, layout !== null));
}

const emptySentence = (name: string, hasHeader: boolean) =>
  hasHeader ? `${name} has a header row and nothing below it.` : `There is nothing in ${name}.`;

/** Hands the bytes through once the first of them do not tell that the file is something else. */
async function* checked(source: ByteSource, name: string): AsyncGenerator<Uint8Array> {
  let start: Uint8Array | null = Buffer.alloc(0);
  const verify = (bytes: Uint8Array) => {
    const type = contentType(bytes);
    if (type !== null) throw new UnreadableFile('import-not-text', `${name} looks like ${type}.`);
  };
  for await (const chunk of source) {
    if (start === null) {
      yield chunk;
      continue;
    }
    start = start.length === 0 ? chunk : Buffer.concat([start, chunk]);
    if (start.length < SNIFFED_BYTES) continue;
    verify(start);
    yield start;
    start = null;
  }
  if (start === null || start.length === 0) return;
  verify(start);
  yield start;
}
