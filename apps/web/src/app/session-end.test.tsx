import { render, screen, waitFor } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { SignedIn } from './signed-in';
import { returnAddress } from './paths';
import { fakeApi, Refusal } from '../testing/fake-api';
import { sessionOf, TestProviders } from '../testing/render-screen';
import { SessionProvider } from '../lib/session';
import { useRoute } from '../lib/swr';

function Plans() {
  const { data } = useRoute('plans.list', {});
  return <p>{data ? 'plans' : 'waiting'}</p>;
}

function open(address: string) {
  const router = createMemoryRouter(
    [
      { path: '/sign-in', element: <p>sign-in page</p> },
      {
        element: (
          <SessionProvider>
            <SignedIn />
          </SessionProvider>
        ),
        children: [{ path: '*', element: <Plans /> }],
      },
    ],
    { initialEntries: [address] },
  );
  render(
    <TestProviders>
      <RouterProvider router={router} />
    </TestProviders>,
  );
  return router;
}

describe('the end of a sign-in', () => {
  it('sends somebody not signed in to the sign-in page with the way back', async () => {
    fakeApi({ 'identity.session': () => new Refusal(401, 'not-signed-in') });
    const router = open('/quarters/7?step=run');
    await screen.findByText('sign-in page');
    expect(returnAddress(router.state.location.search)).toBe('/quarters/7?step=run');
  });

  it('does the same when a read finds that the sign-in has run out, and asks no second time', async () => {
    const api = fakeApi({
      'identity.session': () => sessionOf('administrator'),
      'plans.list': () => new Refusal(401, 'not-signed-in'),
    });
    const router = open('/plans');
    await screen.findByText('sign-in page');
    expect(returnAddress(router.state.location.search)).toBe('/plans');
    await waitFor(() => expect(api.callsOf('plans.list')).toHaveLength(1));
  });

  it('shows role, navigation and name in the header', async () => {
    fakeApi({
      'identity.session': () => sessionOf('approver', ['approver', 'participant']),
      'plans.list': () => ({ items: [], nextCursor: null }),
    });
    open('/plans');
    const hat = (await screen.findByLabelText('Acting as')) as HTMLSelectElement;
    expect(hat.selectedOptions[0]?.textContent).toBe('Approver');
    expect(screen.getByRole('link', { name: 'Plans' }).getAttribute('aria-current')).toBe('page');
    expect(screen.getByText('Ada Quill')).toBeTruthy();
  });

  it('takes no address of another site as the way back', () => {
    expect(returnAddress('?return=https://example.com')).toBe('/');
    expect(returnAddress('?return=//example.com')).toBe('/');
    expect(returnAddress('?return=/%5Cexample.com')).toBe('/');
  });
});
