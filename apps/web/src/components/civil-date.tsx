import { useTranslation } from 'react-i18next';
import { formatCivilDate, formatMoment } from '../lib/format';

export function CivilDate({ date, style = 'short' }: { date: string; style?: 'long' | 'short' }) {
  const { i18n } = useTranslation();
  return <time dateTime={date}>{formatCivilDate(date, i18n.language, style)}</time>;
}

/** A moment, in the reader's time zone. */
export function Moment({ at }: { at: string }) {
  const { i18n } = useTranslation();
  return <time dateTime={at}>{formatMoment(at, i18n.language)}</time>;
}
