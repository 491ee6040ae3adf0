import type { PublishedValue } from '../../contract/finding.ts';
import { ar4, ar5, ar6, igcc, publishedEntry, range90 } from './published-entry.ts';

const unit = 'W/m²';
const erf = 'effective-radiative-forcing' as const;
const rf = 'radiative-forcing' as const;

type AgentRow = readonly [id: string, agent: string, best: number, low: number, high: number, remark?: string];

const since1750: readonly AgentRow[] = [
  ['anthropogenic', 'all human influences', 2.72, 1.96, 3.48],
  ['co2', 'CO₂', 2.16, 1.9, 2.41],
  ['ch4', 'CH₄', 0.54, 0.43, 0.65],
  ['n2o', 'N₂O', 0.21, 0.18, 0.24],
  ['halogenated', 'halogenated gases', 0.41, 0.33, 0.49],
  ['well-mixed', 'all well-mixed greenhouse gases', 3.32, 3.03, 3.61],
  ['ozone', 'ozone', 0.47, 0.24, 0.71],
  ['stratospheric-water', 'stratospheric water vapour from methane', 0.05, 0, 0.1],
  ['greenhouse-gases', 'greenhouse gases with ozone and stratospheric water vapour', 3.84, 3.46, 4.22],
  ['land-use', 'albedo of land use', -0.2, -0.3, -0.1],
  ['black-carbon-on-snow', 'black carbon on snow', 0.08, 0, 0.18],
  ['contrails', 'contrails and aviation cirrus', 0.06, 0.02, 0.1],
  ['aerosol', 'aerosols', -1.1, -1.7, -0.4, 'For 2019; the headline assessment, −1.3 [−2.0 to −0.6], is for 2014.'],
];

const aerosolsIn2014: readonly AgentRow[] = [
  ['aerosol-2014', 'aerosols', -1.3, -2, -0.6],
  ['aerosol-radiation-2014', 'aerosols, by their radiation', -0.3, -0.6, 0],
  ['aerosol-cloud-2014', 'aerosols, by clouds', -1, -1.7, -0.3],
];

function ar6Rows(rows: readonly AgentRow[], period: string): PublishedValue[] {
  return rows.map(([id, agent, best, low, high, remark = null]) =>
    publishedEntry({
      id: `ar6-erf-${id}`,
      quantity: erf,
      subject: `${agent}, ${period}`,
      label: `AR6 effective forcing, ${agent}, ${period}`,
      best,
      ranges: [range90(low, high)],
      unit,
      edition: ar6,
      source: 'Chapter 7, §7.3',
      provenance: 'seen',
      remark,
    }),
  );
}

const igccIn2024 = [
  ['total', 'all influences, natural ones too', 3.29999],
  ['anthropogenic', 'all human influences', 2.9712],
  ['co2', 'CO₂', 2.33136],
  ['ch4', 'CH₄', 0.56725],
  ['n2o', 'N₂O', 0.2256],
  ['ozone', 'ozone', 0.50222],
  ['aerosol', 'aerosols', -1.06621],
] as const;

function igccRow(id: string, agent: string, year: number, best: number): PublishedValue {
  return publishedEntry({
    id: `igcc-erf-${id}-${year}`,
    quantity: erf,
    subject: `${agent}, 1750–${year}`,
    label: `IGCC effective forcing, ${agent}, 1750–${year}`,
    best,
    unit,
    edition: igcc,
    source: 'Table of effective radiative forcing, best estimates',
    provenance: 'seen',
    remark: 'An update with AR6’s methods, not an assessment; no range is on record here.',
  });
}

/** Forcing of each agent since 1750: AR6, what has been added since, and the reports before. */
export const forcingByAgent: readonly PublishedValue[] = [
  ...ar6Rows(since1750, '1750–2019'),
  ...ar6Rows(aerosolsIn2014, '1750–2014'),
  publishedEntry({
    id: 'ar6-erf-solar',
    quantity: erf,
    subject: 'the sun, 1750–2019',
    label: 'AR6 effective forcing, the sun, 1750–2019',
    best: -0.02,
    ranges: [range90(-0.08, 0.06)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.3',
    provenance: 'memory',
  }),
  ...igccIn2024.map(([id, agent, best]) => igccRow(id, agent, 2024, best)),
  igccRow('anthropogenic', 'all human influences', 2023, 2.84795),
  publishedEntry({
    id: 'ar5-erf-aerosol',
    quantity: erf,
    subject: 'aerosols, 1750–2011',
    label: 'AR5 effective forcing, aerosols, 1750–2011',
    best: -0.9,
    ranges: [range90(-1.9, -0.1)],
    unit,
    edition: ar5,
    source: 'Chapter 8',
    provenance: 'second-hand',
    remark: 'As quoted in AR6, chapter 7. Superseded by AR6.',
  }),
  publishedEntry({
    id: 'ar5-rf-anthropogenic',
    quantity: rf,
    subject: 'all human influences, 1750–2011',
    label: 'AR5 radiative forcing, all human influences, 1750–2011',
    best: 2.29,
    ranges: [range90(1.13, 3.33)],
    unit,
    edition: ar5,
    source: 'Summary for policymakers, section C',
    provenance: 'memory',
    remark: 'Superseded by AR6.',
  }),
  publishedEntry({
    id: 'ar5-rf-co2',
    quantity: rf,
    subject: 'CO₂, 1750–2011',
    label: 'AR5 radiative forcing, CO₂, 1750–2011',
    best: 1.82,
    ranges: [range90(1.63, 2.01)],
    unit,
    edition: ar5,
    source: 'Chapter 8',
    provenance: 'memory',
    remark: '±0.19 in AR5; AR6’s text quotes it as ±0.38. Superseded by AR6.',
  }),
  publishedEntry({
    id: 'ar4-rf-anthropogenic',
    quantity: rf,
    subject: 'all human influences, 1750–2005',
    label: 'AR4 radiative forcing, all human influences, 1750–2005',
    best: 1.6,
    ranges: [range90(0.6, 2.4)],
    unit,
    edition: ar4,
    source: 'Summary for policymakers and chapter 2',
    provenance: 'memory',
    remark: 'Superseded by AR5 and AR6.',
  }),
];
