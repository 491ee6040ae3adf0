import type { StemFigure } from '../../../src-main/contract/figure.ts';

/** Invented. Every kind of row: cumulative and not, with and without an interval, running off the axis. */
export const sampleStem: StemFigure = {
  kind: 'stem',
  name: 'stem',
  title: 'At most 1.9',
  caption: 'Bars are 5–95 %.',
  digests: ['a'.repeat(64)],
  unit: 'K per doubling',
  stated: { text: 'Stated, at most 1.9', value: 1.9, bound: 'at most', interval: { low: 1.85, high: 1.95 } },
  recomputed: { value: 1.874, interval: { low: 1.74, high: 2.01, levelPercent: 95 } },
  rows: [
    {
      label: 'Line need not pass zero',
      value: 2.31,
      interval: { low: 2.1, high: 2.52, levelPercent: 90 },
      quantity: 'apparent-sensitivity',
      isCumulative: true,
    },
    {
      label: 'All forcings, not CO₂ alone, with the forcing of a doubling at 3.93 W/m² instead of 3.71 W/m²',
      value: 2.04,
      interval: { low: 1.74, high: 2.35, levelPercent: 90 },
      quantity: 'transient-climate-response',
      isCumulative: true,
    },
    {
      label: 'Heat still going into the sea',
      value: 2.71,
      interval: { low: 1.9, high: null, levelPercent: 90 },
      quantity: 'effective-climate-sensitivity',
      isCumulative: false,
    },
    { label: 'Mean of 20 years', value: 2.17, interval: null, quantity: 'apparent-sensitivity', isCumulative: false },
  ],
  bands: [
    { label: 'TCR, likely (AR6)', low: 1.4, high: 2.2, quantity: 'transient-climate-response' },
    { label: 'TCR, very likely (AR6)', low: 1.2, high: 2.4, quantity: 'transient-climate-response' },
    { label: 'ECS, likely (AR6)', low: 2.5, high: 4, quantity: 'equilibrium-climate-sensitivity' },
  ],
};
