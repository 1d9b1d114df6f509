/** The languages of the screens as number and date locales. Amounts are US dollars in both. */
export function localeOf(language: string): string {
  return language.startsWith('es') ? 'es-US' : 'en-US';
}

/** The true minus sign: as wide as a digit in tabular figures, and read out as "minus". */
const withMinus = (text: string): string => text.replace('-', '−');

/** Whole cents as dollars; `signed` puts a plus before gains too. */
export function formatCents(cents: number, language: string, signed = false): string {
  return formatDollars(cents / 100, language, signed);
}

/** A plain decimal (`"1234.56"`) or number as dollars. Strings keep every digit. */
export function formatDollars(value: string | number, language: string, signed = false): string {
  const format = new Intl.NumberFormat(localeOf(language), {
    style: 'currency',
    currency: 'USD',
    currencyDisplay: 'narrowSymbol',
    signDisplay: signed ? 'exceptZero' : 'negative',
  });
  return withMinus(format.format(value as number));
}

export function formatCount(value: number, language: string): string {
  return withMinus(new Intl.NumberFormat(localeOf(language)).format(value));
}

/** A percentage as the service gives it (`"2.41"`), with its own number of decimals. */
export function formatPercent(percent: string | number, language: string, signed = false): string {
  const text = String(percent);
  const decimals = text.includes('.') ? text.length - text.indexOf('.') - 1 : 0;
  const format = new Intl.NumberFormat(localeOf(language), {
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
    signDisplay: signed ? 'exceptZero' : 'negative',
  });
  return `${withMinus(format.format(text as unknown as number))}%`;
}

/** A civil date; never passes through the reader's time zone. */
export function formatCivilDate(date: string, language: string, style: 'long' | 'short' = 'short'): string {
  const [year = 0, month = 1, day = 1] = date.split('-').map(Number);
  const format = new Intl.DateTimeFormat(localeOf(language), {
    timeZone: 'UTC',
    year: 'numeric',
    month: style === 'long' ? 'long' : 'short',
    day: 'numeric',
  });
  return format.format(Date.UTC(year, month - 1, day));
}

/** A moment in the reader's own time zone. */
export function formatMoment(moment: string, language: string): string {
  return new Intl.DateTimeFormat(localeOf(language), { dateStyle: 'medium', timeStyle: 'short' }).format(
    new Date(moment),
  );
}

/** `2026-Q3` as people say it: `Q3 2026`, `3.er trimestre` being too long for headings. */
export function formatQuarter(code: string, language: string): string {
  const [year = '', quarter = ''] = code.split('-');
  return language.startsWith('es') ? `T${quarter.slice(1)} ${year}` : `${quarter} ${year}`;
}

export function formatBytes(bytes: number, language: string): string {
  const units = ['byte', 'kilobyte', 'megabyte', 'gigabyte'] as const;
  let size = bytes;
  let step = 0;
  while (size >= 1000 && step < units.length - 1) {
    size /= 1000;
    step += 1;
  }
  const format = new Intl.NumberFormat(localeOf(language), {
    style: 'unit',
    unit: units[step] ?? 'byte',
    unitDisplay: 'short',
    maximumFractionDigits: step > 1 ? 1 : 0,
  });
  return format.format(size);
}
