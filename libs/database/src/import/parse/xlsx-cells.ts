/** What a cell's number format says about what its number means. */
export interface CellStyle {
  readonly isDate: boolean;
  /** Shown with leading zeros up to this many digits; 0 for none. */
  readonly digits: number;
}

/** Formats that workbooks use without spelling them out and that show a day or a time (ECMA-376, part 1, 18.8.30). */
const isBuiltInDate = (id: number): boolean =>
  (id >= 14 && id <= 22) || (id >= 27 && id <= 36) || (id >= 45 && id <= 47) || (id >= 50 && id <= 58);

export function styleOf(id: number, format: string | undefined): CellStyle {
  if (format === undefined) return { isDate: isBuiltInDate(id), digits: 0 };
  const bare = format.replace(/"[^"]*"|\\.|_.|\*.|\[[^\]]*\]/g, '');
  return { isDate: /[dmyhs]/i.test(bare.replace(/general/gi, '')), digits: /^0{2,}$/.test(format) ? format.length : 0 };
}

export interface RawCell {
  /** The type as the cell names it; n when it names none. */
  readonly type: string;
  readonly text: string;
  readonly style: CellStyle | undefined;
}

/** A cell as the same value would stand in a CSV file: dates ISO, numbers in plain decimals, texts as they are. */
export function cellText(cell: RawCell, texts: readonly string[], isFrom1904: boolean): string {
  const { type, text, style } = cell;
  switch (type) {
    case 's':
      return unescaped(texts[Number(text)] ?? '');
    case 'str':
    case 'inlineStr':
      return unescaped(text);
    case 'b':
      return text === '1' ? 'TRUE' : 'FALSE';
    case 'd':
      return text.replace(/T00:00(:00(\.0+)?)?Z?$/, '');
    case 'n':
      return numberText(text, style, isFrom1904);
    // an error such as #REF!, which the rules of rows then refuse with its line
    default:
      return text;
  }
}

function numberText(text: string, style: CellStyle | undefined, isFrom1904: boolean): string {
  const value = Number(text);
  if (text === '' || !Number.isFinite(value)) return text;
  const plain = plainDecimal(value);
  if (style?.isDate && value >= 0) return dateText(value, isFrom1904) ?? plain;
  return style && style.digits > plain.length && /^\d+$/.test(plain) ? plain.padStart(style.digits, '0') : plain;
}

const MILLISECONDS_A_DAY = 86_400_000;

/**
 * A day number as an ISO date; with the time of day behind it where there is one, which no date column takes: the row is refused rather
 * than cut. Day 60 of the 1900 count is 29 February 1900, which never was; days before it are one behind.
 */
function dateText(serial: number, isFrom1904: boolean): string | null {
  const minutes = Math.round((serial % 1) * 1440);
  let day = Math.floor(serial);
  if (isFrom1904) day += 1462;
  if (day === 60 || day > 2_958_465) return null;
  const epoch = Date.UTC(1899, 11, day < 60 ? 31 : 30);
  const iso = new Date(epoch + day * MILLISECONDS_A_DAY + minutes * 60_000).toISOString();
  return iso.slice(11, 16) === '00:00' ? iso.slice(0, 10) : iso.slice(0, 16);
}

/** The number that was typed: workbooks keep 15 digits and write 17, the last of which are noise. */
export function plainDecimal(value: number): string {
  const rounded = Number(value.toPrecision(15));
  const text = String(rounded === 0 ? 0 : rounded);
  const [, sign, first, rest = '', exponent] = /^(-?)(\d)(?:\.(\d+))?e([-+]\d+)$/.exec(text) ?? [];
  if (sign === undefined || first === undefined || exponent === undefined) return text;
  const shift = Number(exponent);
  // exponents appear only above 21 digits and below six decimals, where all digits lie on one side of the point
  return shift < 0 ? `${sign}0.${'0'.repeat(-shift - 1)}${first}${rest}` : `${sign}${first}${rest.padEnd(shift, '0')}`;
}

/** Workbooks write characters that XML cannot hold as _x000D_. Those that no text may hold stay as they are written. */
const unescaped = (text: string): string =>
  text.includes('_x')
    ? text.replace(/_x([0-9A-Fa-f]{4})_/g, (written, code: string) => {
        const unit = parseInt(code, 16);
        return unit >= 0x20 || unit === 0x09 || unit === 0x0a || unit === 0x0d ? String.fromCharCode(unit) : written;
      })
    : text;
