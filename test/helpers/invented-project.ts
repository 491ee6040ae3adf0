import type { XyFigure } from '../../src-main/contract/figure.ts';
import type { ProjectView, Session } from '../../src-main/contract/project.ts';
import type { Dataset, ImportPreview, Series, SeriesValues } from '../../src-main/contract/series.ts';
import type { TrailEntry, TrailLine } from '../../src-main/contract/trail.ts';

/** A review of an invented talk for an invented port. Every name and number here is made up. */
export const digest = (seed: number): string =>
  Array.from({ length: 64 }, (_, place) => '0123456789abcdef'[(seed * 7 + place * place * 5 + place * 3) % 16]).join(
    '',
  );

const dataset = (id: number, fileName: string, readerId: string, more: Partial<Dataset> = {}): Dataset => ({
  id,
  fileName,
  sizeBytes: 9_412 + id * 1_377,
  contentDigest: digest(id),
  importedAt: '2031-03-03T12:51:00.000Z',
  readerId,
  readerVersion: '1',
  options: {},
  choices: [],
  nRows: 70 + id,
  leftOut: [],
  notes: ['A byte order mark at the beginning was passed over.'],
  licence: 'Invented for this example.',
  ...more,
});

const series = (id: number, datasetId: number, more: Partial<Series>): Series => ({
  id,
  datasetId,
  name: `series-${id}`,
  label: '',
  quantity: 'temperature-anomaly',
  agent: null,
  unit: 'K',
  step: 'year',
  baseline: null,
  partialYears: [],
  valuesDigest: digest(40 + id),
  startYear: 1961,
  endYear: 2030,
  nPresent: 70,
  nMissing: 0,
  nAbsent: 0,
  ...more,
});

export const inventedProject: ProjectView = {
  path: '/home/okonedo/Footing/marrowick-harbour-review.footing',
  project: { id: 1, title: 'Marrowick harbour review', createdAt: '2031-03-03T12:40:00.000Z', isInvented: true },
  isReadOnly: false,
  sources: [
    {
      id: 1,
      title: 'The roof over Marrowick',
      kind: 'talk',
      details: 'Talk of 31 minutes with 22 slides, held for the port’s planning office on 14 January.',
      file: { name: 'roof-over-marrowick.txt', sizeBytes: 23_611, digest: digest(3) },
    },
    {
      id: 2,
      title: 'Slides handed out afterwards',
      kind: 'deck',
      details: '22 slides, printed two to a page.',
      file: null,
    },
  ],
  datasets: [
    dataset(1, 'harbour-air.csv', 'delimited'),
    dataset(2, 'gas-at-the-light.txt', 'noaa-co2-monthly', {
      leftOut: [
        { line: 61, text: '1965   4   1965.2877   n/a', reason: 'the value “n/a” is no number and no missing mark' },
      ],
    }),
    dataset(3, 'forcing-by-agent.csv', 'forcing-table'),
  ],
  series: [
    series(1, 1, {
      name: 'harbour-air',
      label: 'Air temperature at Marrowick, annual',
      baseline: { start: 1961, end: 1990 },
    }),
    series(2, 2, {
      name: 'gas-at-the-light',
      label: 'CO₂ at the Outer Light, monthly',
      quantity: 'co2',
      unit: 'ppm',
      step: 'month',
      nPresent: 829,
      nMissing: 11,
      partialYears: [{ year: 2030, note: 'ends with August' }],
    }),
    series(3, 3, { name: 'forcing-total', label: 'Total forcing', quantity: 'forcing', agent: 'total', unit: 'W/m²' }),
    series(4, 3, { name: 'forcing-co2', label: 'Forcing of CO₂', quantity: 'forcing', agent: 'co2', unit: 'W/m²' }),
  ],
  claims: [
    {
      id: 1,
      title: 'Doubling adds 3.7 W/m²',
      unit: 'W/m²',
      stated: '3.7',
      statedValue: 3.7,
      recomputed: { value: 3.708, low: null, high: null },
      status: 'supported',
      isSigned: true,
    },
    {
      id: 2,
      title: 'At most 1.9 °C per doubling',
      unit: 'K per doubling',
      stated: 'at most 1.9',
      statedValue: 1.9,
      recomputed: { value: 1.872, low: 1.741, high: 2.003 },
      status: 'in review',
      isSigned: false,
    },
    {
      id: 3,
      title: 'The sea will add 0.3 °C, no more',
      unit: 'K per doubling',
      stated: 'at most 2.2',
      statedValue: 2.2,
      recomputed: { value: 2.71, low: 1.9, high: 4.4 },
      status: 'not supported',
      isSigned: false,
    },
    {
      id: 4,
      title: 'Half a degree a decade since the new mole was built',
      unit: 'K per decade',
      stated: '0.5',
      statedValue: 0.5,
      recomputed: null,
      status: 'not begun',
      isSigned: false,
    },
  ],
  head: { sequence: 218, hash: digest(9) },
  undo: 'mark assumption: claim 2 · zero-intercept',
  redo: null,
};

export const inventedSession: Session = {
  project: inventedProject,
  reviewer: { name: 'I. Okonedo', role: 'reviewer', publicKey: null, fingerprint: null },
  engineVersion: '0.1.0',
  host: 'electron',
  projectsDirectory: '/home/okonedo/Footing',
};

const years = Array.from({ length: 70 }, (_, index) => 1961 + index);
const anomalies = years.map((year, index) => Number((0.016 * index - 0.2 + 0.14 * Math.sin(year * 1.7)).toFixed(3)));

export const inventedValues: SeriesValues = {
  years,
  months: null,
  values: anomalies,
  lower: null,
  upper: null,
  boundsLevelPercent: null,
};

export const inventedFigure: XyFigure = {
  kind: 'xy',
  name: 'harbour-air',
  title: 'Air temperature at Marrowick',
  caption: 'Annual means as received, against 1961–1990.',
  digests: [digest(41)],
  xLabel: 'year',
  yLabel: 'anomaly (K)',
  isXYears: true,
  marks: [{ label: 'harbour-air', mark: 'line', x: years, y: anomalies, y2: null, role: 'data' }],
};

export const inventedPreview: ImportPreview = {
  fileName: 'quay-thermometer.csv',
  sizeBytes: 2_214,
  digest: digest(77),
  reader: {
    id: 'delimited',
    title: 'a table of delimited text',
    version: '1',
    why: 'Lines of four fields parted by semicolons; the first field of each is a year.',
  },
  readers: [
    { id: 'delimited', title: 'a table of delimited text' },
    { id: 'gistemp', title: 'GISTEMP table' },
    { id: 'noaa-co2-monthly', title: 'NOAA GML CO2, monthly' },
  ],
  sheet: null,
  sheets: [],
  series: [
    {
      key: 'column-1',
      suggestedName: 'quay-thermometer-air',
      label: 'air',
      quantity: 'temperature-anomaly',
      agent: null,
      unit: '',
      step: 'year',
      baseline: null,
      partialYears: [{ year: 2030, note: 'the last row may cover part of the year' }],
      unitFrom: 'unknown',
      baselineFrom: 'unknown',
      isMain: true,
      startYear: 1961,
      endYear: 2030,
      nPresent: 66,
      nMissing: 2,
      nAbsent: 2,
    },
    {
      key: 'column-2',
      suggestedName: 'quay-thermometer-water',
      label: 'water',
      quantity: 'other',
      agent: null,
      unit: '°C',
      step: 'year',
      baseline: null,
      partialYears: [],
      unitFrom: 'file',
      baselineFrom: 'not needed',
      isMain: false,
      startYear: 1961,
      endYear: 2030,
      nPresent: 68,
      nMissing: 0,
      nAbsent: 2,
    },
  ],
  nRows: 70,
  badRows: [
    { line: 23, text: '1982;o.17;11,2;', reason: '“o.17” is not a number; missing values are marked “x” in this file' },
    { line: 41, text: '1999;0,31;11,4;', reason: 'the year 1999 stands in line 40 already, with another value' },
  ],
  notes: ['Decimal commas were read.', 'Rows were not in time order and have been put in order.'],
  head: {
    lines: ['jahr;air;water;remark', '1961;-0,12;10,9;', '1962;-0,31;10,7;ice', '1963;x;10,8;', '1964;-0,02;11,0;'],
    columns: ['jahr', 'air', 'water', 'remark'],
    rows: [
      ['1961', '-0,12', '10,9', ''],
      ['1962', '-0,31', '10,7', 'ice'],
      ['1963', 'x', '10,8', ''],
      ['1964', '-0,02', '11,0', ''],
    ],
    options: {
      delimiter: ';',
      decimalMark: ',',
      commentMark: '#',
      headerLine: 1,
      timeColumn: 0,
      monthColumn: null,
      valueColumns: [1, 2],
      missingMarks: ['x'],
    },
  },
  alreadyImportedAs: null,
};

const trailLine = (
  sequence: number,
  at: string,
  action: string,
  subject: string,
  more: Partial<TrailLine> = {},
): TrailLine => ({
  sequence,
  at,
  reviewer: { name: 'I. Okonedo', role: 'reviewer' },
  action,
  subject,
  engineVersion: '0.1.0',
  undoes: null,
  hash: digest(sequence),
  claimIds: [],
  isUndone: false,
  canUndo: true,
  ...more,
});

export const inventedTrail: TrailLine[] = [
  trailLine(218, '2031-03-03T14:06:00.000Z', 'mark assumption', 'claim 2 · zero-intercept', { claimIds: [2] }),
  trailLine(217, '2031-03-03T14:05:00.000Z', 'test assumptions', 'claim 2', { claimIds: [2] }),
  trailLine(216, '2031-03-03T13:58:00.000Z', 'recompute', 'claim 2', { claimIds: [2] }),
  trailLine(215, '2031-03-03T13:55:00.000Z', 'change series', 'harbour-air', { isUndone: true }),
  trailLine(214, '2031-03-02T16:31:00.000Z', 'import dataset', 'harbour-air.csv'),
  trailLine(213, '2031-03-02T16:20:00.000Z', 'add source', 'The roof over Marrowick'),
];

export const inventedEntry: TrailEntry = {
  sequence: 215,
  at: '2031-03-03T13:55:00.000Z',
  reviewer: { name: 'I. Okonedo', role: 'reviewer' },
  action: 'change series',
  subject: 'harbour-air',
  engineVersion: '0.1.0',
  changes: [
    {
      kind: 'series',
      id: 1,
      before: { name: 'harbour-air', unit: '°C', baseline: null },
      after: { name: 'harbour-air', unit: 'K', baseline: { start: 1961, end: 1990 } },
    },
  ],
  content: [digest(41)],
  undoes: null,
};
