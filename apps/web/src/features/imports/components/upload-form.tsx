import type { ImportKind, ImportView } from '@quarterpoise/dto';
import { Button, Form, Input, Select } from 'antd';
import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import { ProgressBar } from '../../../components/progress-bar';
import { formatBytes } from '../../../lib/format';
import { faultOf } from '../../../lib/problem';
import { useUpload } from '../api/use-upload';
import { HAS_SUM, IMPORT_KINDS, kindOfName, plainAmount, plainCount } from '../lib/import-kinds';
import styles from './imports.module.css';

interface UploadFormProps {
  planId: string;
  quarterId: string;
  file: File;
  onUploaded(view: ImportView): void;
  onDropped(): void;
}

interface Fields {
  kind: ImportKind;
  statedRows: string;
  statedSum?: string;
}

/** One chosen file: what it is and the control totals that came with it, then the upload with its progress. */
export function UploadForm({ planId, quarterId, file, onUploaded, onDropped }: UploadFormProps) {
  const { t, i18n } = useTranslation('imports');
  const [form] = Form.useForm<Fields>();
  const kind = Form.useWatch('kind', form);
  const { share, problem, start, stop } = useUpload(planId);
  const isSending = share !== null;
  const id = (field: string) => `${field}-${file.name}`;

  async function send({ kind: chosen, statedRows, statedSum }: Fields) {
    const view = await start(
      {
        kind: chosen,
        quarterId,
        statedRows: plainCount(statedRows) ?? 0,
        ...(HAS_SUM[chosen] && { statedSum: plainAmount(statedSum ?? '') ?? '' }),
      },
      file,
    );
    if (view) onUploaded(view);
  }

  const serverFault = (field: string) => {
    const fault = faultOf(problem, field);
    return fault === undefined ? {} : { validateStatus: 'error' as const, help: fault };
  };
  return (
    <div className={styles.card}>
      <p>
        <strong>{file.name}</strong> <span className="quiet figures">{formatBytes(file.size, i18n.language)}</span>
      </p>
      <Form<Fields>
        form={form}
        layout="vertical"
        requiredMark={false}
        disabled={isSending}
        initialValues={{ kind: kindOfName(file.name), statedRows: '', statedSum: '' }}
        onFinish={(fields) => void send(fields)}
        className={styles.form ?? ''}
      >
        <Form.Item
          name="kind"
          label={t('form.kind')}
          htmlFor={id('kind')}
          rules={[{ required: true, message: t('form.kindNeeded') }]}
          {...serverFault('kind')}
        >
          <Select id={id('kind')} options={IMPORT_KINDS.map((value) => ({ value, label: t(`kind.${value}`) }))} />
        </Form.Item>
        <Form.Item
          name="statedRows"
          label={t('form.rows')}
          htmlFor={id('rows')}
          extra={t('form.rowsHint')}
          rules={[
            {
              validator: (_, value: string) =>
                plainCount(value) === null ? Promise.reject(new Error(t('form.rowsNeeded'))) : Promise.resolve(),
            },
          ]}
          {...serverFault('statedRows')}
        >
          <Input id={id('rows')} inputMode="numeric" autoComplete="off" />
        </Form.Item>
        {kind && HAS_SUM[kind] && (
          <Form.Item
            name="statedSum"
            label={t(`form.sum.${kind}`)}
            htmlFor={id('sum')}
            extra={t('form.sumHint')}
            rules={[
              {
                validator: (_, value: string) =>
                  plainAmount(value) === null ? Promise.reject(new Error(t('form.sumNeeded'))) : Promise.resolve(),
              },
            ]}
            {...serverFault('statedSum')}
          >
            <Input id={id('sum')} inputMode="decimal" autoComplete="off" />
          </Form.Item>
        )}
        <div className={styles.buttons}>
          {!isSending && (
            <Button type="primary" htmlType="submit">
              {t('form.upload')}
            </Button>
          )}
          {!isSending && <Button onClick={onDropped}>{t('form.drop')}</Button>}
        </div>
      </Form>
      {isSending && (
        <>
          <ProgressBar
            label={t('form.sending', { name: file.name })}
            share={share}
            text={t('form.sent', {
              done: formatBytes(file.size * share, i18n.language),
              all: formatBytes(file.size, i18n.language),
            })}
          />
          <div>
            <Button onClick={stop}>{t('form.stop')}</Button>
          </div>
        </>
      )}
      {problem && <ErrorState problem={problem} size="inline" />}
    </div>
  );
}
