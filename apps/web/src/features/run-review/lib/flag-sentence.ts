import type { FlagRow } from '@quarterpoise/dto';
import type { TFunction } from 'i18next';
import { formatCents, formatCivilDate, formatCount, formatPercent } from '../../../lib/format';

type Figure = FlagRow['figures'][string];

/** A figure as its name says what it is: `…Cents`, `…Pct`, `…On` and `asOf`. */
export function formatFigure(name: string, value: Figure, language: string): string {
  if (value === null) return '–';
  if (/cents$/i.test(name)) return formatCents(Number(value), language);
  if (/(pct|percent)$/i.test(name)) return formatPercent(value, language);
  if (/(On|Date|^asOf)$/.test(name) && typeof value === 'string') return formatCivilDate(value, language);
  return typeof value === 'number' ? formatCount(value, language) : value;
}

/**
 * What a flag says, as a sentence with its figures. Where the sentence asks for a figure that the flag does not carry, or the code is
 * newer than this page, the figures are listed by name instead: nothing is made up and nothing is left out.
 */
export function flagSentence(flag: Pick<FlagRow, 'code' | 'figures'>, t: TFunction, language: string): string {
  const values = Object.fromEntries(
    Object.entries(flag.figures).map(([name, value]) => [
      name,
      name === 'reason'
        ? t(`figures:reason.${value}`, { defaultValue: String(value) })
        : formatFigure(name, value, language),
    ]),
  );
  const key = `review:flag.${flag.code}.sentence`;
  const pattern = t(key, { defaultValue: '', skipInterpolation: true });
  const wanted = Array.from(pattern.matchAll(/\{\{(\w+)\}\}/g), ([, name = '']) => name);
  if (pattern !== '' && wanted.every((name) => flag.figures[name] != null)) return t(key, values);
  const list = Object.entries(values)
    .map(([name, value]) => `${t(`review:figure.${name}`, { defaultValue: name })}: ${value}`)
    .join('; ');
  const short = t(`review:flag.${flag.code}.short`, { defaultValue: '' });
  return [short, list].filter((part) => part !== '').join(' ');
}

/** The gap between first estimate and solved rate in percentage points, with sign; null when either is missing. */
export function estimateGap(estimate: string | null, solved: string | null): string | null {
  if (estimate === null || solved === null) return null;
  const gap = Number(solved) - Number(estimate);
  return Number.isFinite(gap) ? gap.toFixed(2) : null;
}
