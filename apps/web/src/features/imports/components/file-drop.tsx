import { UploadOutlined } from '@ant-design/icons';
import { useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import styles from './imports.module.css';

interface FileDropProps {
  /** Names the field for screen readers. */
  label: string;
  onFiles(files: File[]): void;
}

/** A place to drop files on; the button inside does the same by keyboard. */
export function FileDrop({ label, onFiles }: FileDropProps) {
  const { t } = useTranslation('imports');
  const [isOver, setOver] = useState(false);
  const field = useRef<HTMLInputElement>(null);
  return (
    <div
      className={`${styles.drop} ${isOver ? styles.over : ''}`}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        const files = [...event.dataTransfer.files];
        if (files.length > 0) onFiles(files);
      }}
    >
      <p>{t('drop.text')}</p>
      <input
        ref={field}
        type="file"
        multiple
        aria-label={label}
        className="visually-hidden"
        tabIndex={-1}
        onChange={(event) => {
          const files = [...(event.target.files ?? [])];
          event.target.value = '';
          if (files.length > 0) onFiles(files);
        }}
      />
      <button type="button" className={styles.choose} onClick={() => field.current?.click()}>
        <UploadOutlined aria-hidden /> {t('drop.choose')}
      </button>
    </div>
  );
}
