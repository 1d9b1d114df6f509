import type { FlagRow } from '@quarterpoise/dto';
import { Form, Input, Modal } from 'antd';
import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import type { ProblemError } from '../../../lib/problem';
import type { Decision } from '../api/decide-flags';

interface DecisionDialogProps {
  decision: Decision;
  flags: FlagRow[];
  isBusy: boolean;
  problem: ProblemError | null;
  onDecide(reason: string, message: string | null): Promise<void>;
  onClose(): void;
}

interface Fields {
  reason: string;
  message?: string;
}

/** Asks for the reason, and on a hold for the message that the participant will read. */
export function DecisionDialog({ decision, flags, isBusy, problem, onDecide, onClose }: DecisionDialogProps) {
  const { t } = useTranslation(['review', 'shell']);
  const [form] = Form.useForm<Fields>();
  const [only] = flags.length === 1 ? flags : [];
  const who = only ? `${only.participantNumber ?? ''} ${only.name ?? t('review:wholePlan')}`.trim() : '';
  return (
    <Modal
      open
      title={
        only ? t(`review:ask.${decision}.one`, { who }) : t(`review:ask.${decision}.many`, { count: flags.length })
      }
      okText={t(`review:ask.${decision}.confirm`)}
      cancelText={t('shell:cancel')}
      okButtonProps={{ loading: isBusy, autoFocus: false }}
      onOk={() => form.submit()}
      onCancel={onClose}
    >
      <p style={{ marginBottom: 12 }}>{t(`review:ask.${decision}.text`)}</p>
      <Form<Fields>
        form={form}
        layout="vertical"
        requiredMark={false}
        onFinish={(fields) => void onDecide(fields.reason.trim(), fields.message?.trim() || null)}
      >
        <Form.Item
          name="reason"
          label={t('review:ask.reason')}
          rules={[{ required: true, whitespace: true, message: t('review:ask.reasonNeeded') }]}
        >
          <Input.TextArea
            autoFocus
            rows={2}
            maxLength={500}
            onPressEnter={(event) => {
              if (event.shiftKey || decision === 'held') return;
              event.preventDefault();
              form.submit();
            }}
          />
        </Form.Item>
        {decision === 'held' && (
          <Form.Item
            name="message"
            label={t('review:ask.message')}
            extra={t('review:ask.messageHint')}
            rules={[{ required: true, whitespace: true, message: t('review:ask.messageNeeded') }]}
          >
            <Input.TextArea rows={4} maxLength={1000} />
          </Form.Item>
        )}
      </Form>
      {problem && <ErrorState problem={problem} size="inline" />}
    </Modal>
  );
}
