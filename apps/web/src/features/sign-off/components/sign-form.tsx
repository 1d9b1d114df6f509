import type { SignOffSheet } from '@quarterpoise/dto';
import { Button, Checkbox, Input } from 'antd';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import { Note } from '../../../components/note';
import { useSign } from '../api/sign';
import styles from './sign-off.module.css';

interface SignFormProps {
  sheet: SignOffSheet;
  quarterId: string;
  canSign: boolean;
}

/** The signature: refused with its reason, or given with a confirmation and, if wanted, a remark. */
export function SignForm({ sheet, quarterId, canSign }: SignFormProps) {
  const { t } = useTranslation('sign-off');
  const [isConfirmed, setConfirmed] = useState(false);
  const [isAsked, setAsked] = useState(false);
  const [remark, setRemark] = useState('');
  const { sign, isBusy, problem } = useSign(quarterId);

  if (sheet.refusal) {
    return (
      <Note tone="attention">
        <p>
          <strong>{t('refused')}</strong> {sheet.refusal.detail}
        </p>
      </Note>
    );
  }
  if (!canSign) return <p className="quiet">{t('approverOnly')}</p>;
  return (
    <form
      className={styles.form}
      onSubmit={(event) => {
        event.preventDefault();
        setAsked(true);
        if (isConfirmed) void sign(sheet.run.id, remark.trim());
      }}
    >
      <div>
        <Checkbox checked={isConfirmed} onChange={(event) => setConfirmed(event.target.checked)}>
          {t('confirm')}
        </Checkbox>
        {isAsked && !isConfirmed && (
          <p role="alert" className={styles.fault}>
            {t('confirmNeeded')}
          </p>
        )}
      </div>
      <label className={styles.remark}>
        {t('remark')}
        <Input.TextArea rows={2} maxLength={500} value={remark} onChange={(event) => setRemark(event.target.value)} />
      </label>
      <p className="quiet">{t('consequence')}</p>
      {problem && <ErrorState problem={problem} size="inline" />}
      <div>
        <Button type="primary" htmlType="submit" loading={isBusy}>
          {t('sign')}
        </Button>
      </div>
    </form>
  );
}
