import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { flagRow, uuid } from '../../../testing/builders';
import { fakeApi } from '../../../testing/fake-api';
import { renderScreen } from '../../../testing/render-screen';
import { FlagQueue } from './flag-queue';

const runId = uuid(30);

function queue(count = 3) {
  let open = Array.from({ length: count }, (_, index) => flagRow(index + 1));
  return fakeApi({
    'review.flags': () => ({ items: open, nextCursor: null }),
    'review.decide': ({ body }) => {
      const { flagIds } = body as { flagIds: string[] };
      open = open.filter((flag) => !flagIds.includes(flag.id));
      return { decided: flagIds.length };
    },
  });
}

const flags = () => screen.getAllByRole('listitem');
const key = (name: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key: name });

async function start() {
  await screen.findByText('Person 1');
  flags()[0]?.focus();
}

describe('the queue of flags', () => {
  it('asks for undecided flags and shows first estimate beside solved rate with the sentence', async () => {
    const api = queue(1);
    renderScreen(<FlagQueue runId={runId} canDecide />);
    await screen.findByText('Person 1');
    expect(api.callsOf('review.flags')[0]?.query).toMatchObject({ undecided: 'true' });
    expect(flags()[0]?.textContent).toContain('A return of 48.20% lies beyond the 25%');
    expect(flags()[0]?.textContent).toContain('Solved rate▲+48.20%First estimate▲+46.90%Gap1.30 points');
  });

  it('moves with j and k and keeps the focus in the list', async () => {
    queue();
    renderScreen(<FlagQueue runId={runId} canDecide />);
    await start();
    key('j');
    key('j');
    key('j');
    expect(document.activeElement).toBe(flags()[2]);
    key('k');
    expect(document.activeElement).toBe(flags()[1]);
    expect(flags()[1]?.getAttribute('aria-current')).toBe('true');
  });

  it('accepts the flag at hand with a reason', async () => {
    const api = queue();
    renderScreen(<FlagQueue runId={runId} canDecide />);
    await start();
    key('j');
    key('a');
    const dialog = await screen.findByRole('dialog');
    expect(dialog.textContent).toContain('Accept the figure of P-2 Person 2?');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Accept' }));
    expect(await within(dialog).findByText('Say in a sentence why.')).toBeTruthy();
    expect(api.callsOf('review.decide')).toHaveLength(0);
    fireEvent.change(within(dialog).getByLabelText('Reason, for the audit trail'), {
      target: { value: 'Paid late, checked' },
    });
    fireEvent.click(within(dialog).getByRole('button', { name: 'Accept' }));
    await waitFor(() => expect(screen.queryByText('Person 2')).toBeNull());
    expect(api.callsOf('review.decide')[0]?.body).toEqual({
      flagIds: [uuid(102)],
      decision: 'accepted',
      reason: 'Paid late, checked',
    });
    expect(await screen.findByText('One flag accepted.')).toBeTruthy();
  });

  it('holds several back at once, with the message that the participants will read', async () => {
    const api = queue();
    renderScreen(<FlagQueue runId={runId} canDecide />);
    await start();
    key('x');
    key('j');
    key('x');
    expect(screen.getByText('2 flags marked')).toBeTruthy();
    key('h');
    const dialog = await screen.findByRole('dialog');
    fireEvent.change(within(dialog).getByLabelText('Reason, for the audit trail'), {
      target: { value: 'Balances disputed' },
    });
    fireEvent.click(within(dialog).getByRole('button', { name: 'Hold back' }));
    expect(await within(dialog).findByText('Write what the participant is to read.')).toBeTruthy();
    fireEvent.change(within(dialog).getByLabelText('Message to the participant'), {
      target: { value: 'We are checking.' },
    });
    fireEvent.click(within(dialog).getByRole('button', { name: 'Hold back' }));
    await waitFor(() => expect(api.callsOf('review.decide')).toHaveLength(1));
    expect(api.callsOf('review.decide')[0]?.body).toEqual({
      flagIds: [uuid(101), uuid(102)],
      decision: 'held',
      reason: 'Balances disputed',
      message: 'We are checking.',
    });
  });

  it('lets a reader look and decide nothing', async () => {
    queue();
    renderScreen(<FlagQueue runId={runId} canDecide={false} />, { hat: 'auditor' });
    await start();
    key('a');
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.queryByRole('button', { name: 'Accept' })).toBeNull();
  });

  it('says when nothing is left to decide', async () => {
    queue(0);
    renderScreen(<FlagQueue runId={runId} canDecide />);
    expect(await screen.findByText('Nothing is left to decide')).toBeTruthy();
  });

  it('lists the figures of a flag whose sentence asks for one that it does not carry', async () => {
    fakeApi({
      'review.flags': () => ({
        items: [flagRow(1, { figures: { balanceCents: -1250 }, code: 'negative-balance' })],
        nextCursor: null,
      }),
    });
    renderScreen(<FlagQueue runId={runId} canDecide />);
    await screen.findByText('Person 1');
    expect(flags()[0]?.textContent).toContain(
      'A balance is below zero, which an account cannot have. balance: −$12.50',
    );
  });
});
