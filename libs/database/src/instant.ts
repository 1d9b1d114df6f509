/** A `timestamptz` of a raw query as the wire writes it: ISO 8601 in UTC. */
export function instant(value: string | Date): string;
export function instant(value: string | Date | null): string | null;
export function instant(value: string | Date | null): string | null {
  return value === null ? null : new Date(value).toISOString();
}
