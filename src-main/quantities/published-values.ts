import type { PublishedValue } from '../contract/finding.ts';
import type { QuantityId } from '../contract/primitives.ts';

const ar6 = 'IPCC AR6 WG1 (2021)';
const ar5 = 'IPCC AR5 WG1 (2013)';
const ar4 = 'IPCC AR4 WG1 (2007)';
const kPerDoubling = 'K per doubling';

/** The central 66 per cent, in the report's calibrated language. */
function likely(low: number, high: number): PublishedValue['ranges'][number] {
  return { interval: { low, high, levelPercent: 66 }, words: 'likely (66 %)' };
}

/** The central 90 per cent. */
function veryLikely(low: number, high: number): PublishedValue['ranges'][number] {
  return { interval: { low, high, levelPercent: 90 }, words: 'very likely (5–95 %)' };
}

/** A 5–95 % range that the publication gives without a likelihood word. */
function range90(low: number, high: number): PublishedValue['ranges'][number] {
  return { interval: { low, high, levelPercent: 90 }, words: '5–95 % range' };
}

/**
 * Published ranges that a claim can be held against, each for its own quantity, with edition, place, and how the value
 * came into this table: `seen` in the publication, `second-hand` from a text that cites it, `memory`, to be looked up
 * before it decides anything.
 */
export const publishedValues: readonly PublishedValue[] = [
  {
    id: 'ar6-ecs',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR6 assessed ECS',
    best: 3,
    ranges: [likely(2.5, 4), veryLikely(2, 5)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.5: assessment over all lines of evidence',
    provenance: 'seen',
    remark: 'Virtually certain to be above 1.5 °C; the upper end of 5 °C is given with medium confidence.',
  },
  {
    id: 'ar6-ecs-process',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR6 ECS from process understanding',
    best: 3.4,
    ranges: [likely(2.5, 5.1), veryLikely(2.1, 7.7)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.1: doubling forcing over assessed feedback',
    provenance: 'seen',
    remark:
      'Uses 3.93 ± 0.47 W/m² for a doubling. §7.3.2 gives ±0.47 as the 5–95 % range, §7.5.1 calls it one standard deviation; the percentiles come out nearly the same, because the feedback dominates.',
  },
  {
    id: 'ar6-ecs-pattern-observed',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR6 energy budget with the pattern effect, from observed sea surface temperatures',
    best: 3.5,
    ranges: [range90(1.7, 13.8)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.2.1: α′ = +0.5 ± 0.5 W/m² per °C',
    provenance: 'seen',
    remark: 'The formula as printed has the sign of α′ reversed; the values printed follow −F2x/(α + α′).',
  },
  {
    id: 'ar6-ecs-pattern-models',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR6 energy budget with the pattern effect, from coupled models',
    best: 2.7,
    ranges: [range90(1.7, 5.9)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.2.1: α′ = +0.1 ± 0.3 W/m² per °C',
    provenance: 'seen',
    remark: null,
  },
  {
    id: 'ar6-effcs-energy-budget',
    quantity: 'effective-climate-sensitivity',
    label: 'AR6 effective sensitivity from the energy budget',
    best: 2.5,
    ranges: [range90(1.6, 4.8)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.2.1: 1850–1900 to 2006–2019',
    provenance: 'seen',
    remark:
      'For the feedback of the historical period, without the pattern effect. Uses 3.93 ± 0.47 W/m² for a doubling: the 5–95 % range by §7.3.2, one standard deviation by the wording of §7.5.1.',
  },
  {
    id: 'otto-2013-effcs',
    quantity: 'effective-climate-sensitivity',
    label: 'Otto et al. 2013, effective sensitivity, 2000s',
    best: 2,
    ranges: [range90(1.2, 3.9)],
    unit: kPerDoubling,
    edition: 'Otto et al. 2013',
    source: 'Nature Geoscience 6, 415–416',
    provenance: 'second-hand',
    remark: 'As quoted in AR6, chapter 7.',
  },
  {
    id: 'lewis-curry-2018-effcs',
    quantity: 'effective-climate-sensitivity',
    label: 'Lewis & Curry 2018, effective sensitivity',
    best: 1.5,
    ranges: [range90(1.05, 2.45)],
    unit: kPerDoubling,
    edition: 'Lewis & Curry 2018',
    source: 'Journal of Climate 31, 6051–6071, abstract',
    provenance: 'seen',
    remark: 'With an infilled temperature record 1.66 (1.15 – 2.7).',
  },
  {
    id: 'ar6-tcr',
    quantity: 'transient-climate-response',
    label: 'AR6 assessed TCR',
    best: 1.8,
    ranges: [likely(1.4, 2.2), veryLikely(1.2, 2.4)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.5: assessment over all lines of evidence',
    provenance: 'seen',
    remark: null,
  },
  {
    id: 'ar6-tcr-energy-budget',
    quantity: 'transient-climate-response',
    label: 'AR6 TCR from the energy budget',
    best: 1.9,
    ranges: [range90(1.3, 2.7)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.2.1: 1850–1900 to 2006–2019',
    provenance: 'seen',
    remark:
      'The central inputs printed there (1.03 °C, 2.20 and 3.93 W/m²) give 1.84, not 1.9. This difference is the report’s own; it is no mistake of a claim that quotes 1.9.',
  },
  {
    id: 'ar6-tcr-process',
    quantity: 'transient-climate-response',
    label: 'AR6 TCR from process understanding',
    best: 2,
    ranges: [likely(1.6, 2.7), veryLikely(1.3, 3.1)],
    unit: kPerDoubling,
    edition: ar6,
    source: 'Chapter 7, §7.5.1',
    provenance: 'seen',
    remark: null,
  },
  {
    id: 'otto-2013-tcr',
    quantity: 'transient-climate-response',
    label: 'Otto et al. 2013, TCR, 2000s',
    best: 1.3,
    ranges: [range90(0.9, 2)],
    unit: kPerDoubling,
    edition: 'Otto et al. 2013',
    source: 'Nature Geoscience 6, 415–416',
    provenance: 'second-hand',
    remark: 'As quoted in AR6, chapter 7.',
  },
  {
    id: 'lewis-curry-2018-tcr',
    quantity: 'transient-climate-response',
    label: 'Lewis & Curry 2018, TCR',
    best: 1.2,
    ranges: [range90(0.9, 1.7)],
    unit: kPerDoubling,
    edition: 'Lewis & Curry 2018',
    source: 'Journal of Climate 31, 6051–6071, abstract',
    provenance: 'seen',
    remark: 'With an infilled temperature record 1.33 (1.0 – 1.9).',
  },
  {
    id: 'ar5-ecs',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR5 assessed ECS',
    best: null,
    ranges: [likely(1.5, 4.5)],
    unit: kPerDoubling,
    edition: ar5,
    source: 'Chapter 12, box 12.2',
    provenance: 'memory',
    remark: 'Extremely unlikely below 1 °C, very unlikely above 6 °C; no best estimate was given. Superseded by AR6.',
  },
  {
    id: 'ar5-tcr',
    quantity: 'transient-climate-response',
    label: 'AR5 assessed TCR',
    best: null,
    ranges: [likely(1, 2.5)],
    unit: kPerDoubling,
    edition: ar5,
    source: 'Chapter 12, box 12.2',
    provenance: 'memory',
    remark: 'Extremely unlikely above 3 °C. Superseded by AR6.',
  },
  {
    id: 'ar4-ecs',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'AR4 assessed ECS',
    best: 3,
    ranges: [likely(2, 4.5)],
    unit: kPerDoubling,
    edition: ar4,
    source: 'Chapter 10, box 10.2',
    provenance: 'second-hand',
    remark: 'Best estimate “about 3 °C”; very unlikely below 1.5 °C. Superseded by AR5 and AR6.',
  },
  {
    id: 'ar4-tcr',
    quantity: 'transient-climate-response',
    label: 'AR4 assessed TCR',
    best: null,
    ranges: [{ interval: { low: 1, high: 3, levelPercent: 80 }, words: 'very likely above 1, very unlikely above 3' }],
    unit: kPerDoubling,
    edition: ar4,
    source: 'Chapter 10',
    provenance: 'memory',
    remark: 'Given as two one-sided statements at 90 %, here drawn as a central 80 %. Superseded by AR5 and AR6.',
  },
];

/** The published ranges of one quantity; none for a quantity that no publication assesses. */
export function publishedFor(quantity: QuantityId): PublishedValue[] {
  return publishedValues.filter((value) => value.quantity === quantity);
}
