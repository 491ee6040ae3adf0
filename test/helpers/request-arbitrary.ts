import fc from 'fast-check';
import { assumptionId } from '../../src-main/contract/result.ts';
import { checked, claimParts, given, id, months, mostly, name, span, text } from './claim-arbitrary.ts';
import { passphrase } from './command-line.ts';
import { requestNames, type RequestName } from '../../src-main/contract/request-names.ts';

/** A request as it might come in: mostly of the right form, about things that may or may not be there. */
export interface AnyRequest {
  name: RequestName;
  input: unknown;
}

/** Invented records. */
const years = Array.from({ length: 26 }, (_, place) => 1990 + place);
const table = (header: string, row: (year: number, place: number) => string) => [header, ...years.map(row)].join('\n');
const files = {
  'warming.csv': table('year,temp (K)', (year, t) => `${year},${(0.02 * t + 0.06 * Math.sin(t)).toFixed(3)}`),
  'constant.csv': table('year,temp (K)', (year) => `${year},0.5`),
  'fahrenheit.csv': table('year,temp (°F)', (year, t) => `${year},${(50 + 0.04 * t).toFixed(2)}`),
  'carbon.csv': table('year,CO2 (ppm)', (year, t) => `${year},${(354 + 1.7 * t).toFixed(2)}`),
  'zero.csv': table('year,CO2 (ppm)', (year, t) => `${year},${t === 3 ? 0 : 354 + t}`),
  'forcing.csv': table(
    'year,co2,total',
    (year, t) => `${year},${(1.2 + 0.03 * t).toFixed(3)},${(1.5 + 0.04 * t).toFixed(3)}`,
  ),
  'untidy.csv': 'year;temp\n1990;0,1\n1991;abc\n1992;0,3\n1992;0,35\n1993;0,2\n1995;\n1996;0,4\n',
  'words.txt': 'no numbers here\n',
  'empty.csv': '',
};
/** By file, the keys of its series. */
const keys: Record<keyof typeof files, string[]> = {
  'warming.csv': ['temp-k'],
  'constant.csv': ['temp-k'],
  'fahrenheit.csv': ['temp-f'],
  'carbon.csv': ['co2-ppm'],
  'zero.csv': ['co2-ppm'],
  'forcing.csv': ['co2', 'total'],
  'untidy.csv': ['temp'],
  'words.txt': [],
  'empty.csv': [],
};

const base64 = (text: string) => Buffer.from(text, 'utf8').toString('base64');
const ofClaim = (fields: Record<string, fc.Arbitrary<unknown>> = {}) => fc.record({ claimId: id, ...fields });
const importInput = fc.constantFrom(...(Object.keys(files) as (keyof typeof files)[])).chain((fileName) =>
  fc.record({
    fileName: fc.constant(fileName),
    bytes: fc.constant(base64(files[fileName])),
    options: mostly(fc.constant({}), fc.constantFrom({ readerId: 'gistemp' }, { delimited: { delimiter: ';' } })),
    choices: fc.array(
      given(
        { key: mostly(fc.constantFrom(...keys[fileName], 'temp'), fc.constant('no-such-series')) },
        { name, unit: mostly(fc.constantFrom('K', 'ppm'), fc.constantFrom('bananas', '')), baseline: fc.option(span) },
      ),
      { minLength: 1, maxLength: 2 },
    ),
    leaveOutBadRows: fc.boolean(),
  }),
);
const figure = fc.record({
  kind: fc.constant('xy'),
  name,
  title: text,
  caption: text,
  digests: fc.constant([]),
  xLabel: text,
  yLabel: text,
  isXYears: fc.boolean(),
  marks: fc.array(
    fc.record({
      label: text,
      mark: fc.constantFrom('points', 'line', 'band'),
      x: fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { maxLength: 4 }),
      y: fc.array(fc.option(fc.double({ noNaN: true, noDefaultInfinity: true })), { maxLength: 4 }),
      y2: fc.constantFrom(null, [1, 2]),
      role: fc.constantFrom('data', 'stated', 'alternative', 'reference'),
    }),
    { maxLength: 3 },
  ),
});

/** By request, with how often it comes. Jobs are cancelled and projects made elsewhere. */
const inputs: Partial<Record<RequestName, [number, fc.Arbitrary<unknown>]>> = {
  'session.get': [1, fc.constant({})],
  'project.view': [1, fc.constant({})],
  'project.rename': [1, fc.record({ title: text })],
  'project.verify': [1, fc.constant({})],
  'project.recheck': [1, fc.constant({})],
  'source.save': [
    4,
    given(
      { title: text, kind: mostly(fc.constantFrom('talk', 'paper'), fc.constant('sermon')), details: text },
      { file: fc.constantFrom(null, { name: 'talk.txt', bytes: base64('Invented words.') }) },
    ),
  ],
  'source.remove': [1, fc.record({ sourceId: id })],
  'data.preview': [1, importInput.map(({ fileName, bytes, options }) => ({ fileName, bytes, options }))],
  'data.import': [4, importInput],
  'dataset.remove': [1, fc.record({ datasetId: id })],
  'series.get': [1, fc.record({ seriesId: id })],
  'series.update': [
    3,
    given(
      { seriesId: id },
      {
        name,
        label: text,
        quantity: fc.constantFrom('temperature-anomaly', 'co2', 'forcing', 'other'),
        unit: fc.constantFrom('K', '°C', 'ppm', 'W/m²', ''),
        baseline: fc.option(span),
      },
    ),
  ],
  'series.rebase': [2, fc.record({ seriesId: id, baseline: span, minMonths: months })],
  'claim.create': [
    5,
    fc
      .tuple(given({ title: text }, claimParts), checked)
      .map(([parts, [statement, procedure]]) => ({ ...parts, statement, procedure })),
  ],
  'claim.update': [5, ofClaim({ change: given({}, { title: text, ...claimParts }) })],
  'claim.remove': [1, ofClaim()],
  'claim.view': [2, ofClaim()],
  'claim.derive': [2, ofClaim()],
  'claim.recompute': [6, ofClaim()],
  'claim.testAssumptions': [4, ofClaim()],
  'claim.sweep': [2, ofClaim({ minYears: fc.integer({ min: 2, max: 30 }) })],
  'claim.compareEstimators': [2, ofClaim()],
  'claim.mark': [
    4,
    ofClaim({
      assumptionId: fc.constantFrom(...assumptionId.options),
      mark: fc.constantFrom('met', 'not met', 'untested'),
      note: text,
    }),
  ],
  'note.add': [2, ofClaim({ text })],
  'note.remove': [2, ofClaim({ noteId: id })],
  'finding.save': [
    6,
    ofClaim({
      conclusion: fc.constantFrom('supported', 'not supported', 'cannot be determined', 'cannot be determined', null),
      text,
      conditions: text,
      publishedValueIds: mostly(fc.constantFrom([], ['ar6-ecs']), fc.constant(['no-such-value'])),
    }),
  ],
  'finding.sign': [
    3,
    ofClaim({
      passphrase: mostly(fc.constant(passphrase), fc.constant('another one')),
      meaning: fc.constantFrom('sign-off', 'counter-signature', 'dissent'),
      remark: text,
    }),
  ],
  'finding.revise': [2, ofClaim({ reason: text })],
  'trail.list': [1, given({ limit: fc.integer({ min: 0, max: 20 }) }, { claimId: id, before: id })],
  'trail.entry': [1, fc.record({ sequence: fc.integer({ min: 0, max: 30 }) })],
  'trail.undo': [2, fc.constant({})],
  'trail.redo': [2, fc.constant({})],
  'report.render': [2, given({}, { claimIds: fc.array(id, { maxLength: 2 }) })],
  'figure.export': [1, fc.record({ figure, format: fc.constantFrom('svg', 'csv') })],
  compute: [
    1,
    given(
      { method: fc.constantFrom('regression', 'derivation', 'toString') },
      { lines: fc.constant(['1 + 1 = 2']), x: id },
    ),
  ],
};

const wellFormed = fc.oneof(
  ...Object.entries(inputs).map(([requestName, [weight, input]]) => ({
    weight,
    arbitrary: input.map((value): AnyRequest => ({ name: requestName as RequestName, input: value })),
  })),
);

/** Anything at all as input, and now and then a field too many in a good one. */
const malformed = fc.oneof(
  fc.record({
    // An empty object would unpack the whole worked example.
    name: fc.constantFrom(...requestNames.filter((requestName) => requestName !== 'project.openDemo')),
    input: fc.jsonValue(),
  }),
  wellFormed.map((request) => ({ ...request, input: { ...(request.input as object), surplus: 1 } })),
);

/** Requests that go well, and give the rest something to work on. */
export const preparation: readonly AnyRequest[] = [
  ...(['warming.csv', 'carbon.csv', 'forcing.csv'] as const).map((fileName): AnyRequest => {
    const choices = keys[fileName].map((key) => ({ key }));
    const bytes = base64(files[fileName]);
    return { name: 'data.import', input: { fileName, bytes, options: {}, choices, leaveOutBadRows: false } };
  }),
  {
    name: 'claim.create',
    input: {
      title: 'Invented',
      statement: { words: 'w', quantity: 'apparent-sensitivity', value: '1.9', unit: 'K per doubling' },
      procedure: { kind: 'log-regression', temperatureSeriesId: 1, co2SeriesId: 2 },
    },
  },
];

/** The steps to a signature, in their order; chance alone hardly ever finds it. */
const toSignature = id.map((claimId): AnyRequest[] => {
  const words = { text: 'Invented words.', conditions: '', publishedValueIds: [] };
  return [
    { name: 'claim.recompute', input: { claimId } },
    { name: 'claim.testAssumptions', input: { claimId } },
    ...assumptionId.options.map((one): AnyRequest => {
      return { name: 'claim.mark', input: { claimId, assumptionId: one, mark: 'untested', note: '' } };
    }),
    { name: 'finding.save', input: { claimId, conclusion: 'cannot be determined', ...words } },
    { name: 'finding.sign', input: { claimId, passphrase, meaning: 'sign-off', remark: '' } },
  ];
});

/** One request, or a few that belong together. */
export const requestsArbitrary: fc.Arbitrary<AnyRequest[]> = fc.oneof(
  { weight: 40, arbitrary: wellFormed.map((request) => [request]) },
  { weight: 3, arbitrary: malformed.map((request) => [request]) },
  { weight: 2, arbitrary: toSignature },
);
