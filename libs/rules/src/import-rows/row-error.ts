import type { ImportRowError } from '@quarterpoise/dto';

export type RowErrorCode = ImportRowError['code'];

/** What the sentences of a code need beside the place; codes that need nothing more are not listed. */
interface RowErrorFigures {
  'unknown-kind': { near: string | null; choices: readonly string[] };
  'unknown-participant': { near?: string | null };
  'unknown-fund': { near?: string | null };
  'not-a-date': { isImpossible: boolean };
  'date-order': { earlierColumn: string; earlierDate: string };
  'not-an-amount': { cause: AmountFault };
  'too-many-decimals': { places: number };
  'negative-amount': { isBalance: boolean };
  'not-a-price': { mayBeZero: boolean };
  'not-a-choice': { near: string | null; choices: readonly string[] };
  'duplicate-in-file': { firstLine: number };
  'too-long': { length: number; limit: number };
  'before-records-begin': { earliest: string; isBalance: boolean };
  'in-the-future': { today: string };
  'column-count': { expected: number; found: number };
}

type FiguresOf<C extends RowErrorCode> = C extends keyof RowErrorFigures ? [figures: RowErrorFigures[C]] : [];

/** Where in the file: the line that the row starts on (1 is the header row), the column, and what stands there. */
export interface RowPlace {
  readonly line: number;
  readonly column: string;
  readonly value: string;
}

/** Why a text is no amount, as far as that can be told. */
export type AmountFault = 'thousands' | 'comma' | 'currency' | 'parentheses' | 'exponent' | 'too-large' | 'other';

interface Sentences {
  readonly reason: string;
  readonly remedy: string;
}

type Builder<C extends RowErrorCode> = (place: RowPlace, ...figures: FiguresOf<C>) => Sentences;

const quoted = (value: string) => `“${value}”`;
const meant = (near: string | null | undefined) => (near ? `Did you mean ${near}? ` : '');

const AMOUNT_FAULTS: Record<AmountFault, string> = {
  thousands: 'Leave the thousands separators out',
  comma: 'Write a point, not a comma, before the cents',
  currency: 'Leave the currency sign out',
  parentheses: 'Write a negative amount with a leading minus sign',
  exponent: 'Write the number out in full; a spreadsheet may have shortened it',
  'too-large': 'Check the number of digits; an amount has at most 13 before the point',
  other: 'Write digits only',
};

/** One pair of sentences per code: why the value cannot be taken, and how to mend it. */
const TEXTS: { readonly [C in RowErrorCode]: Builder<C> } = {
  required: ({ column }) => ({
    reason: `${column} is empty.`,
    remedy: `Every row needs a value in ${column}; fill it in.`,
  }),
  'unknown-kind': ({ value }, { near, choices }) => ({
    reason: `${quoted(value)} is not a kind of activity.`,
    remedy: `${meant(near)}The kinds are ${choices.join(', ')}.`,
  }),
  'unknown-action': ({ value }) => ({
    reason: `${quoted(value)} is not an action.`,
    remedy: 'Write void to take the reference back; leave the column empty otherwise.',
  }),
  'unknown-participant': ({ value }, { near }) => ({
    reason: `The plan has no participant with the number ${quoted(value)}.`,
    remedy: `${meant(near)}Load a roster with this participant first, or mend the number; leading zeros count.`,
  }),
  'unknown-fund': ({ value }, { near }) => ({
    reason: `The plan has no fund ${quoted(value)}.`,
    remedy: `${meant(near)}Use the fund’s code from the plan’s set-up, or have the fund added there.`,
  }),
  'not-a-date': ({ value }, { isImpossible }) => ({
    reason: isImpossible
      ? `There is no such day as ${value}.`
      : `${quoted(value)} is not a date in the form YYYY-MM-DD.`,
    remedy: isImpossible ? 'Check the month and the day.' : 'Write year, month and day, such as 2026-07-31.',
  }),
  'date-order': ({ column, value }, { earlierColumn, earlierDate }) => ({
    reason: `${column} ${value} is before ${earlierColumn} ${earlierDate}.`,
    remedy: `${column} is the same day as ${earlierColumn} or a later one; check whether the two are swapped.`,
  }),
  'not-an-amount': ({ value }, { cause }) => ({
    reason: `${quoted(value)} is not a plain decimal amount.`,
    remedy: `${AMOUNT_FAULTS[cause]}, such as 1234.56.`,
  }),
  'too-many-decimals': ({ value }, { places }) => ({
    reason: `${value} has more than ${places} decimal places.`,
    remedy:
      places === 2
        ? 'Amounts are in whole cents: send the amount that was really booked, and state the control total of those amounts.'
        : `Round to ${places} places.`,
  }),
  'negative-amount': ({ column, value }, { isBalance }) => ({
    reason: isBalance
      ? `${value} in ${column}: what is outstanding on a loan cannot be below zero.`
      : `${value} in ${column} is negative; the kind gives the direction.`,
    remedy: isBalance
      ? 'Write the outstanding note as a positive amount.'
      : 'Write the amount as positive. To undo an earlier row, send its reference with the action void; for money the other way use the kind for it.',
  }),
  'not-a-price': ({ column, value }, { mayBeZero }) => ({
    reason: `${quoted(value)} in ${column} is not a plain decimal number ${mayBeZero ? 'of zero or more' : 'above zero'}.`,
    remedy:
      'Write digits and a decimal point, with at most twelve digits before it and eight after, such as 12.34567891.',
  }),
  'not-a-choice': ({ column, value }, { near, choices }) => ({
    reason: `${quoted(value)} is not one of the values of ${column}.`,
    remedy: `${meant(near)}Write ${choices.join(' or ')}.`,
  }),
  'not-an-email': ({ value }) => ({
    reason: `${quoted(value)} is not an e-mail address.`,
    remedy: 'Write one address such as name@example.com, or leave it empty.',
  }),
  'duplicate-in-file': ({ column, value }, { firstLine }) => ({
    reason: `${column} ${quoted(value)} stands in line ${firstLine} already.`,
    remedy: 'Leave one of the two rows out, or mend the one that is meant to be another.',
  }),
  'too-long': ({ column }, { length, limit }) => ({
    reason: `The value has ${length} characters; ${column} takes at most ${limit}.`,
    remedy: 'Shorten it, and check whether two values ran together because a separator or a quote is missing.',
  }),
  'void-without-original': ({ value }) => ({
    reason: `There is nothing to take back: ${quoted(value)} was never loaded, or was taken back before.`,
    remedy: 'Check the reference, or leave the row out.',
  }),
  'before-records-begin': ({ column, value }, { earliest, isBalance }) => ({
    reason: `${column} ${value} is before the plan’s records begin.`,
    remedy: isBalance
      ? `The first balances are those of ${earliest}; leave earlier ones out.`
      : `Rows are taken from ${earliest} on; what came before is part of the opening balance, so leave the row out.`,
  }),
  'in-the-future': ({ column, value }, { today }) => ({
    reason: `${column} ${value} is in the future; today is ${today}.`,
    remedy: 'Check the year, or send the row once the day has come.',
  }),
  'column-count': (_, { expected, found }) => ({
    reason: `The row has ${found} values; the header has ${expected} columns.`,
    remedy: 'Put values that hold the separator or a quote into double quotes, and check for a missing separator.',
  }),
};

const LONGEST_SHOWN = 200;

/** The error of one place, with the sentences of its code. A long value is shown by its beginning. */
export function rowError<C extends RowErrorCode>(place: RowPlace, code: C, ...figures: FiguresOf<C>): ImportRowError {
  const value = place.value.length > LONGEST_SHOWN ? `${place.value.slice(0, LONGEST_SHOWN)}…` : place.value;
  const shown = { line: place.line, column: place.column, value };
  const { reason, remedy } = (TEXTS[code] as Builder<C>)(shown, ...figures);
  return { ...shown, code, reason, remedy };
}
