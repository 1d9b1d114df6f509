import type { ImportView } from '@quarterpoise/dto';
import { useEffect, useRef } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Note } from '../../../components/note';
import { ProgressBar } from '../../../components/progress-bar';
import { formatPercent } from '../../../lib/format';
import { useImport } from '../api/use-import';
import { isGoing, useImportProgress } from '../api/use-import-progress';
import { ImportOutcome } from './import-outcome';
import styles from './imports.module.css';

interface LiveImportProps {
  importId: string;
  initial?: ImportView;
  /** Link to the file's own page; left out on that page. */
  path?: string;
  /** Called when the file has come to another state, for lists that show it too. */
  onMoved?(): void;
}

/** A file on its way: being checked or loaded with its progress, or how that came out. */
export function LiveImport({ importId, initial, path, onMoved }: LiveImportProps) {
  const { t } = useTranslation('imports');
  const { data, error, mutate } = useImport(importId);
  const file = data ?? initial;
  const state = file?.state;
  const lastState = useRef(state);
  useEffect(() => {
    if (lastState.current !== undefined && lastState.current !== state) onMoved?.();
    lastState.current = state;
  }, [state, onMoved]);
  if (error && !file) return <ErrorState problem={error} onRetry={() => void mutate()} />;
  if (!file) return <Loading lines={5} />;
  return (
    <article className={styles.card} aria-label={file.fileName}>
      <header className={styles.cardHead}>
        <h2 className={styles.fileName}>
          {path === undefined ? file.fileName : <Link to={path}>{file.fileName}</Link>}
        </h2>
        <span className="quiet">
          {t(`kind.${file.kind}`)} · {t(`state.${file.state}`)}
        </span>
      </header>
      {isGoing(file.state) ? <ImportProgressBar file={file} /> : <ImportOutcome file={file} />}
    </article>
  );
}

function ImportProgressBar({ file }: { file: ImportView }) {
  const { t, i18n } = useTranslation(['imports', 'shell']);
  const { progress, isInterrupted } = useImportProgress(file);
  const share = progress?.progress ?? file.progress;
  const isLoading = (progress?.state ?? file.state) === 'committing';
  const percent = formatPercent(Math.round(share * 100), i18n.language);
  return (
    <>
      <ProgressBar
        label={isLoading ? t('imports:progress.loading') : t('imports:progress.checking')}
        share={share}
        text={isLoading ? t('imports:progress.loadingAt', { percent }) : t('imports:progress.checkingAt', { percent })}
      />
      {isInterrupted && <Note tone="attention">{t('shell:interrupted')}</Note>}
    </>
  );
}
