import type { RunSummary } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { LinkButton } from '../../../components/link-button';
import { formatCount } from '../../../lib/format';
import styles from './quarter.module.css';

interface ReviewStepProps {
  run: RunSummary | null;
  reviewPath: string;
  resultsPath: string;
}

/** How many flags there are and how many are still to decide. */
export function ReviewStep({ run, reviewPath, resultsPath }: ReviewStepProps) {
  const { t, i18n } = useTranslation('quarter');
  if (!run) return <p className="quiet">{t('review.notYet')}</p>;
  const number = (value: number) => formatCount(value, i18n.language);
  const open = run.undecidedFlagCount;
  return (
    <>
      <p>
        {run.flagCount === 0 ? (
          t('review.noFlags')
        ) : (
          <>
            {t('review.flags', { count: run.flagCount, number: number(run.flagCount) })},{' '}
            <span className={open > 0 ? styles.attention : undefined}>
              {open === 0 ? t('review.allDecided') : t('review.undecided', { count: open, number: number(open) })}
            </span>
            .
          </>
        )}
      </p>
      <div className={styles.row}>
        {run.flagCount > 0 && (
          <LinkButton to={reviewPath} isPrimary={open > 0}>
            {open > 0 ? t('review.open') : t('review.see')}
          </LinkButton>
        )}
        <LinkButton to={resultsPath}>{t('review.results')}</LinkButton>
      </div>
    </>
  );
}
