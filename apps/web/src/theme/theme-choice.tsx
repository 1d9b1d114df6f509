import { createContext, useContext, useEffect, useMemo, useState, useSyncExternalStore, type ReactNode } from 'react';
import type { Scheme } from './palette';

export const THEME_CHOICES = ['system', 'light', 'dark'] as const;
export type ThemeChoice = (typeof THEME_CHOICES)[number];

const STORAGE_KEY = 'quarterpoise.theme';

interface ThemeState {
  choice: ThemeChoice;
  scheme: Scheme;
  hasReducedMotion: boolean;
  choose(choice: ThemeChoice): void;
}

const ThemeContext = createContext<ThemeState | null>(null);

export function useThemeChoice(): ThemeState {
  const state = useContext(ThemeContext);
  if (!state) throw new Error('useThemeChoice needs a ThemeChoiceProvider above it');
  return state;
}

function useMediaQuery(query: string): boolean {
  return useSyncExternalStore(
    (onChange) => {
      const list = window.matchMedia?.(query);
      list?.addEventListener('change', onChange);
      return () => list?.removeEventListener('change', onChange);
    },
    () => window.matchMedia?.(query).matches ?? false,
  );
}

function rememberedChoice(): ThemeChoice {
  const stored = localStorage.getItem(STORAGE_KEY);
  return THEME_CHOICES.find((choice) => choice === stored) ?? 'system';
}

export function ThemeChoiceProvider({ children }: { children: ReactNode }) {
  const [choice, setChoice] = useState(rememberedChoice);
  const isSystemDark = useMediaQuery('(prefers-color-scheme: dark)');
  const hasReducedMotion = useMediaQuery('(prefers-reduced-motion: reduce)');
  const scheme: Scheme = choice === 'system' ? (isSystemDark ? 'dark' : 'light') : choice;

  useEffect(() => {
    document.documentElement.dataset.scheme = scheme;
  }, [scheme]);

  const state = useMemo<ThemeState>(
    () => ({
      choice,
      scheme,
      hasReducedMotion,
      choose(next) {
        localStorage.setItem(STORAGE_KEY, next);
        setChoice(next);
      },
    }),
    [choice, scheme, hasReducedMotion],
  );
  return <ThemeContext value={state}>{children}</ThemeContext>;
}
