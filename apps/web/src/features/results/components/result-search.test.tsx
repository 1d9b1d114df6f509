import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { resultRow, uuid } from '../../../testing/builders';
import { fakeApi } from '../../../testing/fake-api';
import { renderScreen } from '../../../testing/render-screen';
import { ResultSearch } from './result-search';

describe('the results of a run', () => {
  it('are searched by the service while typing, and say when nobody is found', async () => {
    const api = fakeApi({
      'runs.results': ({ query }) => ({ items: query['search'] ? [] : [resultRow(1)], nextCursor: null }),
    });
    renderScreen(<ResultSearch runId={uuid(30)} />);
    expect((await screen.findByText('Person 1')).closest('tr')?.textContent).toContain(
      '$18,000.00▲+$439.20$18,689.20▲+2.41%',
    );
    fireEvent.change(screen.getByLabelText('Find by name or participant number'), { target: { value: 'Quince' } });
    expect(await screen.findByText('Nobody found for “Quince”')).toBeTruthy();
    expect(api.callsOf('runs.results').at(-1)?.query).toMatchObject({ search: 'Quince' });
  });

  it('say in words why an account has no rate', async () => {
    fakeApi({
      'runs.results': () => ({
        items: [
          resultRow(1, {
            status: 'not-computed',
            reason: 'closing-balance-missing',
            periodReturnPct: null,
            closingCents: null,
          }),
        ],
        nextCursor: null,
      }),
    });
    renderScreen(<ResultSearch runId={uuid(30)} />);
    const row = (await screen.findByText('Person 1')).closest('tr');
    expect(row?.textContent).toContain('not computed');
    expect(row?.textContent).toContain('the closing balance is missing');
  });

  it('bring the next page on demand', async () => {
    const api = fakeApi({
      'runs.results': ({ query }) =>
        query['cursor'] === 'c2'
          ? { items: [resultRow(2)], nextCursor: null }
          : { items: [resultRow(1)], nextCursor: 'c2' },
    });
    renderScreen(<ResultSearch runId={uuid(30)} />);
    fireEvent.click(await screen.findByRole('button', { name: 'Show more' }));
    expect(await screen.findByText('Person 2')).toBeTruthy();
    expect(screen.getByText('Person 1')).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Show more' })).toBeNull();
    expect(api.callsOf('runs.results').map((call) => call.query['cursor'])).toContain('c2');
  });
});
