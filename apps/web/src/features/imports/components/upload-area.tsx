import type { ImportView } from '@quarterpoise/dto';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { FileDrop } from './file-drop';
import styles from './imports.module.css';
import { LiveImport } from './live-import';
import { UploadForm } from './upload-form';

interface UploadAreaProps {
  planId: string;
  quarterId: string;
  filePath(importId: string): string;
  onChanged(): void;
}

interface Entry {
  key: number;
  file: File;
  uploaded: ImportView | null;
}

let nextKey = 0;

/** Drop the quarter's files here; each gets its own card, from control totals to the outcome of the check. */
export function UploadArea({ planId, quarterId, filePath, onChanged }: UploadAreaProps) {
  const { t } = useTranslation('imports');
  const [entries, setEntries] = useState<Entry[]>([]);
  const change = (key: number, uploaded: ImportView) =>
    setEntries((now) => now.map((entry) => (entry.key === key ? { ...entry, uploaded } : entry)));
  const remove = (key: number) => setEntries((now) => now.filter((entry) => entry.key !== key));

  return (
    <section aria-labelledby="upload-heading" className={styles.area}>
      <h2 id="upload-heading">{t('drop.title')}</h2>
      <FileDrop
        label={t('drop.label')}
        onFiles={(files) =>
          setEntries((now) => [...now, ...files.map((file) => ({ key: nextKey++, file, uploaded: null }))])
        }
      />
      {entries.map(({ key, file, uploaded }) =>
        uploaded ? (
          <LiveImport
            key={key}
            importId={uploaded.id}
            initial={uploaded}
            path={filePath(uploaded.id)}
            onMoved={onChanged}
          />
        ) : (
          <UploadForm
            key={key}
            planId={planId}
            quarterId={quarterId}
            file={file}
            onUploaded={(view) => {
              change(key, view);
              onChanged();
            }}
            onDropped={() => remove(key)}
          />
        ),
      )}
    </section>
  );
}
