import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { ConfirmButton } from '../../../components/confirm-button';
import { useHat } from '../../../lib/session';
import { usePublish } from '../api/publish';
import { DeliveryReport } from './delivery-report';
import styles from './publication.module.css';

/** Publish with one question; before the sign-off the button says why it cannot; afterwards the result and the delivery. */
export function PublishPanel({ quarter }: { quarter: QuarterView }) {
  const { t } = useTranslation('publication');
  const hat = useHat();
  const { publish, isBusy, problem } = usePublish(quarter.id);
  if (quarter.publication) return <DeliveryReport publication={quarter.publication} delivery={quarter.delivery} />;

  const action = quarter.actions.find((entry) => entry.action === 'publish');
  const runId = quarter.signOff?.runId ?? quarter.currentRun?.id;
  const isSignedOff = quarter.state === 'signed_off' && runId !== undefined;
  const reason = isSignedOff ? (action?.reason ?? null) : (action?.reason ?? t('notSignedOff'));
  const isPublisher = hat === 'administrator' || hat === 'approver';
  const isAllowed = isSignedOff && action?.allowed === true;
  return (
    <div className={styles.panel}>
      {isPublisher && (
        <div>
          <ConfirmButton
            label={t('publish')}
            type="primary"
            disabled={!isAllowed}
            title={t('ask.title')}
            text={
              <ul className={styles.list}>
                <li>{t('ask.statements')}</li>
                <li>{t('ask.notices')}</li>
                <li>{t('ask.held')}</li>
                <li>{t('ask.final')}</li>
              </ul>
            }
            confirmLabel={t('ask.confirm')}
            isBusy={isBusy}
            problem={problem}
            onConfirm={async () => runId !== undefined && (await publish(runId))}
          />
        </div>
      )}
      {!isAllowed && <p className="quiet">{isPublisher ? reason : t('notYours')}</p>}
    </div>
  );
}
