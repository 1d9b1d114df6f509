import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { importView, uuid } from '../../../testing/builders';
import { fakeApi, Refusal } from '../../../testing/fake-api';
import { fakeEventSource } from '../../../testing/fake-event-source';
import { renderScreen } from '../../../testing/render-screen';
import { LiveImport } from './live-import';

const id = uuid(40);
let events: ReturnType<typeof fakeEventSource>;

beforeEach(() => {
  events = fakeEventSource();
});

describe('a file on its way', () => {
  it('shows stated beside counted control totals when they differ, and offers no loading', async () => {
    fakeApi({
      'imports.view': () =>
        importView({
          state: 'refused',
          counted: { rows: 1199, sum: '449999.93' },
          changes: null,
          problem: { code: 'import-control-total-mismatch', detail: '1,199 rows were counted, 1,200 were stated.' },
        }),
    });
    renderScreen(<LiveImport importId={id} />);
    const alert = await screen.findByRole('alert');
    expect(alert.textContent).toContain('The control totals do not match');
    expect(alert.textContent).toContain('nothing has been loaded');
    const rows = within(screen.getByRole('table', { name: 'Control totals' })).getAllByRole('row');
    expect(rows[1]?.textContent).toBe('Rows1,2001,199−1differs');
    expect(rows[2]?.textContent).toBe('Sum of amounts$450,000.00$449,999.93−$0.07differs');
    expect(screen.queryByRole('button', { name: 'Load this file' })).toBeNull();
  });

  it('lists every faulty row with line, column, value, reason and remedy, and the CSV of them', async () => {
    fakeApi({
      'imports.view': () =>
        importView({
          state: 'refused',
          errorCount: 1,
          problem: { code: 'import-row-errors', detail: 'One row has an error.' },
        }),
      'imports.errors': () => ({
        items: [
          {
            line: 17,
            column: 'effective_on',
            value: '2026-02-30',
            code: 'not-a-date',
            reason: 'February has no 30th.',
            remedy: 'Write the day as YYYY-MM-DD.',
          },
        ],
        nextCursor: null,
      }),
    });
    renderScreen(<LiveImport importId={id} />);
    const row = (await screen.findByText('2026-02-30')).closest('tr');
    expect(row?.textContent).toBe('17effective_on2026-02-30February has no 30th.Write the day as YYYY-MM-DD.');
    expect(screen.getByRole('link', { name: 'Download all as CSV' }).getAttribute('href')).toBe(
      `/api/v1/imports/${id}/errors.csv`,
    );
  });

  it('follows the check by events and then shows what loading would change', async () => {
    let state: 'checking' | 'preview' = 'checking';
    fakeApi({
      'imports.view': () =>
        state === 'checking' ? importView({ state, progress: 0, counted: null, changes: null }) : importView(),
    });
    renderScreen(<LiveImport importId={id} />);
    const bar = await screen.findByRole('progressbar', { name: 'Checking the file' });
    events.opened[0]?.send('progress', { state: 'checking', progress: 0.42 });
    expect(bar.getAttribute('aria-valuenow')).toBe('42');
    state = 'preview';
    events.opened[0]?.send('finished');
    expect(await screen.findByText('What loading would change')).toBeTruthy();
    expect(screen.getByText('1,190')).toBeTruthy();
    expect(screen.getByRole('row', { name: /Contribution 1,200 \$450,000.00/ })).toBeTruthy();
  });

  it('asks once before loading, and shows a refusal in the question', async () => {
    const api = fakeApi({
      'imports.view': () => importView(),
      'imports.commit': () =>
        new Refusal(409, 'import-row-errors', { detail: 'The ledger has changed: reference A-1 exists.' }),
    });
    renderScreen(<LiveImport importId={id} />);
    fireEvent.click(await screen.findByRole('button', { name: 'Load this file' }));
    const dialog = await screen.findByRole('dialog');
    expect(api.callsOf('imports.commit')).toHaveLength(0);
    fireEvent.click(within(dialog).getByRole('button', { name: /Load this file/ }));
    expect((await within(dialog).findByRole('alert')).textContent).toContain('reference A-1 exists');
    const [call] = api.callsOf('imports.commit');
    expect(call?.headers['x-csrf-token']).toBe('csrf-1');
    expect(call?.headers['idempotency-key']).toMatch(/^[0-9a-f]{32}$/);
  });

  it('offers an auditor nothing to do', async () => {
    fakeApi({ 'imports.view': () => importView() });
    renderScreen(<LiveImport importId={id} />, { hat: 'auditor' });
    await screen.findByText('What loading would change');
    await waitFor(() => expect(screen.queryByRole('button', { name: 'Load this file' })).toBeNull());
  });
});
