import { describe, expect, it } from 'vitest';
import { cautions } from '../../../src-main/contract/cautions.ts';
import { footing } from '../../helpers/command-line.ts';
import { project, workingFolder } from '../../helpers/review-folder.ts';

/** The story of a review, command by command; what each prints as JSON is looked at where it is made of one record. */
const story: [string[], (json: never) => void][] = [
  [
    ['new', project, '--title', 'Invented review', '--reviewer', 'Ilse Varrow-Oyelaran'],
    (view: object) => expect(view).toMatchObject({ project: { title: 'Invented review' }, head: { sequence: 1 } }),
  ],
  [
    ['import', project, 'GLB.Ts+dSST.csv', 'co2_mm_mlo.txt'],
    ([temperature, co2]: { series: object[] }[]) => {
      expect(temperature).toMatchObject({
        reader: { id: 'gistemp' },
        nRows: 40,
        leftOut: [],
        series: [
          { name: 'gistemp-annual', unit: 'K', baseline: { start: 1951, end: 1980 }, partialYears: [{ year: 2019 }] },
        ],
      });
      expect(co2?.series).toMatchObject([{ name: 'co2-mauna-loa-monthly', unit: 'ppm', step: 'month', nMissing: 0 }]);
    },
  ],
  [['undo', project], (view: object) => expect(view).toMatchObject({ datasets: [{ id: 1 }] })],
  [['redo', project], (view: object) => expect(view).toMatchObject({ datasets: [{ id: 1 }, { id: 2 }] })],
  [['series', project], (series: object[]) => expect(series).toMatchObject([{ id: 1 }, { id: 2 }])],
  [
    ['source', project, 'talk.txt', '--kind', 'transcript', '--title', 'A talk'],
    (sources: object[]) =>
      expect(sources).toMatchObject([{ title: 'A talk', kind: 'transcript', file: { sizeBytes: 56 } }]),
  ],
  [
    ['claim', project, 'claim.json'],
    (claim: object) => expect(claim).toMatchObject({ id: 1, procedure: { temperatureSeriesId: 1, co2SeriesId: 2 } }),
  ],
  [
    ['recompute', project],
    ([only]: object[]) =>
      expect(only).toMatchObject({
        claimId: 1,
        recomputation: { unit: 'K per doubling', fit: { window: { start: 1980, end: 2018 } } },
        derivation: { lines: [{ agrees: true }] },
      }),
  ],
  [
    ['assumptions', project, '--claim', '1'],
    (answer: { outcomes: object[] }) => expect(answer).toMatchObject({ ladder: { unit: 'K per doubling' } }),
  ],
  [
    ['sweep', project, '--min-years', '30'],
    (answer: { windows: { n: number }[] }) => {
      expect(answer.windows).toHaveLength(55); // 10 + 9 + … + 1 windows of 30 to 39 years
      expect(Math.min(...answer.windows.map(({ n }) => n))).toBe(30);
    },
  ],
  [['estimators', project], (answer: object) => expect(Object.keys(answer).length).toBeGreaterThan(1)],
  [
    ['mark', project, 'window', 'not met', '--note', 'The end year decides.'],
    (marks: object[]) => expect(marks).toMatchObject([{ assumptionId: 'window', mark: 'not met' }]),
  ],
  [
    ['note', project, 'A note in the margin.'],
    (note: object) => expect(note).toMatchObject({ claimId: 1, text: 'A note in the margin.' }),
  ],
  [
    ['finding', project, '--conclusion', 'cannot be determined', '--text', 'It gives {recomputed}.'],
    (finding: object) => expect(finding).toMatchObject({ conclusion: 'cannot be determined', isSigned: false }),
  ],
];

describe('a review by the built command line', () => {
  const folder = workingFolder();

  // One after the other: each goes on from the project that the one before has left.
  it.each(story)('%j prints its part of it as one JSON value, with messages apart', async (line, look) => {
    const ran = await footing(folder, [...line, '--json']);
    expect(ran, ran.errors).toMatchObject({ status: 0 });
    expect(ran.out).toBe(`${JSON.stringify(JSON.parse(ran.out))}\n`);
    look(JSON.parse(ran.out) as never);
    // The cautions of a finding are for whoever reads along.
    if (line[0] === 'finding') for (const caution of cautions) expect(ran.errors).toContain(caution);
    else expect(ran.errors).toBe('');
  });
});
