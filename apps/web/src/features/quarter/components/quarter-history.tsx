import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import styles from './quarter.module.css';

type QuarterEvent = QuarterView['history'][number];

/** Who did what and when, newest first, from the audit trail. */
export function QuarterHistory({ history }: { history: readonly QuarterEvent[] }) {
  const { t } = useTranslation('quarter');
  return (
    <section aria-labelledby="quarter-history" className={styles.history}>
      <h2 id="quarter-history">{t('history.title')}</h2>
      {history.length === 0 ? (
        <p className="quiet">{t('history.empty')}</p>
      ) : (
        <ol>
          {history.map((event, index) => (
            <HistoryLine key={`${event.at} ${event.action} ${index}`} event={event} />
          ))}
        </ol>
      )}
    </section>
  );
}

function HistoryLine({ event }: { event: QuarterEvent }) {
  const { t, i18n } = useTranslation(['quarter', 'imports']);
  const { details } = event;
  const values: Record<string, unknown> = { ...details };
  for (const end of ['from', 'to'] as const) {
    if (typeof details[end] === 'string') values[end] = t(`quarter:state.${details[end]}`);
  }
  if (typeof details['kind'] === 'string') values['kind'] = t(`imports:kind.${details['kind']}`);
  const key = `quarter:event.${event.action}`;
  // A sentence with values is used only when the trail carries them; some older entries do not.
  const isTold = event.action !== 'quarter.moved' || ('from' in details && 'to' in details);
  return (
    <li>
      <span>
        {event.personName ?? t('quarter:history.service')}: {isTold && i18n.exists(key) ? t(key, values) : event.action}
      </span>
      <span className="quiet">
        <Moment at={event.at} />
      </span>
    </li>
  );
}
