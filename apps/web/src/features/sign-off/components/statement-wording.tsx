import type { SignOffSheet } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { formatCivilDate, formatPercent } from '../../../lib/format';
import styles from './sign-off.module.css';

interface StatementWordingProps {
  sample: SignOffSheet['sample'];
  quarter: SignOffSheet['quarter'];
}

/** The sentence that leads the statement, with a drawn account's figure, in both languages. */
export function StatementWording({ sample, quarter }: StatementWordingProps) {
  const { t } = useTranslation('sign-off');
  const figure =
    sample.find((row) => row.periodReturnPct !== null && Number(row.periodReturnPct) > 0)?.periodReturnPct ?? null;
  if (figure === null) return <p className="quiet">{t('wording.none')}</p>;
  return (
    <>
      {(['en', 'es'] as const).map((language) => (
        <blockquote key={language} lang={language} className={styles.wording}>
          {t(`wording.${language}`, {
            percent: formatPercent(figure, language),
            opensOn: formatCivilDate(quarter.opensOn, language, 'long'),
            closesOn: formatCivilDate(quarter.closesOn, language, 'long'),
          })}
        </blockquote>
      ))}
    </>
  );
}
