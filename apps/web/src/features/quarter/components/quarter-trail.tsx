import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { formatQuarter } from '../../../lib/format';
import { useQuarter } from '../api/use-quarter';

interface QuarterTrailProps {
  quarterId: string;
  planPath(planId: string): string;
  /** Left out on the quarter's own page. */
  quarterPath?: string;
}

/** The way back: plan, and quarter on the screens below it. */
export function QuarterTrail({ quarterId, planPath, quarterPath }: QuarterTrailProps) {
  const { t, i18n } = useTranslation('quarter');
  const { data } = useQuarter(quarterId);
  if (!data) return <span>&nbsp;</span>;
  return (
    <nav aria-label={t('trail')}>
      <Link to={planPath(data.plan.id)}>{data.plan.name}</Link>
      {quarterPath !== undefined && (
        <>
          <span aria-hidden="true"> / </span>
          <Link to={quarterPath}>{formatQuarter(data.code, i18n.language)}</Link>
        </>
      )}
    </nav>
  );
}
