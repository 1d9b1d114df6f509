import type { Hat, SessionView } from '@quarterpoise/dto';
import { cleanup, render, type RenderResult } from '@testing-library/react';
import type { ReactNode } from 'react';
import { I18nextProvider, initReactI18next } from 'react-i18next';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, vi } from 'vitest';
import { texts } from '../i18n/i18n';
import { SessionProvider } from '../lib/session';
import { ThemeChoiceProvider } from '../theme/theme-choice';
import { rememberCsrfToken } from '../lib/api-client';

const files = import.meta.glob<Record<string, unknown>>('../i18n/*/*.json', { eager: true, import: 'default' });

const resources: Record<string, Record<string, Record<string, unknown>>> = {};
for (const [path, file] of Object.entries(files)) {
  const [, language = '', area = ''] = /i18n\/(\w+)\/([\w-]+)\.json$/.exec(path) ?? [];
  (resources[language] ??= {})[area] = file;
}

// All texts at once, so that tests see what people read.
await texts.use(initReactI18next).init({
  lng: 'en',
  fallbackLng: 'en',
  defaultNS: 'shell',
  resources: resources as never,
  interpolation: { escapeValue: false },
});

window.matchMedia ??= (query: string) =>
  ({
    matches: false,
    media: query,
    addEventListener() {},
    removeEventListener() {},
    addListener() {},
    removeListener() {},
  }) as never;
globalThis.ResizeObserver ??= class {
  observe() {}
  unobserve() {}
  disconnect() {}
} as never;
// jsdom has no layout: the component library asks for the style of a scrollbar, which it cannot answer.
const { getComputedStyle } = window;
window.getComputedStyle = (element) => getComputedStyle(element);

afterEach(async () => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  await texts.changeLanguage('en');
});

export const sessionOf = (hat: Hat, hats: Hat[] = [hat]): SessionView => ({
  person: {
    id: '00000000-0000-4000-8000-000000000001',
    displayName: 'Ada Quill',
    email: 'ada@example.com',
    language: 'en',
  },
  hat,
  hats,
  csrfToken: 'csrf-1',
});

export function TestProviders({ children }: { children: ReactNode }) {
  return (
    <I18nextProvider i18n={texts}>
      <ThemeChoiceProvider>{children}</ThemeChoiceProvider>
    </I18nextProvider>
  );
}

interface ScreenOptions {
  hat?: Hat | null;
  path?: string;
  /** Pattern of the route that holds the screen, such as `/quarters/:quarterId`. */
  pattern?: string;
}

/** Draws a screen inside router, session and texts. `hat: null` means nobody is signed in. */
export function renderScreen(
  ui: ReactNode,
  { hat = 'administrator', path = '/', pattern = '*' }: ScreenOptions = {},
): RenderResult & {
  router: ReturnType<typeof createMemoryRouter>;
} {
  const session = hat === null ? null : sessionOf(hat);
  rememberCsrfToken(session?.csrfToken ?? null);
  const router = createMemoryRouter(
    [
      { path: pattern, element: <SessionProvider initial={session}>{ui}</SessionProvider> },
      { path: '*', element: <p>elsewhere</p> },
    ].slice(0, pattern === '*' ? 1 : 2),
    { initialEntries: [path] },
  );
  const result = render(
    <TestProviders>
      <RouterProvider router={router} />
    </TestProviders>,
  );
  return { ...result, router };
}
