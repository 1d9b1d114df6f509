import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { quarterView, runTotals, runSummary, signOffSheet, uuid } from '../../../testing/builders';
import { fakeApi, Refusal } from '../../../testing/fake-api';
import { renderScreen } from '../../../testing/render-screen';
import { SignOffSheet } from './sign-off-sheet';

const show = (sheet = signOffSheet(), canSign = true) =>
  renderScreen(
    <SignOffSheet sheet={sheet} quarterId={uuid(20)} canSign={canSign} signed={null} sample={<p>the sample</p>} />,
    { hat: 'approver' },
  );

describe('the sign-off sheet', () => {
  it('tells what ties, what differs and what was not checked', () => {
    const ties = runTotals().ties.with(1, {
      code: 'opening-to-last-published',
      expectedCents: 120_000_000,
      foundCents: 120_000_700,
      tied: false,
      checked: true,
    });
    fakeApi({});
    show(signOffSheet({ run: runSummary({ totals: runTotals({ ties }) }) }));
    const outcome = (name: RegExp) => screen.getByRole('row', { name }).children[1]?.textContent;
    expect(outcome(/control total/)).toBe('ties');
    expect(outcome(/last published/)).toBe('differs');
    expect(screen.getByRole('row', { name: /last published/ }).textContent).toContain('$7.00');
    expect(outcome(/sender reports/)).toBe('not checked');
    expect(screen.getByText(/At least one total does not tie/)).toBeTruthy();
  });

  it('gives the reason in place of the signature when the reader may not sign', () => {
    fakeApi({});
    show(signOffSheet({ refusal: { code: 'second-person-needed', detail: 'You started this run.' } }));
    expect(screen.getByText(/You cannot sign this sheet/).parentElement?.textContent).toContain(
      'You started this run.',
    );
    expect(screen.queryByRole('button', { name: 'Sign off' })).toBeNull();
  });

  it('needs the sentence ticked, then signs the very run that was shown', async () => {
    const api = fakeApi({ 'sign-off.sign': () => quarterView({ state: 'signed_off' }) });
    show();
    fireEvent.click(screen.getByRole('button', { name: 'Sign off' }));
    expect(screen.getByRole('alert').textContent).toBe('Tick the sentence to sign.');
    expect(api.callsOf('sign-off.sign')).toHaveLength(0);
    fireEvent.click(screen.getByRole('checkbox'));
    fireEvent.change(screen.getByLabelText('Remark (not required)'), {
      target: { value: 'Compared with the recordkeeper’s report' },
    });
    fireEvent.click(screen.getByRole('button', { name: 'Sign off' }));
    await waitFor(() =>
      expect(api.callsOf('sign-off.sign')[0]?.body).toEqual({
        runId: uuid(30),
        remark: 'Compared with the recordkeeper’s report',
        confirmed: true,
      }),
    );
  });

  it('shows a refusal that comes with the signature', async () => {
    fakeApi({ 'sign-off.sign': () => new Refusal(409, 'sign-off-stale') });
    show();
    fireEvent.click(screen.getByRole('checkbox'));
    fireEvent.click(screen.getByRole('button', { name: 'Sign off' }));
    expect((await screen.findByRole('alert')).textContent).toContain('The run is no longer the newest');
  });
});
