import type { PublishedValue } from '../../contract/finding.ts';
import { above, ar6, likely, publishedEntry, range90, veryLikely } from './published-entry.ts';

const unit = 'K per doubling';

/** AR6: equilibrium and effective sensitivity, and TCR. The assessed range of each comes first. */
export const ar6Sensitivities: readonly PublishedValue[] = [
  {
    id: 'ar6-ecs',
    quantity: 'equilibrium-climate-sensitivity' as const,
    label: 'AR6 assessed ECS',
    best: 3,
    ranges: [likely(2.5, 4), veryLikely(2, 5)],
    limits: [above(1.5, 'virtually certain')],
    source: 'Chapter 7, §7.5.5: assessment over all lines of evidence',
    remark: 'Virtually certain to be above 1.5 °C; the upper end of 5 °C is given with medium confidence.',
  },
  {
    id: 'ar6-ecs-process',
    quantity: 'equilibrium-climate-sensitivity' as const,
    label: 'AR6 ECS from process understanding',
    best: 3.4,
    ranges: [likely(2.5, 5.1), veryLikely(2.1, 7.7)],
    source: 'Chapter 7, §7.5.1: doubling forcing over assessed feedback',
    remark:
      'Uses 3.93 ± 0.47 W/m² for a doubling. §7.3.2 gives ±0.47 as the 5–95 % range, §7.5.1 calls it one standard deviation; the percentiles come out nearly the same, because the feedback dominates.',
  },
  {
    id: 'ar6-ecs-pattern-observed',
    quantity: 'equilibrium-climate-sensitivity' as const,
    label: 'AR6 energy budget with the pattern effect, from observed sea surface temperatures',
    best: 3.5,
    ranges: [range90(1.7, 13.8)],
    source: 'Chapter 7, §7.5.2.1: α′ = +0.5 ± 0.5 W/m² per °C',
    remark: 'The formula as printed has the sign of α′ reversed; the values printed follow −F2x/(α + α′).',
  },
  {
    id: 'ar6-ecs-pattern-models',
    quantity: 'equilibrium-climate-sensitivity' as const,
    label: 'AR6 energy budget with the pattern effect, from coupled models',
    best: 2.7,
    ranges: [range90(1.7, 5.9)],
    source: 'Chapter 7, §7.5.2.1: α′ = +0.1 ± 0.3 W/m² per °C',
  },
  {
    id: 'ar6-effcs-energy-budget',
    quantity: 'effective-climate-sensitivity' as const,
    label: 'AR6 effective sensitivity from the energy budget',
    best: 2.5,
    ranges: [range90(1.6, 4.8)],
    source: 'Chapter 7, §7.5.2.1: 1850–1900 to 2006–2019',
    remark:
      'For the feedback of the historical period, without the pattern effect. Uses 3.93 ± 0.47 W/m² for a doubling: the 5–95 % range by §7.3.2, one standard deviation by the wording of §7.5.1.',
  },
  {
    id: 'ar6-tcr',
    quantity: 'transient-climate-response' as const,
    label: 'AR6 assessed TCR',
    best: 1.8,
    ranges: [likely(1.4, 2.2), veryLikely(1.2, 2.4)],
    source: 'Chapter 7, §7.5.5: assessment over all lines of evidence',
  },
  {
    id: 'ar6-tcr-energy-budget',
    quantity: 'transient-climate-response' as const,
    label: 'AR6 TCR from the energy budget',
    best: 1.9,
    ranges: [range90(1.3, 2.7)],
    source: 'Chapter 7, §7.5.2.1: 1850–1900 to 2006–2019',
    remark:
      'The central inputs printed there (1.03 °C, 2.20 and 3.93 W/m²) give 1.84, not 1.9. This difference is the report’s own; it is no mistake of a claim that quotes 1.9.',
  },
  {
    id: 'ar6-tcr-process',
    quantity: 'transient-climate-response' as const,
    label: 'AR6 TCR from process understanding',
    best: 2,
    ranges: [likely(1.6, 2.7), veryLikely(1.3, 3.1)],
    source: 'Chapter 7, §7.5.1',
  },
].map((entry) => publishedEntry({ ...entry, unit, edition: ar6, provenance: 'seen' }));
