import { useEffect, useRef, useState } from 'react';
import { addressOf } from './api-client';
import type { RouteId } from './routes';

type EventRouteId = Extract<RouteId, `${string}.events`>;

const FIRST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 15_000;

export interface EventHandlers<Progress> {
  onProgress(progress: Progress): void;
  onFinished(): void;
  /** The line is down (true) or up again (false); the wrapper keeps trying by itself. */
  onInterrupted?(isInterrupted: boolean): void;
  /** The service refused the stream: the work may have ended meanwhile, or the sign-in. */
  onRefused?(): void;
}

/**
 * Listens to a progress stream until it says `finished`. EventSource comes back by itself after a dropped line, but gives up on an
 * HTTP error (a restart of the service); that is tried again here with growing pauses. Returns the function that stops listening.
 */
export function listen<Progress>(id: EventRouteId, resourceId: string, handlers: EventHandlers<Progress>): () => void {
  let source: EventSource | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let waitMs = FIRST_WAIT_MS;
  let isStopped = false;

  const stop = () => {
    isStopped = true;
    clearTimeout(timer);
    source?.close();
  };
  const open = () => {
    source = new EventSource(addressOf(id, { id: resourceId }), { withCredentials: true });
    source.onopen = () => {
      waitMs = FIRST_WAIT_MS;
      handlers.onInterrupted?.(false);
    };
    source.addEventListener('progress', (event) => {
      handlers.onProgress(JSON.parse((event as MessageEvent<string>).data) as Progress);
    });
    source.addEventListener('finished', (event) => {
      stop();
      const { data } = event as MessageEvent<string | undefined>;
      if (data) handlers.onProgress(JSON.parse(data) as Progress);
      handlers.onFinished();
    });
    source.onerror = () => {
      if (isStopped) return;
      handlers.onInterrupted?.(true);
      if (source?.readyState !== EventSource.CLOSED) return;
      handlers.onRefused?.();
      timer = setTimeout(open, waitMs);
      waitMs = Math.min(waitMs * 2, LONGEST_WAIT_MS);
    };
  };
  open();
  return stop;
}

/**
 * The newest progress of a resource while `isGoing`. `readAnew` is called when the work has ended and when the stream is refused; that
 * read then finds the outcome, or that nobody is signed in any more.
 */
export function useProgressEvents<Progress>(
  id: EventRouteId,
  resourceId: string,
  isGoing: boolean,
  readAnew: () => void,
): { progress: Progress | null; isInterrupted: boolean } {
  const [progress, setProgress] = useState<Progress | null>(null);
  const [isInterrupted, setInterrupted] = useState(false);
  const newest = useRef(readAnew);
  useEffect(() => {
    newest.current = readAnew;
  });

  useEffect(() => {
    if (!isGoing) return;
    return listen<Progress>(id, resourceId, {
      onProgress: setProgress,
      onFinished: () => newest.current(),
      onRefused: () => newest.current(),
      onInterrupted: setInterrupted,
    });
  }, [id, resourceId, isGoing]);

  return { progress, isInterrupted };
}
