import type { ImportView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { ConfirmButton } from '../../../components/confirm-button';
import { formatCount } from '../../../lib/format';
import { useHat } from '../../../lib/session';
import { useSettleImport } from '../api/settle-import';
import styles from './imports.module.css';

/** Load or put away a checked file. A file with faulty rows can only be put away: loading is all or nothing. */
export function SettleImport({ file }: { file: ImportView }) {
  const { t, i18n } = useTranslation('imports');
  const hat = useHat();
  const { commit, discard } = useSettleImport(file.id);
  if (hat !== 'administrator') return <p className="quiet">{t('settle.administratorOnly')}</p>;
  const rows = file.counted?.rows ?? file.stated.rows;
  return (
    <>
      <div className={styles.buttons}>
        <ConfirmButton
          label={t('settle.commit')}
          type="primary"
          disabled={file.errorCount > 0}
          title={t('settle.commitTitle', { name: file.fileName })}
          text={t('settle.commitText', { count: rows, number: formatCount(rows, i18n.language) })}
          confirmLabel={t('settle.commit')}
          isBusy={commit.isBusy}
          problem={commit.problem}
          onConfirm={commit.run}
        />
        <ConfirmButton
          label={t('settle.discard')}
          title={t('settle.discardTitle', { name: file.fileName })}
          text={t('settle.discardText')}
          confirmLabel={t('settle.discard')}
          isBusy={discard.isBusy}
          problem={discard.problem}
          onConfirm={discard.run}
        />
      </div>
      {file.errorCount > 0 && <p className="quiet">{t('settle.errorsFirst')}</p>}
    </>
  );
}
