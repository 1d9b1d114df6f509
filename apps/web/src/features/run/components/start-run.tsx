import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { ConfirmButton } from '../../../components/confirm-button';
import { useHat } from '../../../lib/session';
import { useStartRun } from '../api/start-run';
import styles from './run.module.css';

type Action = QuarterView['actions'][number] | undefined;

interface StartRunProps {
  quarterId: string;
  run: Action;
  rehearse: Action;
  isAgain: boolean;
}

/** Start and rehearse, each after one question. What is not possible now says why; what the role may never do is left out. */
export function StartRun({ quarterId, run, rehearse, isAgain }: StartRunProps) {
  const { t } = useTranslation('run');
  const hat = useHat();
  const starting = useStartRun(quarterId);
  const rehearsing = useStartRun(quarterId);
  if (hat !== 'administrator') return null;
  const reason = run && !run.allowed ? run.reason : null;
  return (
    <div className={styles.start}>
      <div className={styles.buttons}>
        {run && (
          <ConfirmButton
            label={isAgain ? t('start.again') : t('start.button')}
            type={isAgain ? 'default' : 'primary'}
            disabled={!run.allowed}
            title={isAgain ? t('start.againTitle') : t('start.title')}
            text={isAgain ? t('start.againText') : t('start.text')}
            confirmLabel={t('start.confirm')}
            isBusy={starting.isBusy}
            problem={starting.problem}
            onConfirm={async () => (await starting.start(false)) !== undefined}
          />
        )}
        {rehearse && (
          <ConfirmButton
            label={t('rehearse.button')}
            disabled={!rehearse.allowed}
            title={t('rehearse.title')}
            text={t('rehearse.text')}
            confirmLabel={t('rehearse.confirm')}
            isBusy={rehearsing.isBusy}
            problem={rehearsing.problem}
            onConfirm={async () => (await rehearsing.start(true)) !== undefined}
          />
        )}
      </div>
      {reason !== null && <p className="quiet">{reason}</p>}
    </div>
  );
}
