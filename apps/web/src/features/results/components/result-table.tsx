import type { ResultRow } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Amount } from '../../../components/amount';
import { Rate } from '../../../components/rate';
import styles from './results.module.css';

/** Results of accounts as a table; also the sample on the sign-off sheet. */
export function ResultTable({ rows, label }: { rows: readonly ResultRow[]; label: string }) {
  const { t } = useTranslation(['results', 'review', 'figures']);
  return (
    <div className={styles.scroll} tabIndex={0} role="region" aria-label={label}>
      <table className={styles.table}>
        <thead>
          <tr>
            <th scope="col">{t('results:number')}</th>
            <th scope="col">{t('results:name')}</th>
            <th scope="col" className={styles.right}>
              {t('results:opening')}
            </th>
            <th scope="col" className={styles.right}>
              {t('results:gain')}
            </th>
            <th scope="col" className={styles.right}>
              {t('results:closing')}
            </th>
            <th scope="col" className={styles.right}>
              {t('results:return')}
            </th>
            <th scope="col" className={styles.right}>
              {t('results:estimate')}
            </th>
            <th scope="col">{t('results:flags')}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.accountId}>
              <th scope="row" className="figures">
                {row.participantNumber}
              </th>
              <td>{row.name}</td>
              <td className={styles.right}>
                <Amount cents={row.openingCents} />
              </td>
              <td className={styles.right}>
                <Amount cents={row.gainCents} signed />
              </td>
              <td className={styles.right}>
                <Amount cents={row.closingCents} />
              </td>
              <td className={styles.right}>
                {row.periodReturnPct === null ? (
                  t(`figures:status.${row.status}`)
                ) : (
                  <Rate percent={row.periodReturnPct} signed />
                )}
              </td>
              <td className={styles.right}>
                <Rate percent={row.firstEstimatePct} />
              </td>
              <td>
                {row.flagCodes.map((code) => t(`review:flag.${code}.name`, { defaultValue: code })).join(', ')}
                {row.reason !== null && (
                  <span className="quiet"> {t(`figures:reason.${row.reason}`, { defaultValue: row.reason })}</span>
                )}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
