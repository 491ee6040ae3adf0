/** The colours of a drawing. Text colours keep 4.5:1 against paper, marks 3:1. */
export interface Palette {
  readonly paper: string;
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly rule: string;
  readonly rule2: string;
  readonly accent: string;
  readonly stated: string;
  /** Tints of published ranges, one per quantity, in order of appearance. */
  readonly bands: readonly [string, string, string];
  /** Series colours of Okabe and Ito (2008), darkened or lightened where a mark would fall below 3:1 on the paper. */
  readonly series: readonly [string, string, string, string, string];
}

export const lightPalette: Palette = {
  paper: '#fbfaf6',
  ink: '#1d2429',
  ink2: '#4d5862',
  ink3: '#5f6972',
  rule: '#dcd9cf',
  rule2: '#ebe8df',
  accent: '#0b5c63',
  stated: '#a23b12',
  bands: ['#e6e9e2', '#d6dfe3', '#e9e1ec'],
  series: ['#0072b2', '#007f5f', '#a8588a', '#b85700', '#5f6972'],
};

export const darkPalette: Palette = {
  paper: '#14181b',
  ink: '#e9e6de',
  ink2: '#aab2b6',
  ink3: '#98a1a6',
  rule: '#343b40',
  rule2: '#262c31',
  accent: '#6fc3c4',
  stated: '#f0956a',
  bands: ['#262d2a', '#26333a', '#322a36'],
  series: ['#56b4e9', '#1fb58c', '#cc79a7', '#e69f00', '#98a1a6'],
};

/** White paper; otherwise as light. */
export const printPalette: Palette = { ...lightPalette, paper: '#ffffff' };
