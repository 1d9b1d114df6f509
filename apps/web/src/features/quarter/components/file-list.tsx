import type { ImportView, QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { formatCount, formatDollars } from '../../../lib/format';
import styles from './quarter.module.css';

interface FileListProps {
  files: QuarterView['files'];
  filePath(importId: string): string;
}

/** The four files of the quarter: what has come, what is missing. */
export function FileList({ files, filePath }: FileListProps) {
  const { t } = useTranslation(['quarter', 'imports']);
  return (
    <ul className={styles.lines}>
      {files.map(({ kind, required, latest }) => (
        <li key={kind} className={styles.fileLine}>
          <span className={styles.lineName}>{t(`imports:kind.${kind}`)}</span>
          {latest ? (
            <FileStanding file={latest} path={filePath(latest.id)} />
          ) : (
            <span className={required ? styles.attention : 'quiet'}>
              {required ? t('quarter:file.missing') : t('quarter:file.optional')}
            </span>
          )}
        </li>
      ))}
    </ul>
  );
}

function FileStanding({ file, path }: { file: ImportView; path: string }) {
  const { t, i18n } = useTranslation(['quarter', 'imports']);
  const needsAttention = file.state === 'refused' || file.state === 'preview';
  const rows = file.counted?.rows ?? file.stated.rows;
  const sum = file.counted?.sum ?? null;
  return (
    <span>
      <span className={needsAttention ? styles.attention : undefined}>{t(`imports:state.${file.state}`)}</span>
      {', '}
      <span className="figures">{t('imports:rows', { count: rows, number: formatCount(rows, i18n.language) })}</span>
      {sum !== null && (
        <>
          {', '}
          <span className="figures">{formatDollars(sum, i18n.language)}</span>
        </>
      )}
      {' · '}
      <Link to={path}>{file.fileName}</Link>
    </span>
  );
}
