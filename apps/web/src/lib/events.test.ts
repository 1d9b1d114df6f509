import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { fakeEventSource } from '../testing/fake-event-source';
import { listen } from './events';

let events: ReturnType<typeof fakeEventSource>;
const handlers = { onProgress: vi.fn(), onFinished: vi.fn(), onInterrupted: vi.fn(), onRefused: vi.fn() };

beforeEach(() => {
  vi.useFakeTimers();
  vi.clearAllMocks();
  events = fakeEventSource();
});

afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

describe('listening to progress', () => {
  it('hands on each step and the last one, and closes the line at the end', () => {
    listen('runs.events', 'r1', handlers);
    events.opened[0]?.send('progress', { doneCount: 1 });
    events.opened[0]?.send('finished', { doneCount: 2 });
    expect(handlers.onProgress.mock.calls).toEqual([[{ doneCount: 1 }], [{ doneCount: 2 }]]);
    expect(handlers.onFinished).toHaveBeenCalledOnce();
    expect(events.opened[0]?.readyState).toBe(events.CLOSED);
  });

  it('leaves a dropped line to the browser, which comes back by itself', () => {
    listen('runs.events', 'r1', handlers);
    events.opened[0]?.fail(false);
    vi.advanceTimersByTime(60_000);
    expect(handlers.onInterrupted).toHaveBeenCalledWith(true);
    expect(handlers.onRefused).not.toHaveBeenCalled();
    expect(events.opened).toHaveLength(1);
  });

  it('tries a refused stream again with growing pauses and says so, until it is stopped', () => {
    const stop = listen('imports.events', 'i1', handlers);
    const pauses = [1_000, 2_000, 4_000, 8_000, 15_000, 15_000];
    pauses.forEach((pause, tries) => {
      events.opened[tries]?.fail(true);
      vi.advanceTimersByTime(pause - 1);
      expect(events.opened).toHaveLength(tries + 1);
      vi.advanceTimersByTime(1);
      expect(events.opened).toHaveLength(tries + 2);
    });
    expect(handlers.onRefused).toHaveBeenCalledTimes(pauses.length);
    stop();
    vi.advanceTimersByTime(60_000);
    expect(events.opened).toHaveLength(pauses.length + 1);
  });
});
