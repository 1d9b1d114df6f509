import type { CivilDate, ImportRowError } from '@quarterpoise/dto';
import { LONGEST } from './limits.js';
import { type RawRow, type RowContext, RowReader } from './row-reader.js';

export interface RosterRow {
  readonly line: number;
  readonly participantNumber: string;
  readonly givenName: string;
  readonly familyName: string;
  readonly email: string | null;
  readonly emailKind: 'work' | 'personal' | null;
  readonly joinedOn: CivilDate | null;
  readonly leftOn: CivilDate | null;
  readonly language: 'en' | 'es';
  /** As the employer's records have it; a participant's own choice outlives it. */
  readonly delivery: 'email' | 'paper';
  readonly deliveryBasis: string | null;
  readonly deliveryBasisOn: CivilDate | null;
  readonly postalLines: readonly string[];
  /** The number that this participant had before; empty unless it changed. */
  readonly previousNumber: string | null;
}

const ADDRESS_COLUMNS = ['address_line_1', 'address_line_2', 'address_line_3', 'address_line_4'] as const;

/**
 * Reads a row of a roster, or tells everything that is wrong with it. E-mail delivery without an address is not an error of the file:
 * the quarter's page lists whoever can be reached in neither way.
 */
export function parseRosterRow(row: RawRow, context: RowContext): RosterRow | ImportRowError[] {
  const reader = new RowReader(row, context);
  const participantNumber = reader.text('participant_number', LONGEST.participantNumber);
  const givenName = reader.text('given_name', LONGEST.name);
  const familyName = reader.text('family_name', LONGEST.name);
  const email = reader.optionalEmail('email', LONGEST.email);
  const emailKind = reader.optionalChoice('email_kind', ['work', 'personal'] as const);
  const joinedOn = reader.optionalDate('joined_on');
  const leftOn = reader.optionalDate('left_on');
  reader.inOrder('joined_on', joinedOn, 'left_on', leftOn);
  const language = reader.choice('language', ['en', 'es'] as const);
  const delivery = reader.choice('delivery', ['email', 'paper'] as const);
  const deliveryBasis = reader.optionalText('delivery_basis', LONGEST.deliveryBasis);
  const deliveryBasisOn = reader.optionalDate('delivery_basis_on');
  const postalLines = ADDRESS_COLUMNS.flatMap((column) => reader.optionalText(column, LONGEST.addressLine) ?? []);
  const previousNumber = reader.optionalText('previous_number', LONGEST.participantNumber);
  if (reader.errors.length > 0 || language === null || delivery === null) return reader.errors;
  return {
    line: row.line,
    participantNumber,
    givenName,
    familyName,
    email,
    emailKind,
    joinedOn,
    leftOn,
    language,
    delivery,
    deliveryBasis,
    deliveryBasisOn,
    postalLines,
    previousNumber: previousNumber === participantNumber ? null : previousNumber,
  };
}
