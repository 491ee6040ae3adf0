import type { PublishedValue } from '../../contract/finding.ts';
import { ar6, likely, publishedEntry, veryLikely } from './published-entry.ts';

const base = { unit: 'K', edition: ar6, provenance: 'seen' as const };

const observed = [
  ['2011-2020', 'global, 2011–2020 minus 1850–1900', 1.09, 0.95, 1.2],
  ['2011-2020-land', 'land, 2011–2020 minus 1850–1900', 1.59, 1.34, 1.83],
  ['2011-2020-ocean', 'ocean, 2011–2020 minus 1850–1900', 0.88, 0.68, 1.01],
  ['2001-2020', 'global, 2001–2020 minus 1850–1900', 0.99, 0.84, 1.1],
  ['2010-2019', 'global, 2010–2019 minus 1850–1900', 1.06, 0.88, 1.21],
] as const;

const attributed = [
  ['human', 'all human influences', 1.07, 0.8, 1.3],
  ['greenhouse-gases', 'well-mixed greenhouse gases', 1.4, 1, 2],
  ['other-human', 'other human influences', -0.32, -0.8, 0],
  ['natural', 'natural influences', 0.03, -0.1, 0.1],
] as const;

/** Warming as observed, and by cause. */
export const observedWarming: readonly PublishedValue[] = [
  ...observed.map(([id, subject, best, low, high]) =>
    publishedEntry({
      ...base,
      id: `ar6-warming-${id}`,
      quantity: 'warming',
      subject,
      label: `AR6 observed warming, ${subject}`,
      best,
      ranges: [veryLikely(low, high)],
      source: 'Summary for policymakers, section A.1; chapter 2, §2.3.1',
    }),
  ),
  ...attributed.map(([id, cause, best, low, high]) =>
    publishedEntry({
      ...base,
      id: `ar6-attributed-${id}`,
      quantity: 'attributed-warming',
      subject: `${cause}, 2010–2019 minus 1850–1900`,
      label: `AR6 warming from ${cause}, 2010–2019 minus 1850–1900`,
      best,
      ranges: [likely(low, high)],
      source: 'Summary for policymakers, section A.1 and figure SPM.2; chapter 3',
      remark: 'That the range is a likely one is from memory.',
    }),
  ),
  publishedEntry({
    ...base,
    id: 'ar6-attributed-human-1750',
    quantity: 'attributed-warming',
    subject: 'all human influences, 1750–2019, emulator',
    label: 'AR6 human-forced warming, 1750–2019, by emulator',
    best: 1.29,
    ranges: [veryLikely(0.99, 1.65)],
    source: 'Chapter 7, §7.3.5',
  }),
];
