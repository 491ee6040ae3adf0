import type { PublishedConflict } from '../contract/published.ts';

/** Where a publication says two things of one number. Both are shown wherever the number is. */
export const publishedConflicts: readonly PublishedConflict[] = [
  {
    id: 'ar6-doubling-uncertainty',
    title: 'What the ±0.47 W/m² of a CO₂ doubling in AR6 means',
    valueIds: ['ar6-doubling', 'ar6-ecs-process', 'ar6-effcs-energy-budget', 'ar6-tcr-energy-budget'],
    readings: [
      {
        words: '±12 %, the 5–95 % range; the standard deviation is then 0.286',
        source: 'AR6 WG1, §7.3.2.1, where it is derived',
        value: 0.286,
        unit: 'W/m²',
      },
      {
        words: 'one standard deviation',
        source: 'AR6 WG1, §7.5.1.1, where it is used',
        value: 0.47,
        unit: 'W/m²',
      },
    ],
    reason:
      'The report’s own percentiles of ECS from processes cannot decide it: recomputed with the first reading they are 2.12 to 7.89 (5–95 %), with the second 2.05 to 7.94, against 2.1 to 7.7 as printed. The feedback dominates.',
    taken:
      'The first, because it is stated where the number comes from. A claim that uses ±0.47 has to say which it means.',
  },
  {
    id: 'ar6-pattern-sign',
    title: 'The sign of the pattern effect in AR6’s formula',
    valueIds: ['ar6-ecs-pattern-observed', 'ar6-ecs-pattern-models', 'ar6-pattern-observed', 'ar6-pattern-models'],
    readings: [
      {
        words: 'ECS = F2x/(−α + α′), as printed: with α′ = +0.5 it lowers the energy-budget sensitivity of 2.5 to 1.90',
        source: 'AR6 WG1, §7.5.2.1, the formula',
        value: 1.9,
        unit: 'K per doubling',
      },
      {
        words: 'ECS = −F2x/(α + α′): 3.70 from the central inputs, beside 3.5 as printed',
        source: 'AR6 WG1, §7.5.2.1, the values',
        value: 3.7,
        unit: 'K per doubling',
      },
    ],
    reason:
      'Only the second gives the values that the report prints, 3.5 and 2.7, both above the 2.5 without a pattern effect.',
    taken: 'The second.',
  },
  {
    id: 'ar6-tcr-central',
    title: 'AR6’s TCR from the energy budget, and its own central inputs',
    valueIds: ['ar6-tcr-energy-budget'],
    readings: [
      { words: '1.9, as printed', source: 'AR6 WG1, §7.5.2.1, the result', value: 1.9, unit: 'K per doubling' },
      {
        words: '3.93 × 1.03/2.20 = 1.84, from the inputs as printed',
        source: 'AR6 WG1, §7.5.2.1, the inputs',
        value: 1.84,
        unit: 'K per doubling',
      },
    ],
    reason:
      'The report does not say. The range of its forcing is skewed, and the rounding of the inputs alone reaches 1.855, which would be printed as 1.9.',
    taken:
      '1.9 where the report is quoted, 1.84 where its budget is recomputed. The difference is no mistake of a claim.',
  },
  {
    id: 'ar6-erf-data-file',
    title: 'AR6’s forcing of 2019 in print and in a data file that goes with it',
    valueIds: ['ar6-erf-anthropogenic', 'ar6-erf-co2'],
    readings: [
      {
        words: '2.72 for all human influences, 2.16 for CO₂',
        source: 'AR6 WG1, chapter 7, §7.3',
        value: 2.72,
        unit: 'W/m²',
      },
      {
        words: '2.68047 for all human influences, 2.14886 for CO₂',
        source: 'AR6_ERF_1750-2019.csv, as stored by some',
        value: 2.68047,
        unit: 'W/m²',
      },
    ],
    reason: 'The file is of an earlier build than the printed table.',
    taken: 'The printed table. A series from the file is told by its digest, not by its name.',
  },
  {
    id: 'ar5-co2-uncertainty',
    title: 'The uncertainty of AR5’s CO₂ forcing, in AR5 and as AR6 quotes it',
    valueIds: ['ar5-rf-co2'],
    readings: [
      { words: '1.82 ± 0.19', source: 'AR5 WG1, chapter 8 (from memory)', value: 0.19, unit: 'W/m²' },
      { words: '1.82 ± 0.38', source: 'AR6 WG1, chapter 7, quoting AR5', value: 0.38, unit: 'W/m²' },
    ],
    reason: 'The second is twice the first. AR5 itself was not at hand, so it is not known here which one slipped.',
    taken: 'The first, from memory: look it up before it decides.',
  },
];
