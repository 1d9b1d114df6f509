import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { quarterView, uuid } from '../../../testing/builders';
import { fakeApi } from '../../../testing/fake-api';
import { renderScreen } from '../../../testing/render-screen';
import { PublishPanel } from './publish-panel';

const signOff = { runId: uuid(30), signedByName: 'Bo Lark', signedAt: '2026-10-20T10:00:00.000Z', remark: '' };

describe('publishing', () => {
  it('cannot be pressed before the sign-off and says why', () => {
    fakeApi({});
    renderScreen(<PublishPanel quarter={quarterView()} />);
    expect((screen.getByRole('button', { name: 'Publish' }) as HTMLButtonElement).disabled).toBe(true);
    expect(screen.getByText('The quarter is not signed off.')).toBeTruthy();
  });

  it('stays closed even if the service were to allow it without a sign-off', () => {
    fakeApi({});
    renderScreen(
      <PublishPanel quarter={quarterView({ actions: [{ action: 'publish', allowed: true, reason: null }] })} />,
    );
    expect((screen.getByRole('button', { name: 'Publish' }) as HTMLButtonElement).disabled).toBe(true);
  });

  it('offers an auditor nothing to press', () => {
    fakeApi({});
    renderScreen(<PublishPanel quarter={quarterView()} />, { hat: 'auditor' });
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.getByText(/The plan administrator or the approver publishes/)).toBeTruthy();
  });

  it('asks once, then publishes the run that was signed', async () => {
    const api = fakeApi({ 'publication.publish': () => quarterView({ state: 'signed_off' }) });
    const quarter = quarterView({
      state: 'signed_off',
      signOff,
      actions: [{ action: 'publish', allowed: true, reason: null }],
    });
    renderScreen(<PublishPanel quarter={quarter} />);
    fireEvent.click(screen.getByRole('button', { name: 'Publish' }));
    const dialog = await screen.findByRole('dialog');
    expect(dialog.textContent).toContain('cannot be taken back');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Publish' }));
    await waitFor(() => expect(api.callsOf('publication.publish')[0]?.body).toEqual({ runId: uuid(30) }));
  });

  it('reports the delivery and what did not arrive', () => {
    fakeApi({});
    const quarter = quarterView({
      state: 'published',
      signOff,
      publication: {
        requestedByName: 'Ada Quill',
        requestedAt: '2026-10-21T08:00:00.000Z',
        completedAt: '2026-10-21T08:00:09.000Z',
        statementCount: 97,
        emailCount: 80,
        paperCount: 17,
        heldCount: 3,
      },
      delivery: { sent: 76, queued: 0, failed: 1, bounced: 3, read: 12 },
    });
    renderScreen(<PublishPanel quarter={quarter} />);
    expect(screen.getByText('97')).toBeTruthy();
    expect(screen.getByText(/4 notices did not arrive/)).toBeTruthy();
  });
});
