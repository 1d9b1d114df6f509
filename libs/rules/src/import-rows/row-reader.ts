import { type CivilDate, type ImportRowError, parseAmount } from '@quarterpoise/dto';
import { dayNumber, isoDate } from '@quarterpoise/returns';
import { nearMatch } from './near-match.js';
import { type AmountFault, rowError, type RowErrorCode } from './row-error.js';

/** A row of a file: the line it starts on and its values by column, blanks around them removed; an absent column counts as empty. */
export interface RawRow {
  readonly line: number;
  readonly values: Readonly<Record<string, string>>;
}

/** What the rules of rows need to know beside the row. */
export interface RowContext {
  readonly today: CivilDate;
  /** First day that the plan's records cover. */
  readonly recordsBeginOn: CivilDate;
  /** The eve of it, whose balances are the opening ones. */
  readonly recordsEve: CivilDate;
}

export function rowContextOf(today: CivilDate, recordsBeginOn: CivilDate): RowContext {
  return { today, recordsBeginOn, recordsEve: isoDate(dayNumber(recordsBeginOn) - 1) };
}

const DAYS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;
const DATE = /^(\d{4})-(\d{2})-(\d{2})$/;
const EMAIL = /^[^\s@"<>,;:]+@[^\s@"<>,;:]+\.[^\s@"<>,;:.]+$/;

/**
 * Reads the values of one row and keeps every fault it meets, so that one upload tells all that is wrong. A faulty value reads as null;
 * what is returned must only be used when there is no error.
 */
export class RowReader {
  readonly errors: ImportRowError[] = [];

  constructor(
    private readonly row: RawRow,
    private readonly context: RowContext,
  ) {}

  /** Whether the column holds anything. */
  has(column: string): boolean {
    return this.raw(column) !== '';
  }

  text(column: string, limit: number): string {
    const value = this.raw(column);
    if (value === '') this.errors.push(rowError(this.place(column), 'required'));
    return this.bounded(column, value, limit);
  }

  optionalText(column: string, limit: number): string | null {
    const value = this.raw(column);
    return value === '' ? null : this.bounded(column, value, limit);
  }

  date(column: string): CivilDate | null {
    if (this.has(column)) return this.optionalDate(column);
    this.errors.push(rowError(this.place(column), 'required'));
    return null;
  }

  optionalDate(column: string): CivilDate | null {
    const value = this.raw(column);
    if (value === '') return null;
    const match = DATE.exec(value);
    const isDay = match !== null && dayExists(Number(match[1]), Number(match[2]), Number(match[3]));
    if (isDay) return value;
    this.errors.push(rowError(this.place(column), 'not-a-date', { isImpossible: match !== null }));
    return null;
  }

  /** The day of something that has happened, within the records of the plan. */
  pastDate(column: string, { from, isBalance }: { from: CivilDate | null; isBalance: boolean }): CivilDate | null {
    const date = this.date(column);
    if (date === null) return null;
    const { today } = this.context;
    if (date > today) this.errors.push(rowError(this.place(column), 'in-the-future', { today }));
    else if (from !== null && date < from) {
      this.errors.push(rowError(this.place(column), 'before-records-begin', { earliest: from, isBalance }));
    }
    return date;
  }

  /** Reports when the later of two days is before the earlier. */
  inOrder(earlierColumn: string, earlierDate: CivilDate | null, column: string, date: CivilDate | null): void {
    if (earlierDate === null || date === null || earlierDate <= date) return;
    this.errors.push(rowError(this.place(column), 'date-order', { earlierColumn, earlierDate }));
  }

  amount(column: string): number | null {
    if (this.has(column)) return this.optionalAmount(column);
    this.errors.push(rowError(this.place(column), 'required'));
    return null;
  }

  optionalAmount(column: string): number | null {
    const value = this.raw(column);
    if (value === '') return null;
    const cents = parseAmount(value);
    if (cents !== null) return cents;
    if (/^-?\d+\.\d{3,}$/.test(value))
      this.errors.push(rowError(this.place(column), 'too-many-decimals', { places: 2 }));
    else this.errors.push(rowError(this.place(column), 'not-an-amount', { cause: amountFault(value) }));
    return null;
  }

  /** A number of up to eight decimals, as text: it goes into the database without passing through binary fractions. */
  price(column: string, mayBeZero: boolean): string {
    if (!this.has(column)) this.errors.push(rowError(this.place(column), 'required'));
    return this.optionalPrice(column, mayBeZero) ?? '';
  }

  optionalPrice(column: string, mayBeZero: boolean): string | null {
    const value = this.raw(column);
    if (value === '') return null;
    if (/^\d{1,12}\.\d{9,}$/.test(value)) {
      this.errors.push(rowError(this.place(column), 'too-many-decimals', { places: 8 }));
    } else if (!/^\d{1,12}(\.\d{1,8})?$/.test(value) || (!mayBeZero && /^[0.]+$/.test(value))) {
      this.errors.push(rowError(this.place(column), 'not-a-price', { mayBeZero }));
    }
    return value;
  }

  choice<T extends string>(column: string, choices: readonly T[]): T | null {
    if (this.has(column)) return this.optionalChoice(column, choices);
    this.errors.push(rowError(this.place(column), 'required'));
    return null;
  }

  /** Capitals do not matter. */
  optionalChoice<T extends string>(column: string, choices: readonly T[]): T | null {
    const value = this.raw(column);
    if (value === '') return null;
    const chosen =
      choices.find((choice) => choice === value) ?? choices.find((choice) => choice === value.toLowerCase());
    if (chosen !== undefined) return chosen;
    this.errors.push(rowError(this.place(column), 'not-a-choice', { near: nearMatch(value, choices), choices }));
    return null;
  }

  optionalEmail(column: string, limit: number): string | null {
    const value = this.optionalText(column, limit);
    if (value !== null && value.length <= limit && !EMAIL.test(value)) this.fault(column, 'not-an-email');
    return value;
  }

  fault(column: string, code: Extract<RowErrorCode, 'required' | 'unknown-action' | 'not-an-email'>): void {
    this.errors.push(rowError(this.place(column), code));
  }

  place(column: string): { line: number; column: string; value: string } {
    return { line: this.row.line, column, value: this.raw(column) };
  }

  private raw(column: string): string {
    return this.row.values[column] ?? '';
  }

  private bounded(column: string, value: string, limit: number): string {
    // most values are far shorter than the limit in UTF-16 units; only the others are counted as people count
    const length = value.length <= limit ? value.length : Array.from(value).length;
    if (length > limit) this.errors.push(rowError(this.place(column), 'too-long', { length, limit }));
    return value;
  }
}

function dayExists(year: number, month: number, day: number): boolean {
  const days = DAYS[month - 1];
  if (days === undefined || year === 0 || day < 1) return false;
  const isLeap = (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
  return day <= (month === 2 && isLeap ? 29 : days);
}

function amountFault(value: string): AmountFault {
  if (/^[-+]?\d+(\.\d+)?e[-+]?\d+$/i.test(value)) return 'exponent';
  if (/^\(.*\)$/.test(value)) return 'parentheses';
  if (/\p{Sc}|^(usd|eur)\b|\b(usd|eur)$/iu.test(value)) return 'currency';
  if (/^-?\d{14,}(\.\d{1,2})?$/.test(value)) return 'too-large';
  if (/^-?\d{1,3}([,.\s'’]\d{3})+([.,]\d+)?$/u.test(value)) return 'thousands';
  return /^-?\d+,\d{1,2}$/.test(value) ? 'comma' : 'other';
}
