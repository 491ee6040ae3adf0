import type { PublishedValue } from '../../contract/finding.ts';
import { likely, publishedEntry, range90 } from './published-entry.ts';

const unit = 'K per doubling';
const effcs = 'effective-climate-sensitivity' as const;
const tcr = 'transient-climate-response' as const;

const otto = {
  unit,
  edition: 'Otto et al. 2013',
  source: 'Nature Geoscience 6, 415–416',
};
const lewisCurry2015 = {
  unit,
  edition: 'Lewis & Curry 2015',
  source: 'Climate Dynamics 45, 1009–1023; 1859–1882 to 1995–2011',
  provenance: 'memory' as const,
};
const lewisCurry2018 = {
  unit,
  edition: 'Lewis & Curry 2018',
  source: 'Journal of Climate 31, 6051–6071, abstract',
  provenance: 'seen' as const,
};

/** What single studies of the historical energy budget came to. */
export const budgetSensitivities: readonly PublishedValue[] = [
  publishedEntry({
    ...otto,
    id: 'otto-2013-effcs',
    quantity: effcs,
    label: 'Otto et al. 2013, effective sensitivity, 2000s',
    best: 2,
    ranges: [range90(1.2, 3.9)],
    provenance: 'second-hand',
    remark: 'As quoted in AR6, chapter 7.',
  }),
  publishedEntry({
    ...otto,
    id: 'otto-2013-effcs-1970-2009',
    quantity: effcs,
    label: 'Otto et al. 2013, effective sensitivity, 1970–2009',
    best: 1.9,
    ranges: [range90(0.9, 5)],
    provenance: 'memory',
  }),
  publishedEntry({
    ...lewisCurry2018,
    id: 'lewis-curry-2018-effcs',
    quantity: effcs,
    label: 'Lewis & Curry 2018, effective sensitivity',
    best: 1.5,
    ranges: [range90(1.05, 2.45)],
    remark: 'With an infilled temperature record 1.66 (1.15 – 2.7).',
  }),
  publishedEntry({
    ...lewisCurry2018,
    id: 'lewis-curry-2018-effcs-infilled',
    quantity: effcs,
    label: 'Lewis & Curry 2018, effective sensitivity, infilled temperature record',
    best: 1.66,
    ranges: [range90(1.15, 2.7)],
  }),
  publishedEntry({
    ...lewisCurry2018,
    id: 'lewis-curry-2018-ecs-infilled',
    quantity: 'equilibrium-climate-sensitivity',
    label: 'Lewis & Curry 2018, with time-varying feedback, infilled temperature record',
    best: 1.76,
    ranges: [range90(1.2, 3.1)],
  }),
  publishedEntry({
    ...lewisCurry2015,
    id: 'lewis-curry-2015-effcs',
    quantity: effcs,
    label: 'Lewis & Curry 2015, effective sensitivity',
    best: 1.64,
    ranges: [range90(1.05, 4.05)],
  }),
  publishedEntry({
    id: 'sherwood-2020-effcs',
    quantity: effcs,
    label: 'Sherwood et al. 2020, effective sensitivity from all lines of evidence',
    ranges: [likely(2.6, 3.9), range90(2.3, 4.7)],
    unit,
    edition: 'Sherwood et al. 2020',
    source: 'Reviews of Geophysics 58, e2019RG000678',
    provenance: 'memory',
    remark: 'Their robust ranges, over other defensible choices, are 2.3 – 4.5 (66 %) and 2.0 – 5.7 (90 %).',
  }),
  publishedEntry({
    id: 'gregory-2002-effcs',
    quantity: effcs,
    label: 'Gregory et al. 2002, effective sensitivity',
    best: 6.1,
    ranges: [range90(1.6, null)],
    unit,
    edition: 'Gregory et al. 2002',
    source: 'Journal of Climate 15, 3117–3121; 1861–1900 to 1957–1994',
    provenance: 'memory',
    remark:
      'The median, and no upper bound: forcing may not exceed heat uptake within their uncertainties. The 1.6 is second-hand.',
  }),
  publishedEntry({
    ...otto,
    id: 'otto-2013-tcr',
    quantity: tcr,
    label: 'Otto et al. 2013, TCR, 2000s',
    best: 1.3,
    ranges: [range90(0.9, 2)],
    provenance: 'second-hand',
    remark: 'As quoted in AR6, chapter 7.',
  }),
  publishedEntry({
    ...otto,
    id: 'otto-2013-tcr-1970-2009',
    quantity: tcr,
    label: 'Otto et al. 2013, TCR, 1970–2009',
    best: 1.4,
    ranges: [range90(0.7, 2.5)],
    provenance: 'memory',
  }),
  publishedEntry({
    ...lewisCurry2018,
    id: 'lewis-curry-2018-tcr',
    quantity: tcr,
    label: 'Lewis & Curry 2018, TCR',
    best: 1.2,
    ranges: [range90(0.9, 1.7)],
    remark: 'With an infilled temperature record 1.33 (1.0 – 1.9).',
  }),
  publishedEntry({
    ...lewisCurry2018,
    id: 'lewis-curry-2018-tcr-infilled',
    quantity: tcr,
    label: 'Lewis & Curry 2018, TCR, infilled temperature record',
    best: 1.33,
    ranges: [range90(1, 1.9)],
  }),
  publishedEntry({
    ...lewisCurry2015,
    id: 'lewis-curry-2015-tcr',
    quantity: tcr,
    label: 'Lewis & Curry 2015, TCR',
    best: 1.33,
    ranges: [range90(0.9, 2.5)],
  }),
];
