import type { RunTotals } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Amount } from './amount';
import styles from './run-totals.module.css';

/** The totals that must tie to something independent of the run; what could not be checked says so and never counts as passed. */
export function TiesTable({ ties }: { ties: RunTotals['ties'] }) {
  const { t } = useTranslation('figures');
  return (
    <div className={styles.scroll} tabIndex={0} role="region" aria-label={t('ties.title')}>
      <table className={styles.table}>
        <thead>
          <tr>
            <th scope="col">{t('ties.title')}</th>
            <th scope="col">{t('ties.outcome')}</th>
            <th scope="col">{t('ties.expected')}</th>
            <th scope="col">{t('ties.found')}</th>
            <th scope="col">{t('ties.difference')}</th>
          </tr>
        </thead>
        <tbody>
          {ties.map((tie) => {
            const outcome = tie.checked ? (tie.tied ? 'tied' : 'differs') : 'unchecked';
            return (
              <tr key={tie.code}>
                <th scope="row">{t(`ties.${tie.code}`)}</th>
                <td className={styles[outcome]}>{t(`ties.outcomes.${outcome}`)}</td>
                <td>{tie.checked ? <Amount cents={tie.expectedCents} /> : <Amount cents={null} />}</td>
                <td>
                  <Amount cents={tie.foundCents} />
                </td>
                <td>{tie.checked ? <Amount cents={tie.foundCents - tie.expectedCents} /> : <Amount cents={null} />}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}
