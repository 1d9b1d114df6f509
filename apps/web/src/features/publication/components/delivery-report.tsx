import type { QuarterView } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { Loading } from '../../../components/loading';
import { Note } from '../../../components/note';
import { formatCount } from '../../../lib/format';
import styles from './publication.module.css';

interface DeliveryReportProps {
  publication: NonNullable<QuarterView['publication']>;
  delivery: QuarterView['delivery'];
}

/** What was published and how far the notices have come. */
export function DeliveryReport({ publication, delivery }: DeliveryReportProps) {
  const { t, i18n } = useTranslation('publication');
  const number = (value: number) => <span className="figures">{formatCount(value, i18n.language)}</span>;
  if (publication.completedAt === null) {
    return (
      <div aria-live="polite">
        <p>{t('going')}</p>
        <Loading lines={2} />
      </div>
    );
  }
  const undelivered = delivery ? delivery.failed + delivery.bounced : 0;
  return (
    <div className={styles.panel}>
      <p>
        {t('publishedBy', { name: publication.requestedByName })} <Moment at={publication.completedAt} />
      </p>
      <dl className={styles.counts}>
        <dt>{t('count.statements')}</dt>
        <dd>{number(publication.statementCount)}</dd>
        <dt>{t('count.email')}</dt>
        <dd>{number(publication.emailCount)}</dd>
        <dt>{t('count.paper')}</dt>
        <dd>{number(publication.paperCount)}</dd>
        <dt>{t('count.held')}</dt>
        <dd>{number(publication.heldCount)}</dd>
      </dl>
      {delivery && (
        <>
          <p className={styles.heading}>{t('delivery')}</p>
          <dl className={styles.counts}>
            {(['sent', 'queued', 'failed', 'bounced', 'read'] as const).map((name) => (
              <DeliveryLine key={name} name={t(`deliveryState.${name}`)} count={number(delivery[name])} />
            ))}
          </dl>
          {undelivered > 0 && <Note tone="attention">{t('undelivered', { count: undelivered })}</Note>}
        </>
      )}
    </div>
  );
}

function DeliveryLine({ name, count }: { name: string; count: ReactNode }) {
  return (
    <>
      <dt>{name}</dt>
      <dd>{count}</dd>
    </>
  );
}
