import type { PublishedValue } from '../../contract/finding.ts';
import { ar5, ar6, publishedEntry, range90, veryLikely } from './published-entry.ts';

const seen = { edition: ar6, source: 'Chapter 7, §7.2.2', provenance: 'seen' as const };

const gains = [
  ['2006-2018', '2006–2018', 0.79, [0.52, 1.06], 153, [101, 206]],
  ['1971-2018', '1971–2018', 0.57, [0.43, 0.72], 435, [325, 545]],
] as const;

const shares = [
  ['ocean', 'ocean', 91],
  ['land', 'land', 5],
  ['ice', 'ice', 3],
  ['atmosphere', 'atmosphere', 1],
] as const;

/** Heat that the planet takes up, as a flux, as a gain, and where it goes. */
export const energyInventory: readonly PublishedValue[] = [
  ...gains.map(([id, period, best, [low, high]]) =>
    publishedEntry({
      ...seen,
      id: `ar6-imbalance-${id}`,
      quantity: 'energy-imbalance',
      subject: period,
      label: `AR6 energy imbalance, ${period}`,
      best,
      ranges: [veryLikely(low, high)],
      unit: 'W/m²',
    }),
  ),
  publishedEntry({
    ...seen,
    id: 'ar6-imbalance-1850-1900',
    quantity: 'energy-imbalance',
    subject: '1850–1900',
    label: 'AR6 energy imbalance, 1850–1900',
    best: 0.2,
    ranges: [range90(0, 0.4)],
    unit: 'W/m²',
    source: 'Chapter 7, §7.5.2.1',
    remark: 'Assumed there, not observed.',
  }),
  publishedEntry({
    id: 'ar5-imbalance-1971-2010',
    quantity: 'energy-imbalance',
    subject: '1971–2010',
    label: 'AR5 energy imbalance, 1971–2010',
    best: 0.59,
    unit: 'W/m²',
    edition: ar5,
    source: 'Chapter 3, box 3.1',
    provenance: 'memory',
    remark: 'Superseded by AR6.',
  }),
  ...gains.map(([id, period, , , best, [low, high]]) =>
    publishedEntry({
      ...seen,
      id: `ar6-inventory-${id}`,
      quantity: 'energy-inventory',
      subject: period,
      label: `AR6 energy gain, ${period}`,
      best,
      ranges: [veryLikely(low, high)],
      unit: 'ZJ',
    }),
  ),
  ...shares.map(([id, place, best]) =>
    publishedEntry({
      ...seen,
      id: `ar6-inventory-share-${id}`,
      quantity: 'inventory-share',
      subject: `${place}, 1971–2018`,
      label: `AR6 share of the energy gain, ${place}, 1971–2018`,
      best,
      unit: '%',
    }),
  ),
];
