import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { FindingList } from './finding-list';

/** What the data checks found; a missing file is told at its own line, one step above. */
export function CheckStep({ quarter }: { quarter: QuarterView }) {
  const { t } = useTranslation('quarter');
  const findings = quarter.findings.filter((finding) => finding.code !== 'file-missing');
  if (quarter.state === 'collecting' && findings.length === 0) return <p className="quiet">{t('findings.waiting')}</p>;
  return <FindingList findings={findings} />;
}
