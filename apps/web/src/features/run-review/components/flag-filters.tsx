import { useTranslation } from 'react-i18next';
import type { FlagFilter } from '../api/use-flags';
import styles from './run-review.module.css';

/** The codes of the result checks, worst first as people meet them. */
const CODES = [
  'not-computed',
  'ambiguous',
  'no-solution',
  'no-capital',
  'total-loss',
  'opening-differs',
  'negative-balance',
  'extreme-return',
  'outlier',
  'estimate-gap',
  'capital-too-small',
  'large-flow-on-last-days',
] as const;

export function FlagFilters({ filter, onChange }: { filter: FlagFilter; onChange(filter: FlagFilter): void }) {
  const { t } = useTranslation('review');
  return (
    <div className={styles.filters}>
      <label>
        {t('filter.show')}
        <select
          value={filter.undecided ? 'undecided' : 'all'}
          onChange={(event) => onChange({ ...filter, undecided: event.target.value === 'undecided' })}
        >
          <option value="undecided">{t('filter.undecided')}</option>
          <option value="all">{t('filter.all')}</option>
        </select>
      </label>
      <label>
        {t('filter.code')}
        <select
          value={filter.code ?? ''}
          onChange={(event) => onChange({ ...filter, code: event.target.value || null })}
        >
          <option value="">{t('filter.everyCode')}</option>
          {CODES.map((code) => (
            <option key={code} value={code}>
              {t(`flag.${code}.name`)}
            </option>
          ))}
        </select>
      </label>
    </div>
  );
}
