import { useTranslation } from 'react-i18next';
import { formatPercent } from '../lib/format';
import { Figure, None } from './amount';

/** A rate of return as the service gives it, in percent; a dash where no rate could be given. */
export function Rate({ percent, signed = false }: { percent: string | null | undefined; signed?: boolean }) {
  const { t, i18n } = useTranslation('shell');
  if (percent == null) return <None text={t('none')} />;
  return (
    <Figure text={formatPercent(percent, i18n.language, signed)} direction={signed ? Math.sign(Number(percent)) : 0} />
  );
}
