import { describe, expect, it } from 'vitest';
import { usualSplit } from '../../../src-main/contract/climate-response.ts';
import type { Procedure } from '../../../src-main/contract/procedure.ts';
import { procedureWords } from '../../../src-main/report/parts/procedure-words.ts';
import { inventedProject } from '../../helpers/invented-project.ts';
import { inventedClaim } from './invented-report.ts';

const words = (procedure: Procedure | null) =>
  procedureWords({ ...inventedClaim.claim, procedure }, inventedProject.series);
const input = (best: number) => ({ best, low: best, high: best, levelPercent: 90, source: '' });
const figures = (reference: number, value: number) => ({ kind: 'figures' as const, reference, value });

describe('procedureWords', () => {
  it.each<{ procedure: Procedure | null; says: string[] }>([
    { procedure: null, says: ['No procedure has been set.'] },
    {
      procedure: {
        kind: 'gregory',
        seriesId: 3,
        temperatureSeriesId: 1,
        minMonths: 11,
        window: { start: 1961, end: 2020 },
        split: usualSplit,
        divisor: 2.1,
        covariance: { kind: 'newey-west', lag: 4, smallSample: true },
      },
      says: [
        'imbalance N (forcing-total) on the warming ΔT (harbour-air)',
        'F/λ over 2.1',
        'Years 1–20 and 21–150, counted from the first',
        '1961–2020; annual means of monthly series need at least 11 of 12 months',
        'Newey–West, lag 4, Bartlett weights, with the small-sample factor',
      ],
    },
    {
      procedure: {
        kind: 'outgassing',
        source: 'takahashi1993',
        warmingK: -6,
        temperatureC: 15,
        salinity: null,
        co2Ppm: 280,
        toPpm: null,
      },
      says: ['a warming of −6\u202fK from 280\u202fppm', 'τ of Takahashi 1993, linear at 15\u202f°C'],
    },
    {
      procedure: {
        kind: 'forcing',
        formula: 'meinshausen2020',
        isEffective: true,
        co2Ppm: { kind: 'series', referenceYear: 1970, year: 2020 },
        co2SeriesId: 2,
        ch4Ppb: figures(700, 1800),
        n2oPpb: null,
      },
      says: ['CO₂ from gas-at-the-light', 'Meinshausen et al. 2020', 'effective forcing by the adjustments of AR6'],
    },
    {
      procedure: {
        kind: 'energy-budget',
        estimate: 'transient-climate-response',
        warmingK: input(1),
        forcingWm2: input(2),
        uptakeWm2: input(0.5),
        doublingWm2: input(3.9),
        patternWm2PerK: null,
        correlation: 0,
        draws: 7000,
      },
      says: ['giving the transient climate response', '7000 draws'],
    },
    {
      procedure: { kind: 'feedback', gives: 'feedback', known: input(3), doublingWm2: input(3.9), draws: 5000 },
      says: ['Feedback parameter λ = F2x/S', '5000 draws'],
    },
    {
      procedure: { kind: 'attribution', part: input(1), whole: input(2), unit: 'K', correlation: 0, draws: 3000 },
      says: ['Share of a part in a whole', '3000 draws'],
    },
  ])('says what $procedure.kind does', ({ procedure, says }) => {
    for (const said of says) expect(words(procedure)).toContain(said);
  });
});
