import { Type } from '@mikro-orm/core';

/** Money columns: `bigint` in the database, a safe integer of whole cents here. What does not fit is refused, never rounded. */
export class CentsType extends Type<number, string> {
  override convertToDatabaseValue(value: number | string): string {
    return String(safeInteger(value));
  }

  override convertToJSValue(value: number | string): number {
    return safeInteger(value);
  }

  override getColumnType(): string {
    return 'bigint';
  }

  override compareAsType(): string {
    return 'number';
  }
}

/** @throws RangeError beyond ±(2^53 − 1), where doubles stop counting by ones. */
export function safeInteger(value: number | string): number {
  const number = Number(value);
  if (!Number.isSafeInteger(number)) throw new RangeError(`${value} is not a whole number that can be kept exactly`);
  return number;
}
