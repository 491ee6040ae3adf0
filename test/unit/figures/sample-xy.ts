import type { XyFigure } from '../../../src-main/contract/figure.ts';

const years = [1990, 1991, 1992, 1993];

/** Invented. One mark of each kind, sharing their x, with a gap. */
export const sampleXy: XyFigure = {
  kind: 'xy',
  name: 'series of air',
  title: 'Air',
  caption: 'Air temperature at an invented harbour.',
  digests: ['b'.repeat(64)],
  xLabel: 'Year',
  yLabel: 'T − T₀ (K)',
  isXYears: true,
  marks: [
    { label: 'limits', mark: 'band', x: years, y: [0, 0.1, null, 0.2], y2: [0.2, 0.3, null, 0.4], role: 'data' },
    { label: 'air', mark: 'line', x: years, y: [0.1, 0.2, null, 0.3], y2: null, role: 'data' },
    { label: 'line as stated', mark: 'line', x: years, y: [0.1, 0.15, 0.2, 0.25], y2: null, role: 'stated' },
    { label: 'readings', mark: 'points', x: years, y: [0.12, 0.18, 0.2, 0.31], y2: null, role: 'alternative' },
  ],
};
