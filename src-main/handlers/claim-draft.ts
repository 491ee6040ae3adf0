import type { Claim, ClaimDraft } from '../contract/claim.ts';
import { usualSplit } from '../contract/climate-response.ts';
import { InputError } from '../errors.ts';
import type { Project } from '../project/project.ts';
import { checkQuotedRange } from '../quantities/check-quoted-range.ts';
import { publishedValues } from '../quantities/published-values.ts';
import { procedureSeries } from './procedure-series.ts';

/** A draft with its defaults filled in and its series found by name. */
export function completeDraft(project: Project, draft: ClaimDraft): Omit<Claim, 'id'> {
  const find = (reference: number | string, field: string) => findSeries(project, reference, field);
  const findOrNull = (reference: number | string | null | undefined, field: string) =>
    reference === null || reference === undefined ? null : find(reference, field);
  const record: Omit<Claim, 'id'> = {
    title: draft.title,
    statement: {
      sourceId: null,
      locator: '',
      bound: 'equals',
      definition: '',
      presentedAs: null,
      statedRSquared: null,
      ...withoutUndefined(draft.statement),
    },
    answers: draft.answers ?? {},
    derivation: draft.derivation ?? [],
    procedure: completeProcedure(draft.procedure, find),
    evidence: {
      energyBudget: draft.evidence?.energyBudget ?? null,
      comparedWith: draft.evidence?.comparedWith ?? null,
      quotedRange: draft.evidence?.quotedRange ?? null,
      doublingWm2: draft.evidence?.doublingWm2 ?? null,
      totalForcingSeriesId: findOrNull(draft.evidence?.totalForcingSeriesId, 'evidence.totalForcingSeriesId'),
      co2ForcingSeriesId: findOrNull(draft.evidence?.co2ForcingSeriesId, 'evidence.co2ForcingSeriesId'),
    },
    tolerance: draft.tolerance ?? { notableShare: 0.1, decisiveShare: 0.25 },
    seed: draft.seed ?? 20_261,
  };
  checkClaim(project, record);
  return record;
}

/** The ends of a 5–95 % range are then known to less than a hundredth of its width. */
const defaultDraws = 100_000;

function completeProcedure(
  procedure: ClaimDraft['procedure'],
  find: (reference: number | string, field: string) => number,
): Claim['procedure'] {
  if (!procedure) return null;
  switch (procedure.kind) {
    case 'log-regression':
      return {
        minMonths: 12,
        window: null,
        anchor: { kind: 'first-year' },
        intercept: false,
        covariance: { kind: 'classical' },
        conversion: 'per-doubling',
        ...withoutUndefined(procedure),
        temperatureSeriesId: find(procedure.temperatureSeriesId, 'procedure.temperatureSeriesId'),
        co2SeriesId: find(procedure.co2SeriesId, 'procedure.co2SeriesId'),
      };
    case 'trend':
      return {
        minMonths: 12,
        window: null,
        covariance: { kind: 'classical' },
        per: 'decade',
        ...withoutUndefined(procedure),
        seriesId: find(procedure.seriesId, 'procedure.seriesId'),
      };
    case 'ratio':
      return procedure;
    case 'energy-budget':
      return {
        estimate: 'effective-climate-sensitivity',
        patternWm2PerK: null,
        correlation: 0,
        draws: defaultDraws,
        ...withoutUndefined(procedure),
      };
    case 'forcing':
      return {
        isEffective: false,
        ch4Ppb: null,
        n2oPpb: null,
        ...withoutUndefined(procedure),
        co2SeriesId:
          procedure.co2SeriesId === undefined || procedure.co2SeriesId === null
            ? null
            : find(procedure.co2SeriesId, 'procedure.co2SeriesId'),
      };
    case 'feedback':
      return { draws: defaultDraws, ...withoutUndefined(procedure) };
    case 'attribution':
      return { correlation: 0, draws: defaultDraws, ...withoutUndefined(procedure) };
    case 'outgassing':
      return { warmingK: 1, salinity: null, toPpm: null, ...withoutUndefined(procedure) };
    case 'gregory':
      return {
        minMonths: 12,
        window: null,
        split: usualSplit,
        divisor: 2,
        covariance: { kind: 'classical' },
        ...withoutUndefined(procedure),
        seriesId: find(procedure.seriesId, 'procedure.seriesId'),
        temperatureSeriesId: find(procedure.temperatureSeriesId, 'procedure.temperatureSeriesId'),
      };
  }
}

function findSeries(project: Project, reference: number | string, field: string): number {
  const all = project.list('series');
  const found = all.find((series) => series.id === reference || series.name === reference);
  if (found) return found.id;
  throw new InputError({
    code: 'unknown-series',
    where: field,
    expected: `a series of this project (${all.map((series) => series.name).join(', ') || 'there is none yet'})`,
    received: String(reference).slice(0, 80),
    hint: 'Import it first, or correct the name.',
  });
}

/**
 * Everything that a claim names is there, and its tolerance can be met.
 *
 * @throws InputError unknown-series, unknown-source, unknown-published-value, tolerance-order; as `checkQuotedRange`
 */
export function checkClaim(project: Project, { statement, procedure, evidence, tolerance }: Omit<Claim, 'id'>): void {
  for (const [field, id] of Object.entries(procedureSeries(procedure))) findSeries(project, id, `procedure.${field}`);
  for (const field of ['totalForcingSeriesId', 'co2ForcingSeriesId'] as const) {
    const id = evidence[field];
    if (id !== null) findSeries(project, id, `evidence.${field}`);
  }
  const sources = project.list('source').map(({ id }) => id);
  if (statement.sourceId !== null && !sources.includes(statement.sourceId)) {
    throw new InputError({
      code: 'unknown-source',
      where: 'statement.sourceId',
      expected: `the number of a source of this project (${sources.join(', ') || 'there is none yet'})`,
      received: String(statement.sourceId),
      hint: 'Attach the source first, or leave it open.',
    });
  }
  if (evidence.comparedWith !== null) checkPublishedValues('evidence.comparedWith', [evidence.comparedWith]);
  if (evidence.quotedRange !== null) checkQuotedRange('evidence.quotedRange', evidence.quotedRange);
  if (tolerance.notableShare > tolerance.decisiveShare) {
    throw new InputError({
      code: 'tolerance-order',
      where: 'tolerance',
      expected: 'a notable share that is not above the decisive one',
      received: `${tolerance.notableShare} above ${tolerance.decisiveShare}`,
      hint: 'Change one of the two.',
    });
  }
}

/** @throws InputError unknown-published-value */
export function checkPublishedValues(where: string, ids: readonly string[]): void {
  const known = publishedValues.map((value) => value.id);
  const unknown = ids.find((id) => !known.includes(id));
  if (unknown === undefined) return;
  throw new InputError({
    code: 'unknown-published-value',
    where,
    expected: 'the id of a published value of this version',
    received: unknown.slice(0, 80),
    hint: `Known: ${known.join(', ')}.`,
  });
}

function withoutUndefined<Value extends object>(
  value: Value,
): { [Key in keyof Value]: Exclude<Value[Key], undefined> } {
  return Object.fromEntries(Object.entries(value).filter(([, entry]) => entry !== undefined)) as {
    [Key in keyof Value]: Exclude<Value[Key], undefined>;
  };
}
