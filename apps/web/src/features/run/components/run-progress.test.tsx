import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { quarterView, runSummary, uuid } from '../../../testing/builders';
import { fakeApi, Refusal } from '../../../testing/fake-api';
import { fakeEventSource } from '../../../testing/fake-event-source';
import { renderScreen } from '../../../testing/render-screen';
import { RunPanel } from './run-panel';
import { RunProgress } from './run-progress';

const going = runSummary({ state: 'computing', accountCount: 2400, doneCount: 0, totals: null, finishedAt: null });
let events: ReturnType<typeof fakeEventSource>;

beforeEach(() => {
  events = fakeEventSource();
});

const progress = (doneCount: number) => ({
  state: 'computing',
  accountCount: 2400,
  doneCount,
  flagCount: 7,
  notComputedCount: 2,
  accountsPerSecond: 812.4,
  secondsLeft: 2.1,
});

describe('a run that is going', () => {
  it('shows accounts done, rate, time left and flags as events come', () => {
    fakeApi({});
    renderScreen(<RunProgress run={going} canCancel={false} />);
    expect(events.opened[0]?.url).toBe(`/api/v1/runs/${uuid(30)}/events`);
    events.opened[0]?.send('progress', progress(1200));
    expect(screen.getByRole('progressbar').getAttribute('aria-valuenow')).toBe('50');
    expect(screen.getByRole('progressbar').getAttribute('aria-valuetext')).toBe('1,200 of 2,400 accounts done');
    expect(screen.getByText('812 accounts a second')).toBeTruthy();
    expect(screen.getByText('about 3 seconds')).toBeTruthy();
    expect(screen.getByText('7')).toBeTruthy();
  });

  it('says that the line is down and comes back by itself', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    fakeApi({});
    renderScreen(<RunProgress run={going} canCancel={false} />);
    events.opened[0]?.fail(true);
    expect(screen.getByText(/The line is down/)).toBeTruthy();
    await act(() => vi.advanceTimersByTimeAsync(1_100));
    expect(events.opened).toHaveLength(2);
    act(() => events.opened[1]?.onopen?.());
    expect(screen.queryByText(/The line is down/)).toBeNull();
  });

  it('asks once before cancelling', async () => {
    const api = fakeApi({ 'runs.cancel': () => runSummary({ state: 'cancelled' }) });
    renderScreen(<RunProgress run={going} canCancel />);
    fireEvent.click(screen.getByRole('button', { name: 'Cancel the run' }));
    const dialog = await screen.findByRole('dialog');
    expect(api.callsOf('runs.cancel')).toHaveLength(0);
    fireEvent.click(within(dialog).getByRole('button', { name: 'Cancel the run' }));
    await waitFor(() => expect(api.callsOf('runs.cancel')).toHaveLength(1));
  });
});

describe('starting a run', () => {
  const ready = (allowed: boolean, reason: string | null = null) =>
    quarterView({
      state: 'ready',
      currentRun: null,
      runs: [],
      actions: [
        { action: 'run', allowed, reason },
        { action: 'rehearse', allowed, reason },
      ],
    });

  it('starts a rehearsal as such', async () => {
    const api = fakeApi({ 'runs.start': () => runSummary({ isRehearsal: true }) });
    renderScreen(<RunPanel quarter={ready(true)} runPath={(id) => id} />);
    fireEvent.click(screen.getByRole('button', { name: 'Rehearse' }));
    fireEvent.click(within(await screen.findByRole('dialog')).getByRole('button', { name: 'Start the rehearsal' }));
    await waitFor(() => expect(api.callsOf('runs.start')[0]?.body).toEqual({ isRehearsal: true }));
  });

  it('tells why it cannot be started', () => {
    fakeApi({});
    renderScreen(<RunPanel quarter={ready(false, 'The balances file is missing.')} runPath={(id) => id} />);
    expect((screen.getByRole('button', { name: 'Start the run' }) as HTMLButtonElement).disabled).toBe(true);
    expect(screen.getByText('The balances file is missing.')).toBeTruthy();
  });

  it('keeps the question open and shows why when the service refuses', async () => {
    fakeApi({ 'runs.start': () => new Refusal(409, 'run-already-going') });
    renderScreen(<RunPanel quarter={ready(true)} runPath={(id) => id} />);
    fireEvent.click(screen.getByRole('button', { name: 'Start the run' }));
    const dialog = await screen.findByRole('dialog');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Start the run' }));
    expect((await within(dialog).findByRole('alert')).textContent).toContain('A run is already going');
  });
});
