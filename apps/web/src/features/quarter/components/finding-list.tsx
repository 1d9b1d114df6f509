import type { DataFinding } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { formatCount } from '../../../lib/format';
import styles from './quarter.module.css';

/** What the data checks found, blocking things first, each as a sentence with its first cases. */
export function FindingList({ findings }: { findings: readonly DataFinding[] }) {
  const { t } = useTranslation('quarter');
  if (findings.length === 0) return <p>{t('findings.none')}</p>;
  return (
    <ul className={styles.findings}>
      {findings.map((finding, index) => (
        <Finding key={`${finding.code} ${index}`} finding={finding} />
      ))}
    </ul>
  );
}

function Finding({ finding }: { finding: DataFinding }) {
  const { t, i18n } = useTranslation(['quarter', 'imports']);
  const kind = finding.figures['kind'];
  const values = {
    ...finding.figures,
    count: finding.count,
    number: formatCount(finding.count, i18n.language),
    kindName: kind === undefined ? '' : t(`imports:kind.${kind}`),
  };
  return (
    <li className={styles[finding.severity]}>
      <p>
        <strong>{t(`quarter:severity.${finding.severity}`)}.</strong> {t(`quarter:finding.${finding.code}`, values)}
      </p>
      {finding.examples.length > 0 && (
        <details>
          <summary>{t('quarter:findings.examples', { count: finding.examples.length })}</summary>
          <ul className={styles.examples}>
            {finding.examples.map((example) => (
              <li key={`${example.participantNumber} ${example.detail}`}>
                <span className="figures">{example.participantNumber}</span> {example.name}: {example.detail}
              </li>
            ))}
          </ul>
        </details>
      )}
    </li>
  );
}
