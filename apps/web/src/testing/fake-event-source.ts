import { act } from '@testing-library/react';
import { vi } from 'vitest';

/** An EventSource whose events the test sends itself. */
export class FakeEventSource extends EventTarget {
  static opened: FakeEventSource[] = [];
  static readonly CLOSED = 2;
  readyState = 1;
  onopen: (() => void) | null = null;
  onerror: (() => void) | null = null;

  constructor(readonly url: string) {
    super();
    FakeEventSource.opened.push(this);
  }

  close(): void {
    this.readyState = FakeEventSource.CLOSED;
  }

  send(name: 'progress' | 'finished', data?: unknown): void {
    act(() => {
      this.dispatchEvent(new MessageEvent(name, { data: data === undefined ? '' : JSON.stringify(data) }));
    });
  }

  /** The line breaks; `isFinal` as after an HTTP error, when the browser gives up. */
  fail(isFinal: boolean): void {
    if (isFinal) this.readyState = FakeEventSource.CLOSED;
    act(() => this.onerror?.());
  }
}

export function fakeEventSource(): typeof FakeEventSource {
  FakeEventSource.opened = [];
  vi.stubGlobal('EventSource', FakeEventSource);
  return FakeEventSource;
}
