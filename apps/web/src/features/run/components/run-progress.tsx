import type { RunSummary } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { ConfirmButton } from '../../../components/confirm-button';
import { Note } from '../../../components/note';
import { ProgressBar } from '../../../components/progress-bar';
import { formatCount } from '../../../lib/format';
import { useCancelRun } from '../api/cancel-run';
import { useRunProgress } from '../api/use-run-progress';
import { useCalmText } from '../lib/use-calm-text';
import styles from './run.module.css';

/** A run that is going: accounts done, rate, time left, flags so far. */
export function RunProgress({ run, canCancel }: { run: RunSummary; canCancel: boolean }) {
  const { t, i18n } = useTranslation(['run', 'shell']);
  const { progress, isInterrupted } = useRunProgress(run);
  const done = progress?.doneCount ?? run.doneCount;
  const all = progress?.accountCount ?? run.accountCount;
  const number = (value: number) => formatCount(value, i18n.language);
  const state = progress?.state ?? run.state;
  const text =
    state === 'queued' ? t('run:queued') : t('run:done', { count: all, done: number(done), all: number(all) });
  const spoken = useCalmText(text);

  return (
    <div className={styles.progress}>
      <ProgressBar label={t('run:progress')} share={all === 0 ? 0 : done / all} text={text} />
      <p aria-live="polite" className="visually-hidden">
        {spoken}
      </p>
      {progress && (
        <dl className={styles.facts}>
          <dt>{t('run:rate')}</dt>
          <dd className="figures">{t('run:perSecond', { rate: number(Math.round(progress.accountsPerSecond)) })}</dd>
          <dt>{t('run:timeLeft')}</dt>
          <dd className="figures">
            {progress.secondsLeft === null ? t('run:unknown') : <Duration seconds={progress.secondsLeft} />}
          </dd>
          <dt>{t('run:flagsSoFar')}</dt>
          <dd className="figures">{number(progress.flagCount)}</dd>
          <dt>{t('run:notComputed')}</dt>
          <dd className="figures">{number(progress.notComputedCount)}</dd>
        </dl>
      )}
      {isInterrupted && <Note tone="attention">{t('shell:interrupted')}</Note>}
      {canCancel && <CancelRun runId={run.id} />}
    </div>
  );
}

function Duration({ seconds }: { seconds: number }) {
  const { t } = useTranslation('run');
  const whole = Math.ceil(seconds);
  if (whole < 90) return t('seconds', { count: whole });
  return t('minutes', { count: Math.ceil(whole / 60) });
}

function CancelRun({ runId }: { runId: string }) {
  const { t } = useTranslation('run');
  const { cancel, isBusy, problem } = useCancelRun(runId);
  return (
    <div>
      <ConfirmButton
        label={t('cancel.button')}
        title={t('cancel.title')}
        text={t('cancel.text')}
        confirmLabel={t('cancel.confirm')}
        danger
        isBusy={isBusy}
        problem={problem}
        onConfirm={cancel}
      />
    </div>
  );
}
