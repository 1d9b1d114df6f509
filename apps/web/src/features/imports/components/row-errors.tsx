import { DownloadOutlined } from '@ant-design/icons';
import { Button } from 'antd';
import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { addressOf } from '../../../lib/api-client';
import { formatCount } from '../../../lib/format';
import { useImportErrors } from '../api/use-import-errors';
import styles from './imports.module.css';

/** Every faulty place of a file: line, column, value, why, how to mend it; and the same as CSV. */
export function RowErrors({ importId, errorCount }: { importId: string; errorCount: number }) {
  const { t, i18n } = useTranslation(['imports', 'shell']);
  const { items, isLoading, isLoadingMore, hasMore, error, loadMore, refresh } = useImportErrors(importId);
  return (
    <div className={styles.errors}>
      <div className={styles.cardHead}>
        <h3 id={`errors-${importId}`}>
          {t('imports:errors.title', { count: errorCount, number: formatCount(errorCount, i18n.language) })}
        </h3>
        <a href={addressOf('imports.errors-file', { id: importId })} download>
          <DownloadOutlined aria-hidden /> {t('imports:errors.download')}
        </a>
      </div>
      {error && <ErrorState problem={error} size="inline" onRetry={() => void refresh()} />}
      {isLoading && <Loading />}
      {items.length > 0 && (
        <div className={styles.scroll} tabIndex={0} role="region" aria-labelledby={`errors-${importId}`}>
          <table className={`${styles.table} ${styles.errorTable}`}>
            <thead>
              <tr>
                <th scope="col">{t('imports:errors.line')}</th>
                <th scope="col">{t('imports:errors.column')}</th>
                <th scope="col">{t('imports:errors.value')}</th>
                <th scope="col">{t('imports:errors.reason')}</th>
                <th scope="col">{t('imports:errors.remedy')}</th>
              </tr>
            </thead>
            <tbody>
              {items.map((fault) => (
                <tr key={`${fault.line} ${fault.column} ${fault.code}`}>
                  <td className="figures">{formatCount(fault.line, i18n.language)}</td>
                  <td>
                    <code>{fault.column}</code>
                  </td>
                  <td className={styles.value}>
                    {fault.value === '' ? <em>{t('imports:errors.blank')}</em> : fault.value}
                  </td>
                  <td>{fault.reason}</td>
                  <td>{fault.remedy}</td>
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
