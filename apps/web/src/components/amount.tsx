import { useTranslation } from 'react-i18next';
import { formatCents, formatDollars } from '../lib/format';
import styles from './figures.module.css';

interface AmountProps {
  /** Whole cents, or a plain decimal in dollars as control totals come. */
  cents?: number | null;
  dollars?: string | null;
  /** A gain or loss: sign, arrow and (last) colour. Off for plain balances. */
  signed?: boolean;
}

/** An amount of money in tabular figures. A dash, read out as "none", where there is none. */
export function Amount({ cents, dollars, signed = false }: AmountProps) {
  const { t, i18n } = useTranslation('shell');
  if (cents == null && dollars == null) return <None text={t('none')} />;
  const text =
    cents != null ? formatCents(cents, i18n.language, signed) : formatDollars(dollars ?? 0, i18n.language, signed);
  const value = cents ?? Number(dollars);
  return <Figure text={text} direction={signed ? Math.sign(value) : 0} />;
}

export function None({ text }: { text: string }) {
  return (
    <span className={styles.none}>
      <span aria-hidden="true">–</span>
      <span className="visually-hidden">{text}</span>
    </span>
  );
}

export function Figure({ text, direction }: { text: string; direction: number }) {
  const tone = direction > 0 ? styles.gain : direction < 0 ? styles.loss : undefined;
  return (
    <span className={`figures ${tone ?? ''}`}>
      {direction !== 0 && (
        <span aria-hidden="true" className={styles.arrow}>
          {direction > 0 ? '▲' : '▼'}
        </span>
      )}
      {text}
    </span>
  );
}
