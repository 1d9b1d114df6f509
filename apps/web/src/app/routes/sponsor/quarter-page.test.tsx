import { screen, within } from '@testing-library/react';
import type { QuarterView } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { quarterView, runSummary, uuid } from '../../../testing/builders';
import { fakeApi, Refusal } from '../../../testing/fake-api';
import { renderScreen } from '../../../testing/render-screen';
import { Component as QuarterPage } from './quarter-page';

const open = (change: Partial<QuarterView>) => {
  fakeApi({ 'quarters.view': () => quarterView(change) });
  renderScreen(<QuarterPage />, { path: `/quarters/${uuid(20)}`, pattern: '/quarters/:quarterId' });
};
const step = (name: string) => screen.getByRole('heading', { name }).closest('li') as HTMLElement;

describe('the page of a quarter', () => {
  it('tells where it stands, who has to act and by when, and marks the step whose turn it is', async () => {
    open({ state: 'collecting', currentRun: null, runs: [] });
    expect(await screen.findByRole('heading', { level: 1, name: 'Q3 2026: collecting data' })).toBeTruthy();
    expect(screen.getByText(/The plan administrator has to act next/).textContent).toContain(
      'Nov 14, 2026 (33 days left)',
    );
    expect(step('Collect').getAttribute('aria-current')).toBe('step');
    expect(step('Collect').textContent).toContain('Balancesmissing');
    expect(within(step('Collect')).getByRole('link', { name: 'Load files' })).toBeTruthy();
    expect(document.title).toBe('Q3 2026: collecting data · Quarterpoise');
  });

  it('says what the data checks found, with the count in words', async () => {
    open({
      state: 'ready',
      currentRun: null,
      runs: [],
      findings: [
        {
          code: 'balance-missing',
          severity: 'blocking',
          count: 1204,
          figures: {},
          examples: [{ participantNumber: '100417', name: 'Tom Ash', detail: 'no closing balance' }],
        },
      ],
    });
    await screen.findByText(/1,204 accounts had activity but lack an opening or closing balance/);
    expect(step('Check the data').getAttribute('aria-current')).toBe('step');
    expect(step('Check the data').textContent).toContain('Must be mended.');
    expect(step('Check the data').textContent).toContain('100417 Tom Ash: no closing balance');
  });

  it('moves on to the sign-off when every flag is decided', async () => {
    const run = runSummary({ undecidedFlagCount: 0 });
    open({ currentRun: run, runs: [run] });
    await screen.findByText(/3 flags in all/);
    expect(step('Review').textContent).toContain('all decided');
    expect(step('Sign off').getAttribute('aria-current')).toBe('step');
  });

  it('warns that the figures are stale when data came after the run', async () => {
    open({ findings: [{ code: 'figures-stale', severity: 'review', count: 1, figures: {}, examples: [] }] });
    expect(await screen.findByText(/its figures are stale/)).toBeTruthy();
  });

  it('shows a quarter that is not the reader’s as not found', async () => {
    fakeApi({ 'quarters.view': () => new Refusal(404, 'not-found') });
    renderScreen(<QuarterPage />, { path: `/quarters/${uuid(20)}`, pattern: '/quarters/:quarterId' });
    expect((await screen.findByRole('alert')).textContent).toContain('It does not exist, or is not yours to see.');
  });
});
