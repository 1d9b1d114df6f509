export type Scheme = 'light' | 'dark';

/**
 * The product's colours by the part they play. Every text colour reaches 4.5 : 1 on `paper` and on `sheet` of its scheme.
 * The same values stand in theme.css as custom properties, for what is not drawn by the component library.
 */
export interface Palette {
  structure: string;
  poise: string;
  paper: string;
  sheet: string;
  ink: string;
  quiet: string;
  rule: string;
  brick: string;
}

export const PALETTES: Record<Scheme, Palette> = {
  light: {
    structure: '#12403C',
    poise: '#8A5E10',
    paper: '#FAF8F3',
    sheet: '#FFFFFF',
    ink: '#1C2526',
    quiet: '#566062',
    rule: '#DDD8CC',
    brick: '#96412F',
  },
  dark: {
    structure: '#7FC2B4',
    poise: '#E0B25A',
    paper: '#121A1A',
    sheet: '#1A2424',
    ink: '#ECE8DF',
    quiet: '#A9B3B1',
    rule: '#344140',
    brick: '#E79A86',
  },
};
