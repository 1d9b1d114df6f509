import { act, fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { fakeApi, Refusal } from '../../../testing/fake-api';
import { renderScreen, sessionOf } from '../../../testing/render-screen';
import { SignInForm } from './sign-in-form';

const noDemo = { 'identity.demo-accounts': () => ({ items: [] }) };
const type = (label: string, value: string) => fireEvent.change(screen.getByLabelText(label), { target: { value } });
const press = () => fireEvent.click(screen.getByRole('button', { name: 'Sign in' }));

describe('sign-in', () => {
  it('names the field that is missing and sends nothing', () => {
    const api = fakeApi(noDemo);
    renderScreen(<SignInForm onSignedIn={vi.fn()} />, { hat: null });
    press();
    expect(screen.getByText(/Enter your e-mail address/)).toBeTruthy();
    expect(document.activeElement).toBe(screen.getByLabelText('E-mail address'));
    expect(api.callsOf('identity.sign-in')).toHaveLength(0);
  });

  it('says at the password that the two do not fit, and keeps what was typed', async () => {
    fakeApi({ ...noDemo, 'identity.sign-in': () => new Refusal(401, 'wrong-credentials') });
    const onSignedIn = vi.fn();
    renderScreen(<SignInForm onSignedIn={onSignedIn} />, { hat: null });
    type('E-mail address', 'ada@example.com');
    type('Password', 'wrong');
    press();
    expect(await screen.findByText(/E-mail address or password is wrong/)).toBeTruthy();
    expect(screen.getByLabelText('Password').getAttribute('aria-invalid')).toBe('true');
    expect((screen.getByLabelText('E-mail address') as HTMLInputElement).value).toBe('ada@example.com');
    expect(onSignedIn).not.toHaveBeenCalled();
  });

  it('counts down the wait after too many tries and lets nobody press meanwhile', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    fakeApi({ ...noDemo, 'identity.sign-in': () => new Refusal(429, 'too-many-requests', { retryAfter: 3 }) });
    renderScreen(<SignInForm onSignedIn={vi.fn()} />, { hat: null });
    type('E-mail address', 'ada@example.com');
    type('Password', 'secret');
    press();
    expect(await screen.findByText(/try again in 3 seconds/)).toBeTruthy();
    expect((screen.getByRole('button', { name: 'Sign in' }) as HTMLButtonElement).disabled).toBe(true);
    await act(() => vi.advanceTimersByTimeAsync(3_100));
    expect(screen.queryByText(/Too many tries/)).toBeNull();
    expect((screen.getByRole('button', { name: 'Sign in' }) as HTMLButtonElement).disabled).toBe(false);
  });

  it('fills the form from a demo account and hands the session on', async () => {
    const api = fakeApi({
      'identity.demo-accounts': () => ({
        items: [
          {
            hat: 'approver',
            displayName: 'Bo Lark',
            email: 'bo@example.com',
            password: 'demo',
            organisation: 'Orchard Works',
          },
        ],
      }),
      'identity.sign-in': () => sessionOf('approver'),
    });
    const onSignedIn = vi.fn();
    renderScreen(<SignInForm onSignedIn={onSignedIn} />, { hat: null });
    fireEvent.click(await screen.findByRole('button', { name: /Approver/ }));
    press();
    await waitFor(() => expect(onSignedIn).toHaveBeenCalledWith(sessionOf('approver')));
    expect(api.callsOf('identity.sign-in')[0]?.body).toEqual({ email: 'bo@example.com', password: 'demo' });
  });
});
