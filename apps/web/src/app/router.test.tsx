import { HATS } from '@quarterpoise/dto';
import { render, screen, waitFor } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { fakeApi, Refusal } from '../testing/fake-api';
import { sessionOf, TestProviders } from '../testing/render-screen';
import { NAVIGATION } from './navigation';
import { routes } from './router';

function open(address: string) {
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  render(
    <TestProviders>
      <RouterProvider router={router} />
    </TestProviders>,
  );
  return router;
}

describe('the addresses of the product', () => {
  it.each(HATS)('bring %s from the start page to the home of that role', async (hat) => {
    fakeApi({
      'identity.session': () => sessionOf(hat),
      'plans.list': () => ({ items: [], nextCursor: null }),
      'statements.own-accounts': () => ({ items: [], nextCursor: null }),
      'statements.own': () => ({ items: [], nextCursor: null }),
    });
    const router = open('/');
    await waitFor(() => expect(router.state.location.pathname).toBe(NAVIGATION[hat][0].path));
  });

  it('say plainly when there is no such page, with the way home', async () => {
    fakeApi({ 'identity.session': () => sessionOf('auditor') });
    open('/nowhere');
    expect(await screen.findByRole('heading', { name: 'There is no such page' })).toBeTruthy();
    expect(document.title).toContain('There is no such page');
    expect(screen.getByRole('link', { name: 'Go to the start page' })).toBeTruthy();
  });

  it('show what went wrong, with another try, when the service cannot be reached', async () => {
    const service = fakeApi({ 'identity.session': () => new Refusal(503, 'service-unavailable') });
    open('/nowhere');
    expect((await screen.findByRole('alert')).textContent).toContain('The service is not available just now');
    service.answer({ 'identity.session': () => sessionOf('auditor') });
    screen.getByRole('button', { name: 'Try again' }).click();
    expect(await screen.findByRole('heading', { name: 'There is no such page' })).toBeTruthy();
  });

  it('catch a screen that breaks, and keep the header', async () => {
    const silenced = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    fakeApi({ 'identity.session': () => sessionOf('auditor'), 'plans.list': () => ({ items: null }) as never });
    open('/plans');
    expect((await screen.findByRole('alert')).textContent).toContain('Something went wrong on our side');
    expect(screen.getByRole('link', { name: 'Quarterpoise' })).toBeTruthy();
    silenced.mockRestore();
  });
});
