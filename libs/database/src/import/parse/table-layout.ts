import { IMPORT_COLUMNS, type ImportKind, type ImportRowError } from '@quarterpoise/dto';
import { nearMatch, type RawRow, rowError } from '@quarterpoise/rules';
import type { ImportNotice } from './import-batch.js';
import { UnreadableFile } from './unreadable-file.js';

/** Where the columns of a kind of file stand in this file, as its header row says. */
export class TableLayout {
  readonly notices: ImportNotice[] = [];
  private readonly names: string[] = [];
  private readonly positions: number[] = [];
  private readonly absent: string[];
  private readonly width: number;

  /**
   * Capitals and blanks around a name do not matter; another name for a column is not guessed.
   * @throws UnreadableFile naming the missing columns, or one that stands twice.
   */
  constructor(kind: ImportKind, header: readonly string[], line: number) {
    const { required, optional } = IMPORT_COLUMNS[kind];
    const known = [...required, ...optional];
    const found = header.map((name) => name.trim().toLowerCase());
    this.width = header.length;
    found.forEach((name, position) => {
      if (!known.includes(name)) return;
      if (this.names.includes(name)) {
        throw new UnreadableFile('import-malformed-csv', `The header row names the column ${name} twice.`, line);
      }
      this.names.push(name);
      this.positions.push(position);
    });
    this.absent = known.filter((name) => !this.names.includes(name));
    const extra = header.filter((_, position) => found[position] !== '' && !known.includes(found[position]!));
    const missing = required.filter((name) => !this.names.includes(name));
    if (missing.length > 0) {
      throw new UnreadableFile('import-columns-missing', missingSentence(kind, missing, extra, header), line);
    }
    for (const name of extra) this.notices.push({ code: 'extra-column-ignored', value: name.trim().slice(0, 200) });
  }

  /** A row by column names; or the error when it has another number of values than the header. */
  row(line: number, values: readonly string[]): RawRow | ImportRowError {
    if (values.length !== this.width) {
      const place = { line, column: '', value: values.join(' | ') };
      return rowError(place, 'column-count', { expected: this.width, found: values.length });
    }
    const named: Record<string, string> = {};
    for (let index = 0; index < this.names.length; index += 1) {
      named[this.names[index]!] = values[this.positions[index]!]!.trim();
    }
    for (const name of this.absent) named[name] = '';
    return { line, values: named };
  }
}

function missingSentence(
  kind: ImportKind,
  missing: readonly string[],
  extra: readonly string[],
  header: readonly string[],
): string {
  const lacks = `The header row of a ${kind} file needs ${missing.join(', ')}, which ${missing.length > 1 ? 'are' : 'is'} not there.`;
  const renames = extra.flatMap((name) => {
    const near = nearMatch(name, missing);
    return near === null ? [] : [` “${name.trim()}” may have to be called ${near}.`];
  });
  const [only] = header;
  const isOneWithTabs = header.length === 1 && only !== undefined && only.includes('\t');
  return [
    lacks,
    ...renames,
    isOneWithTabs ? ' The values seem to be separated by tabs; use commas or semicolons.' : '',
  ].join('');
}

/** Whether a row holds nothing at all, as spreadsheets like to leave at the end. */
export const isBlank = (values: readonly string[]): boolean => values.every((value) => value.trim() === '');
