import { Button, Input } from 'antd';
import { useDeferredValue, useEffect, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { useResults } from '../api/use-results';
import { ResultTable } from './result-table';
import styles from './results.module.css';

const PAUSE_MS = 300;

/** Every result of a run, searched by name or number while typing. */
export function ResultSearch({ runId }: { runId: string }) {
  const { t } = useTranslation(['results', 'shell']);
  const [typed, setTyped] = useState('');
  const [search, setSearch] = useState('');
  useEffect(() => {
    const timer = setTimeout(() => setSearch(typed.trim()), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed]);
  const { items, isLoading, isLoadingMore, hasMore, error, loadMore, refresh } = useResults(runId, search);
  const rows = useDeferredValue(items);
  return (
    <div className={styles.area}>
      <label className={styles.search}>
        {t('results:search')}
        <Input
          type="search"
          allowClear
          value={typed}
          maxLength={80}
          onChange={(event) => setTyped(event.target.value)}
        />
      </label>
      {error && <ErrorState problem={error} size="inline" onRetry={() => void refresh()} />}
      {isLoading && <Loading lines={8} />}
      {!isLoading && !error && rows.length === 0 && (
        <EmptyState
          title={search === '' ? t('results:emptyTitle') : t('results:notFoundTitle', { search })}
          text={search === '' ? t('results:emptyText') : t('results:notFoundText')}
        />
      )}
      {rows.length > 0 && <ResultTable rows={rows} label={t('results:title')} />}
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
