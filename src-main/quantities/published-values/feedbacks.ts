import type { PublishedValue } from '../../contract/finding.ts';
import { ar6, likely, publishedEntry, range90, standardDeviation, veryLikely } from './published-entry.ts';

const unit = 'W/m² per K';
const term = { quantity: 'feedback-term' as const, unit, edition: ar6 };
const recalled = { ...term, source: 'Chapter 7, §7.4.2, Table 7.10', provenance: 'memory' as const };
const sherwood = {
  unit,
  edition: 'Sherwood et al. 2020',
  source: 'Reviews of Geophysics 58, e2019RG000678',
  provenance: 'second-hand' as const,
  remark: 'Read in the authors’ own published code.',
};

/** Feedbacks in AR6's sign: a negative one restores. */
export const feedbacks: readonly PublishedValue[] = [
  publishedEntry({
    id: 'ar6-feedback',
    quantity: 'feedback-parameter',
    label: 'AR6 net climate feedback',
    best: -1.16,
    ranges: [standardDeviation(-1.56, -0.76), veryLikely(-1.81, -0.51)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.4.2 and §7.5.1',
    provenance: 'seen',
    remark: 'Standard deviation 0.40.',
  }),
  publishedEntry({
    ...recalled,
    id: 'ar6-feedback-planck',
    subject: 'Planck response',
    label: 'AR6 Planck response',
    best: -3.22,
    ranges: [likely(-3.3, -3.1), veryLikely(-3.4, -3)],
  }),
  publishedEntry({
    ...recalled,
    id: 'ar6-feedback-water-vapour',
    subject: 'water vapour and lapse rate',
    label: 'AR6 water vapour and lapse rate feedback',
    best: 1.3,
    ranges: [likely(1.2, 1.4), veryLikely(1.1, 1.5)],
  }),
  publishedEntry({
    ...recalled,
    id: 'ar6-feedback-albedo',
    subject: 'surface albedo',
    label: 'AR6 surface albedo feedback',
    best: 0.35,
    ranges: [likely(0.25, 0.45), veryLikely(0.1, 0.6)],
  }),
  publishedEntry({
    ...term,
    id: 'ar6-feedback-cloud',
    subject: 'clouds',
    label: 'AR6 net cloud feedback',
    best: 0.42,
    ranges: [likely(0.12, 0.72), veryLikely(-0.1, 0.94)],
    source: 'Chapter 7, §7.4.2',
    provenance: 'seen',
  }),
  publishedEntry({
    ...recalled,
    id: 'ar6-feedback-biogeochemical',
    subject: 'biogeophysical and non-CO₂ biogeochemical',
    label: 'AR6 biogeophysical and non-CO₂ biogeochemical feedback',
    best: -0.01,
    ranges: [likely(-0.16, 0.13), veryLikely(-0.27, 0.25)],
  }),
  publishedEntry({
    id: 'ar6-pattern-observed',
    quantity: 'pattern-effect',
    subject: 'from observed sea surface temperatures',
    label: 'AR6 pattern effect, from observed sea surface temperatures',
    best: 0.5,
    ranges: [range90(0, 1)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.4.4 and §7.5.2.1',
    provenance: 'seen',
    remark: 'Added to α: −F2x/(α + α′). The formula as printed has the sign reversed.',
  }),
  publishedEntry({
    id: 'ar6-pattern-models',
    quantity: 'pattern-effect',
    subject: 'from coupled models',
    label: 'AR6 pattern effect, from coupled models',
    best: 0.1,
    ranges: [range90(-0.2, 0.4)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.5.2.1',
    provenance: 'seen',
  }),
  publishedEntry({
    id: 'ar6-ocean-uptake',
    quantity: 'ocean-uptake-damping',
    label: 'AR6 ocean heat uptake damping',
    best: 0.84,
    ranges: [standardDeviation(0.46, 1.22)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.5.1',
    provenance: 'seen',
    remark: 'TCR ≈ −F2x/(α − κ).',
  }),
  publishedEntry({
    ...sherwood,
    id: 'sherwood-2020-feedback',
    quantity: 'feedback-parameter',
    label: 'Sherwood et al. 2020, net feedback from processes',
    best: -1.3,
    ranges: [standardDeviation(-1.74, -0.86)],
  }),
  ...(
    [
      ['planck', 'Planck response', -3.2, 0.1],
      ['water-vapour', 'water vapour and lapse rate', 1.15, 0.15],
      ['albedo', 'surface albedo', 0.3, 0.15],
      ['cloud', 'clouds', 0.45, 0.33],
      ['composition', 'atmospheric composition', 0, 0.15],
      ['stratospheric', 'stratosphere', 0, 0.1],
    ] as const
  ).map(([id, subject, best, sd]) =>
    publishedEntry({
      ...sherwood,
      id: `sherwood-2020-feedback-${id}`,
      quantity: 'feedback-term',
      subject,
      label: `Sherwood et al. 2020, feedback of ${subject}`,
      best,
      // Sums such as 0.45 − 0.33 are not exact in binary; the publication prints two decimals.
      ranges: [standardDeviation(Number((best - sd).toFixed(2)), Number((best + sd).toFixed(2)))],
    }),
  ),
];
