import { useEffect, useRef, type RefObject } from 'react';

interface QueueKeys {
  /** What each key does, by the name that the browser gives it. */
  keys: Record<string, () => void>;
  /** The focus came to the entry at this place, by key, mouse or screen reader. */
  onEnter(index: number): void;
}

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('input:not([type=checkbox]), textarea, select') !== null;

/** The entries of a list, in order. */
export const entriesOf = (list: HTMLElement | null): HTMLElement[] =>
  Array.from(list?.children ?? []).filter((child) => child instanceof HTMLElement);

/**
 * Keys of a queue. They work while the focus is in the list and nowhere else, so that single letters never get in the way of typing,
 * dictation or the browser's own keys.
 */
export function useQueueKeys(list: RefObject<HTMLElement | null>, queue: QueueKeys): void {
  const newest = useRef(queue);
  useEffect(() => {
    newest.current = queue;
  });
  useEffect(() => {
    const element = list.current;
    if (!element) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (isTyping(event.target) || event.ctrlKey || event.metaKey || event.altKey) return;
      const act = newest.current.keys[event.key];
      if (!act) return;
      event.preventDefault();
      act();
    };
    const onFocusIn = (event: FocusEvent) => {
      const index = entriesOf(element).findIndex((entry) => entry.contains(event.target as Node));
      if (index >= 0) newest.current.onEnter(index);
    };
    element.addEventListener('keydown', onKeyDown);
    element.addEventListener('focusin', onFocusIn);
    return () => {
      element.removeEventListener('keydown', onKeyDown);
      element.removeEventListener('focusin', onFocusIn);
    };
  }, [list]);
}
