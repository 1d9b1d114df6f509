import { theme, type ThemeConfig } from 'antd';
import { PALETTES, type Scheme } from './palette';

export const FONT_FAMILY = "'Noto Sans Variable', system-ui, sans-serif";

/** The component library is dressed by its tokens alone; nothing of it is restyled by selectors. */
export function antdTheme(scheme: Scheme, hasReducedMotion: boolean): ThemeConfig {
  const palette = PALETTES[scheme];
  return {
    algorithm: scheme === 'dark' ? theme.darkAlgorithm : theme.defaultAlgorithm,
    token: {
      colorPrimary: palette.structure,
      colorLink: palette.structure,
      colorInfo: palette.structure,
      colorSuccess: palette.structure,
      colorWarning: palette.poise,
      colorError: palette.brick,
      colorBgLayout: palette.paper,
      colorBgContainer: palette.sheet,
      colorBgElevated: palette.sheet,
      colorText: palette.ink,
      colorTextSecondary: palette.quiet,
      colorTextDescription: palette.quiet,
      colorTextPlaceholder: palette.quiet,
      colorBorder: scheme === 'dark' ? '#6B7A78' : '#8B9290',
      colorBorderSecondary: palette.rule,
      colorTextLightSolid: scheme === 'dark' ? palette.paper : '#FFFFFF',
      fontFamily: FONT_FAMILY,
      fontSize: 15,
      borderRadius: 4,
      controlHeight: 36,
      lineWidthFocus: 3,
      motion: !hasReducedMotion,
      wireframe: false,
    },
    components: {
      Table: { headerBg: palette.paper, cellPaddingBlock: 9, cellPaddingInline: 10, headerSplitColor: palette.rule },
      Button: { fontWeight: 550, primaryShadow: 'none', defaultShadow: 'none', dangerShadow: 'none' },
      Form: { itemMarginBottom: 16, verticalLabelPadding: '0 0 4px' },
    },
  };
}
