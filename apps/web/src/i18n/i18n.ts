import i18next, { type BackendModule, type i18n } from 'i18next';
import { initReactI18next } from 'react-i18next';

export const LANGUAGES = ['en', 'es'] as const;
export type Language = (typeof LANGUAGES)[number];

const STORAGE_KEY = 'quarterpoise.language';

/** One file per area and language, loaded when a screen of the area is opened. Staff areas exist in English only and fall back to it. */
const files = import.meta.glob<{ default: Record<string, unknown> }>('./{en,es}/*.json');

const areaFiles: BackendModule = {
  type: 'backend',
  init: () => undefined,
  read(language, area, callback) {
    const load = files[`./${language}/${area}.json`];
    if (!load) {
      callback(null, {});
      return;
    }
    load().then(
      (file) => callback(null, file.default),
      (error: Error) => callback(error, null),
    );
  },
};

export function rememberedLanguage(): Language {
  const stored = localStorage.getItem(STORAGE_KEY) ?? navigator.language;
  return stored.startsWith('es') ? 'es' : 'en';
}

export const texts: i18n = i18next.createInstance();

export async function startTexts(language: Language): Promise<void> {
  await texts
    .use(areaFiles)
    .use(initReactI18next)
    .init({
      lng: language,
      fallbackLng: 'en',
      supportedLngs: LANGUAGES,
      ns: ['shell', 'problems'],
      defaultNS: 'shell',
      interpolation: { escapeValue: false },
      returnNull: false,
    });
  document.documentElement.lang = language;
}

export async function chooseLanguage(language: Language): Promise<void> {
  localStorage.setItem(STORAGE_KEY, language);
  await texts.changeLanguage(language);
  document.documentElement.lang = language;
}

/** Loads the texts of a screen beside its code, so that it never shows without them. */
export function loadAreas(areas: string[]): Promise<void> {
  return texts.loadNamespaces(areas);
}
