import { Button, Modal, type ButtonProps } from 'antd';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { ProblemError } from '../lib/problem';
import { ErrorState } from './error-state';

interface ConfirmButtonProps {
  label: string;
  /** What is about to happen, and whether it can be undone. */
  title: string;
  text: ReactNode;
  confirmLabel: string;
  type?: ButtonProps['type'];
  danger?: boolean;
  disabled?: boolean;
  isBusy?: boolean;
  problem?: ProblemError | null;
  /** Resolves with true when done; the question closes then and stays open on a refusal. */
  onConfirm(): Promise<boolean>;
}

/** A button that asks once before it acts; a refusal is shown in the question itself. */
export function ConfirmButton(props: ConfirmButtonProps) {
  const { t } = useTranslation('shell');
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <Button
        type={props.type ?? 'default'}
        danger={props.danger ?? false}
        disabled={props.disabled ?? false}
        onClick={() => setOpen(true)}
      >
        {props.label}
      </Button>
      <Modal
        open={isOpen}
        title={props.title}
        okText={props.confirmLabel}
        cancelText={t('cancel')}
        okButtonProps={{ danger: props.danger ?? false, loading: props.isBusy ?? false }}
        onCancel={() => setOpen(false)}
        onOk={async () => {
          if (await props.onConfirm()) setOpen(false);
        }}
        destroyOnHidden
      >
        <div style={{ display: 'grid', gap: 12 }}>
          <div>{props.text}</div>
          {props.problem && <ErrorState problem={props.problem} size="inline" />}
        </div>
      </Modal>
    </>
  );
}
