import type { FlagRow } from '@quarterpoise/dto';
import { Button } from 'antd';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { Rate } from '../../../components/rate';
import type { Decision } from '../api/decide-flags';
import { estimateGap, flagSentence } from '../lib/flag-sentence';
import styles from './run-review.module.css';

interface FlagItemProps {
  flag: FlagRow;
  isCurrent: boolean;
  isMarked: boolean;
  canDecide: boolean;
  onMark(): void;
  onAsk(decision: Decision): void;
}

/** One flag: whose, what it says, first estimate beside solved rate, and the decision. */
export function FlagItem({ flag, isCurrent, isMarked, canDecide, onMark, onAsk }: FlagItemProps) {
  const { t, i18n } = useTranslation(['review', 'figures']);
  const isDecided = flag.decision !== null && flag.decision.decision !== 'reopened';
  const who =
    flag.accountId === null ? t('review:wholePlan') : `${flag.participantNumber ?? ''} ${flag.name ?? ''}`.trim();
  const name = t(`review:flag.${flag.code}.name`, { defaultValue: flag.code });
  const gap = estimateGap(flag.firstEstimatePct, flag.periodReturnPct);
  return (
    <li
      className={`${styles.flag} ${styles[flag.severity]} ${isCurrent ? styles.here : ''}`}
      tabIndex={isCurrent ? 0 : -1}
      aria-current={isCurrent}
      aria-label={`${name}, ${who}`}
    >
      {canDecide && (
        <input
          type="checkbox"
          className={styles.mark}
          checked={isMarked}
          tabIndex={isCurrent ? 0 : -1}
          aria-label={t('review:markFlag', { who })}
          onChange={onMark}
        />
      )}
      <div className={styles.what}>
        <p>
          <strong>{name}</strong> <span className={styles.severity}>{t(`review:severity.${flag.severity}`)}</span>
        </p>
        <p className={styles.who}>
          {flag.participantNumber !== null && <span className="figures">{flag.participantNumber}</span>} {flag.name}
          {flag.accountId === null && t('review:wholePlan')}
        </p>
        <p>{flagSentence(flag, t, i18n.language)}</p>
      </div>
      {flag.accountId !== null && (
        <dl className={styles.rates}>
          <dt>{t('review:solved')}</dt>
          <dd>
            {flag.periodReturnPct === null && flag.status !== null ? (
              t(`figures:status.${flag.status}`)
            ) : (
              <Rate percent={flag.periodReturnPct} signed />
            )}
          </dd>
          <dt>{t('review:estimate')}</dt>
          <dd>
            <Rate percent={flag.firstEstimatePct} signed />
          </dd>
          {gap !== null && (
            <>
              <dt>{t('review:gap')}</dt>
              <dd className="figures">{t('review:points', { gap: gap.replace('-', '−') })}</dd>
            </>
          )}
        </dl>
      )}
      <div className={styles.decision}>
        {flag.decision && (
          <p>
            <strong>{t(`review:decision.${flag.decision.decision}`)}</strong>: {flag.decision.reason}
            {flag.decision.message !== null && <q className={styles.message}>{flag.decision.message}</q>}
            <span className="quiet">
              {' '}
              {flag.decision.decidedByName}, <Moment at={flag.decision.decidedAt} />
            </span>
          </p>
        )}
        {canDecide && (
          <div className={styles.buttons}>
            {isDecided ? (
              <Button size="small" tabIndex={isCurrent ? 0 : -1} onClick={() => onAsk('reopened')}>
                {t('review:reopen')}
              </Button>
            ) : (
              <>
                <Button size="small" tabIndex={isCurrent ? 0 : -1} onClick={() => onAsk('accepted')}>
                  {t('review:accept')}
                </Button>
                <Button size="small" tabIndex={isCurrent ? 0 : -1} onClick={() => onAsk('held')}>
                  {t('review:hold')}
                </Button>
              </>
            )}
          </div>
        )}
      </div>
    </li>
  );
}
