import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { LinkButton } from '../../../components/link-button';

/** Who signed, or whether signing is possible and why not. */
export function SignOffStep({ quarter, path }: { quarter: QuarterView; path: string }) {
  const { t } = useTranslation('quarter');
  const action = quarter.actions.find((entry) => entry.action === 'sign-off');
  if (!quarter.currentRun) return <p className="quiet">{t('signOff.notYet')}</p>;
  return (
    <>
      {quarter.signOff ? (
        <p>
          {t('signOff.signedBy', { name: quarter.signOff.signedByName })}, <Moment at={quarter.signOff.signedAt} />
        </p>
      ) : (
        action && !action.allowed && action.reason !== null && <p className="quiet">{action.reason}</p>
      )}
      <div>
        <LinkButton to={path} isPrimary={action?.allowed ?? false}>
          {t('signOff.open')}
        </LinkButton>
      </div>
    </>
  );
}
