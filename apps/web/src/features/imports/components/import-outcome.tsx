import type { ImportView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { Note } from '../../../components/note';
import { ChangePreview } from './change-preview';
import { ControlTotals } from './control-totals';
import { ImportRefusal } from './import-refusal';
import { RowErrors } from './row-errors';
import { SettleImport } from './settle-import';

/** How the check of a file came out, and what can be done about it. */
export function ImportOutcome({ file }: { file: ImportView }) {
  const { t } = useTranslation('imports');
  const hasErrors = file.errorCount > 0;
  const hasMismatch = file.problem?.code === 'import-control-total-mismatch';
  return (
    <>
      {file.problem && <ImportRefusal problem={file.problem} />}
      {file.state === 'unchanged' && <Note>{t('unchanged')}</Note>}
      {file.state === 'discarded' && <Note>{t('discarded')}</Note>}
      {file.state === 'committed' && (
        <Note>
          {t('committed', { name: file.committedByName ?? '' })}{' '}
          {file.committedAt !== null && <Moment at={file.committedAt} />}
        </Note>
      )}
      {file.notices.map((notice) => (
        <Note key={`${notice.code} ${notice.value}`}>{t(`notice.${notice.code}`, { value: notice.value })}</Note>
      ))}
      {file.counted && (
        <ControlTotals stated={file.stated} counted={file.counted} kind={file.kind} isMismatch={hasMismatch} />
      )}
      {hasErrors && <RowErrors importId={file.id} errorCount={file.errorCount} />}
      {file.changes && <ChangePreview file={file} changes={file.changes} />}
      {file.state === 'preview' && <SettleImport file={file} />}
    </>
  );
}
