import { Button } from 'antd';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Moment } from '../../../components/civil-date';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { formatCount } from '../../../lib/format';
import type { useImports } from '../api/use-imports';
import styles from './imports.module.css';

interface ImportHistoryProps {
  imports: ReturnType<typeof useImports>;
  filePath(importId: string): string;
}

/** Every file of the quarter, newest first, whatever became of it. */
export function ImportHistory({ imports, filePath }: ImportHistoryProps) {
  const { t, i18n } = useTranslation(['imports', 'shell']);
  const { items, isLoading, isLoadingMore, hasMore, error, loadMore, refresh } = imports;
  return (
    <div className={styles.area}>
      <h2 id="history-heading">{t('imports:history.title')}</h2>
      {error && <ErrorState problem={error} size="inline" onRetry={() => void refresh()} />}
      {isLoading && <Loading />}
      {!isLoading && !error && items.length === 0 && (
        <EmptyState title={t('imports:history.emptyTitle')} text={t('imports:history.emptyText')} />
      )}
      {items.length > 0 && (
        <div className={styles.scroll} tabIndex={0} role="region" aria-labelledby="history-heading">
          <table className={`${styles.table} ${styles.leftTable}`}>
            <thead>
              <tr>
                <th scope="col">{t('imports:history.file')}</th>
                <th scope="col">{t('imports:history.kind')}</th>
                <th scope="col">{t('imports:history.state')}</th>
                <th scope="col" className={styles.right}>
                  {t('imports:history.rows')}
                </th>
                <th scope="col">{t('imports:history.uploaded')}</th>
              </tr>
            </thead>
            <tbody>
              {items.map((file) => (
                <tr key={file.id}>
                  <td>
                    <Link to={filePath(file.id)}>{file.fileName}</Link>
                  </td>
                  <td>{t(`imports:kind.${file.kind}`)}</td>
                  <td className={file.state === 'refused' || file.state === 'preview' ? styles.attention : undefined}>
                    {t(`imports:state.${file.state}`)}
                  </td>
                  <td className={`figures ${styles.right}`}>
                    {formatCount(file.counted?.rows ?? file.stated.rows, i18n.language)}
                  </td>
                  <td>
                    {file.uploadedByName}, <Moment at={file.uploadedAt} />
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {hasMore && (
        <div>
          <Button onClick={loadMore} loading={isLoadingMore}>
            {t('shell:loadMore')}
          </Button>
        </div>
      )}
    </div>
  );
}
