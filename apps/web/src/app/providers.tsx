import { ConfigProvider, type ConfigProviderProps } from 'antd';
import { useEffect, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { antdTheme } from '../theme/antd-theme';
import { ThemeChoiceProvider, useThemeChoice } from '../theme/theme-choice';

type AntdLocale = NonNullable<ConfigProviderProps['locale']>;

/** English is built into the component library; Spanish is fetched when it is asked for. */
function useAntdLocale(): AntdLocale | undefined {
  const { i18n } = useTranslation();
  const [spanish, setSpanish] = useState<AntdLocale>();
  const isSpanish = i18n.language.startsWith('es');
  useEffect(() => {
    if (isSpanish) void import('antd/locale/es_ES').then((file) => setSpanish(file.default));
  }, [isSpanish]);
  return isSpanish ? spanish : undefined;
}

function ThemedComponents({ children }: { children: ReactNode }) {
  const { scheme, hasReducedMotion } = useThemeChoice();
  const locale = useAntdLocale();
  return (
    <ConfigProvider theme={antdTheme(scheme, hasReducedMotion)} {...(locale && { locale })}>
      {children}
    </ConfigProvider>
  );
}

/** What every screen stands in: theme and component library. Session and reads come with the router, which they need. */
export function Providers({ children }: { children: ReactNode }) {
  return (
    <ThemeChoiceProvider>
      <ThemedComponents>{children}</ThemedComponents>
    </ThemeChoiceProvider>
  );
}
