import type { ImportView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Amount } from '../../../components/amount';
import { formatCount, formatDollars } from '../../../lib/format';
import styles from './imports.module.css';

interface ControlTotalsProps {
  stated: ImportView['stated'];
  counted: NonNullable<ImportView['counted']>;
  kind: ImportView['kind'];
  isMismatch: boolean;
}

/** Difference of two plain decimals, exact for as many digits as totals have. */
function difference(stated: string, counted: string): string {
  const toCents = (text: string) => {
    const [, sign, whole = '0', fraction = ''] = /^(-?)(\d+)(?:\.(\d{1,2}))?$/.exec(text) ?? [];
    const cents = BigInt(whole) * 100n + BigInt(fraction.padEnd(2, '0'));
    return sign === '-' ? -cents : cents;
  };
  const cents = toCents(counted) - toCents(stated);
  const digits = (cents < 0n ? -cents : cents).toString().padStart(3, '0');
  return `${cents < 0n ? '-' : ''}${digits.slice(0, -2)}.${digits.slice(-2)}`;
}

/** Control totals as stated beside those counted, with the difference. */
export function ControlTotals({ stated, counted, kind, isMismatch }: ControlTotalsProps) {
  const { t, i18n } = useTranslation('imports');
  const number = (value: number) => <span className="figures">{formatCount(value, i18n.language)}</span>;
  const rowsDiffer = stated.rows !== counted.rows;
  const sums = stated.sum !== null && counted.sum !== null ? { stated: stated.sum, counted: counted.sum } : null;
  const sumDifference = sums === null ? null : difference(sums.stated, sums.counted);
  const sumsDiffer = sumDifference !== null && Number(sumDifference) !== 0;
  const outcome = (differs: boolean) => (
    <td className={differs ? styles.differs : styles.ties}>{differs ? t('totals.differs') : t('totals.ties')}</td>
  );
  return (
    <div className={styles.scroll} tabIndex={0} role="region" aria-label={t('totals.title')}>
      <table className={`${styles.table} ${isMismatch ? styles.mismatch : ''}`}>
        <caption>{t('totals.title')}</caption>
        <thead>
          <tr>
            <th scope="col">{t('totals.total')}</th>
            <th scope="col">{t('totals.stated')}</th>
            <th scope="col">{t('totals.counted')}</th>
            <th scope="col">{t('totals.difference')}</th>
            <th scope="col">{t('totals.outcome')}</th>
          </tr>
        </thead>
        <tbody>
          <tr>
            <th scope="row">{t('totals.rows')}</th>
            <td>{number(stated.rows)}</td>
            <td>{number(counted.rows)}</td>
            <td>{number(counted.rows - stated.rows)}</td>
            {outcome(rowsDiffer)}
          </tr>
          {sums !== null && (
            <tr>
              <th scope="row">{t(`totals.sum.${kind}`)}</th>
              <td className="figures">{formatDollars(sums.stated, i18n.language)}</td>
              <td className="figures">{formatDollars(sums.counted, i18n.language)}</td>
              <td>
                <Amount dollars={sumDifference} />
              </td>
              {outcome(sumsDiffer)}
            </tr>
          )}
        </tbody>
      </table>
    </div>
  );
}
