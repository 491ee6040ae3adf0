import fc from 'fast-check';

export const id = fc.constantFrom(1, 1, 1, 2, 2, 3);
/** Mostly the first. */
export const mostly = <Usual, Odd>(usual: fc.Arbitrary<Usual>, odd: fc.Arbitrary<Odd>): fc.Arbitrary<Usual | Odd> =>
  fc.oneof({ weight: 9, arbitrary: usual }, { weight: 1, arbitrary: odd });
export const text = mostly(
  fc.constantFrom('Invented words.', 'größer €', 'As stated, {stated}.'),
  fc.oneof(fc.constantFrom('', ' ', 'It is {no-such-figure}.'), fc.string({ unit: 'binary', maxLength: 40 })),
);
export const name = mostly(
  fc.constantFrom('warming', 'carbon', 'année — 5'),
  fc.constantFrom('x'.repeat(120), '__proto__', ''),
);
export const span = mostly(
  fc.record({ start: fc.integer({ min: 1990, max: 2000 }), end: fc.integer({ min: 2003, max: 2015 }) }),
  fc.record({ start: fc.integer({ min: 1985, max: 2018 }), end: fc.integer({ min: 1985, max: 2018 }) }),
);
const printed = mostly(fc.constantFrom('1.9', '0,20', '2.71'), fc.constantFrom('0', '-3', '1e308', '1e-320', 'two'));
export const given = <Value>(
  required: Record<string, fc.Arbitrary<Value>>,
  optional: Record<string, fc.Arbitrary<unknown>>,
) => fc.record({ ...required, ...optional }, { requiredKeys: Object.keys(required) });

const covariance = fc.oneof(
  fc.constant({ kind: 'classical' }),
  fc.record({ kind: fc.constant('newey-west'), lag: fc.integer({ min: 0, max: 30 }), smallSample: fc.boolean() }),
);
const anchor = fc.oneof(
  fc.constant({ kind: 'first-year' }),
  fc.record({ kind: fc.constant('mean-of-first'), years: fc.integer({ min: 1, max: 40 }) }),
);
export const months = fc.integer({ min: 1, max: 12 });
const logRegression = fc.record({
  kind: fc.constant('log-regression'),
  temperatureSeriesId: mostly(fc.constant(1), id),
  co2SeriesId: mostly(fc.constant(2), id),
  minMonths: months,
  window: fc.option(span),
  anchor,
  intercept: fc.boolean(),
  covariance,
  conversion: fc.constantFrom('per-doubling', 'per-e-folding'),
});
const trend = fc.record({
  kind: fc.constant('trend'),
  seriesId: mostly(fc.constant(1), id),
  minMonths: months,
  window: fc.option(span),
  covariance,
  per: fc.constantFrom('decade', 'year'),
});
const part = fc.record({ value: printed, unit: fc.constantFrom('K', 'W/m²', '') });
const ratio = fc.record({ kind: fc.constant('ratio'), numerator: part, denominator: part });
const statementOf = (quantity: string, unit: string) =>
  given(
    {
      words: text,
      quantity: mostly(fc.constant(quantity), fc.constantFrom('trend', 'equilibrium-climate-sensitivity')),
      value: printed,
      unit: mostly(fc.constant(unit), fc.constantFrom('K per doubling', '°F per doubling', '1', 'K per moon')),
    },
    {
      bound: fc.constantFrom('equals', 'at most', 'at least'),
      sourceId: mostly(fc.constant(null), id),
      statedRSquared: fc.constantFrom('0.88', '88 %', 'high', null),
      presentedAs: fc.constantFrom('equilibrium-climate-sensitivity', null),
    },
  );
/** A statement with a procedure that can give its number. */
export const checked = fc.oneof(
  { weight: 4, arbitrary: fc.tuple(statementOf('apparent-sensitivity', 'K per doubling'), logRegression) },
  { weight: 3, arbitrary: fc.tuple(statementOf('trend', 'K per decade'), trend) },
  { weight: 1, arbitrary: fc.tuple(statementOf('ratio', '1'), ratio) },
);
const uncertain = (best: number) =>
  fc.record({
    best: mostly(fc.constant(best), fc.constantFrom(0, -1)),
    low: fc.constantFrom(best - 0.3, best),
    high: fc.constantFrom(best + 0.3, best + 0.8, best),
    levelPercent: mostly(fc.constant(90), fc.constantFrom(68.27, 99.95)),
    source: text,
  });
const evidence = fc.record({
  totalForcingSeriesId: fc.constantFrom(null, 3, 4, 9),
  co2ForcingSeriesId: fc.constantFrom(null, 3, 4),
  energyBudget: fc.option(
    fc.record({
      warmingK: uncertain(1),
      forcingWm2: uncertain(2.2),
      uptakeWm2: uncertain(0.6),
      doublingWm2: uncertain(3.9),
    }),
  ),
  comparedWith: mostly(fc.constantFrom('ar6-ecs', null), fc.constant('no-such-value')),
  doublingWm2: fc.option(uncertain(3.9)),
});
export const claimParts = {
  answers: fc.constantFrom({}, { 'per-what': 'doubling' }),
  derivation: fc.array(fc.constantFrom('2.71 * ln(2) = 1.9', '1/0 = 2', '((', ''), { maxLength: 3 }),
  evidence,
  tolerance: mostly(
    fc.constant({ notableShare: 0.1, decisiveShare: 0.25 }),
    fc.constant({ notableShare: 0.9, decisiveShare: 0.1 }),
  ),
  seed: fc.integer({ min: 0, max: 9 }),
};
