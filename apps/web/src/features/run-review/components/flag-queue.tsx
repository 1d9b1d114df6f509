import type { FlagRow } from '@quarterpoise/dto';
import { Button } from 'antd';
import { useEffect, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { useDecideFlags, type Decision } from '../api/decide-flags';
import { useFlags, type FlagFilter } from '../api/use-flags';
import { entriesOf, useQueueKeys } from '../lib/use-queue-keys';
import { DecisionDialog } from './decision-dialog';
import { FlagFilters } from './flag-filters';
import { FlagItem } from './flag-item';
import { KeyboardHelp } from './keyboard-help';
import styles from './run-review.module.css';

interface FlagQueueProps {
  runId: string;
  canDecide: boolean;
}

/** Flags worst first, to be worked down by keyboard or mouse: j and k move, x marks, a accepts, h holds, r reopens. */
export function FlagQueue({ runId, canDecide }: FlagQueueProps) {
  const { t } = useTranslation(['review', 'shell']);
  const [filter, setFilter] = useState<FlagFilter>({ undecided: true, code: null });
  const flags = useFlags(runId, filter);
  const { decide, isBusy, problem, clearProblem } = useDecideFlags(runId, flags.refresh);
  const [position, setPosition] = useState(0);
  const [marked, setMarked] = useState<ReadonlySet<string>>(new Set());
  const [asked, setAsked] = useState<{ decision: Decision; flags: FlagRow[] } | null>(null);
  const [told, setTold] = useState('');
  const list = useRef<HTMLUListElement>(null);
  const report = useRef<HTMLParagraphElement>(null);
  const last = Math.max(0, flags.items.length - 1);
  const current = Math.min(position, last);

  const chosen = (): FlagRow[] => {
    const picked = flags.items.filter((flag) => marked.has(flag.id));
    const here = flags.items[current];
    return picked.length > 0 ? picked : here ? [here] : [];
  };
  const ask = (decision: Decision, wanted = chosen()) => {
    if (!canDecide || wanted.length === 0) return;
    clearProblem();
    setAsked({ decision, flags: wanted });
  };
  const mark = (id: string) =>
    setMarked((now) => {
      const next = new Set(now);
      if (!next.delete(id)) next.add(id);
      return next;
    });
  const moveTo = (to: number) => {
    const next = Math.min(Math.max(to, 0), last);
    setPosition(next);
    entriesOf(list.current)[next]?.focus();
  };

  const wasAsked = useRef(false);
  useEffect(() => {
    // When the question is gone the focus goes back into the queue, or to what was told when the queue is empty.
    if (wasAsked.current && asked === null) (entriesOf(list.current)[current] ?? report.current)?.focus();
    wasAsked.current = asked !== null;
  }, [asked, current]);

  useQueueKeys(list, {
    onEnter: setPosition,
    keys: {
      j: () => moveTo(current + 1),
      ArrowDown: () => moveTo(current + 1),
      k: () => moveTo(current - 1),
      ArrowUp: () => moveTo(current - 1),
      Home: () => moveTo(0),
      End: () => moveTo(last),
      x: () => flags.items[current] && canDecide && mark(flags.items[current].id),
      a: () => ask('accepted'),
      h: () => ask('held'),
      r: () => ask('reopened'),
    },
  });

  return (
    <div className={styles.queue}>
      <FlagFilters
        filter={filter}
        onChange={(next) => {
          setFilter(next);
          setPosition(0);
          setMarked(new Set());
        }}
      />
      {canDecide && <KeyboardHelp />}
      {marked.size > 0 && (
        <div className={styles.bulk} role="region" aria-label={t('review:bulk.label')}>
          <span>{t('review:bulk.marked', { count: marked.size })}</span>
          <Button onClick={() => ask('accepted')}>{t('review:accept')}</Button>
          <Button onClick={() => ask('held')}>{t('review:hold')}</Button>
          <Button type="text" onClick={() => setMarked(new Set())}>
            {t('review:bulk.clear')}
          </Button>
        </div>
      )}
      <p ref={report} role="status" tabIndex={-1} className={told === '' ? 'visually-hidden' : styles.told}>
        {told}
      </p>
      {flags.error && <ErrorState problem={flags.error} size="inline" onRetry={() => void flags.refresh()} />}
      {flags.isLoading && <Loading lines={8} />}
      {!flags.isLoading && !flags.error && flags.items.length === 0 && (
        <EmptyState
          title={filter.undecided ? t('review:empty.decided') : t('review:empty.none')}
          text={filter.undecided ? t('review:empty.decidedText') : t('review:empty.noneText')}
        />
      )}
      <ul ref={list} className={styles.flags} aria-label={t('review:title')}>
        {flags.items.map((flag, index) => (
          <FlagItem
            key={flag.id}
            flag={flag}
            isCurrent={index === current}
            isMarked={marked.has(flag.id)}
            canDecide={canDecide}
            onMark={() => mark(flag.id)}
            onAsk={(decision) => ask(decision, [flag])}
          />
        ))}
      </ul>
      {flags.hasMore && (
        <div>
          <Button onClick={flags.loadMore} loading={flags.isLoadingMore}>
            {t('shell:loadMore')}
          </Button>
        </div>
      )}
      {asked && (
        <DecisionDialog
          decision={asked.decision}
          flags={asked.flags}
          isBusy={isBusy}
          problem={problem}
          onClose={() => setAsked(null)}
          onDecide={async (reason, message) => {
            const count = asked.flags.length;
            const input = { flagIds: asked.flags.map((flag) => flag.id), decision: asked.decision, reason };
            if (!(await decide(message === null ? input : { ...input, message }))) return;
            setMarked(new Set());
            setAsked(null);
            setTold(t(`review:told.${asked.decision}`, { count }));
          }}
        />
      )}
    </div>
  );
}
