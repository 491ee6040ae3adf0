import { createHash } from 'node:crypto';
import { claimComputation, claimSweepRequest, derivationRequest } from '../contract/compute.ts';
import type { Claim } from '../contract/claim.ts';
import type { Result, ResultMethod } from '../contract/result.ts';
import { seriesValues, type SeriesData } from '../contract/series.ts';
import { InputError, ProjectError } from '../errors.ts';
import { canonicalJson } from '../project/canonical-json.ts';
import type { Project } from '../project/project.ts';
import { claimSeries, type SeriesRole } from './procedure-series.ts';

/** A request as it is stored: plain JSON, each series by the digest of its values. */
export type StoredRequest = Result['request'];

/** What stands in the way of computing this claim, in sentences; empty when nothing does. */
export function obstacles(project: Project, claim: Claim): string[] {
  if (!claim.procedure) return ['The procedure is not chosen yet.'];
  const known = new Set(project.list('series').map((series) => series.id));
  return Object.entries(claimSeries(claim))
    .filter(([, id]) => !known.has(id))
    .map(([role, id]) => `${roleNames[role as SeriesRole]}: series ${id} is not in this project.`);
}

/** The request that a claim's method stands for now. */
export function requestFor(project: Project, claim: Claim, method: ResultMethod, minYears: number): StoredRequest {
  if (method === 'derivation') return { method, lines: claim.derivation };
  const { statement, procedure, tolerance, seed } = claim;
  if (!procedure) {
    throw new InputError({
      code: 'no-procedure',
      where: `Claim ${claim.id}`,
      expected: 'a procedure: how the number was obtained',
      received: 'none',
      hint: 'Choose one in the section Recomputation.',
    });
  }
  const { totalForcingSeriesId: _total, co2ForcingSeriesId: _co2, ...evidence } = claim.evidence;
  const series = Object.fromEntries(
    Object.entries(claimSeries(claim)).map(([role, id]) => {
      const { name, quantity, agent, unit, step, baseline, partialYears, valuesDigest } = project.get('series', id);
      return [role, { name, quantity, agent, unit, step, baseline, partialYears, valuesDigest }];
    }),
  );
  const request = { method, statement, procedure, tolerance, seed, evidence, series };
  // These stand on the statement, the procedure and its series alone: new evidence does not make them stale.
  if (method === 'recomputation' || method === 'estimators')
    return plain({ ...request, evidence: noEvidence, series: withoutForcing(series) });
  return plain(
    method === 'claim-sweep' ? { ...request, evidence: noEvidence, series: withoutForcing(series), minYears } : request,
  );
}

/** The computation that a stored request stands for: the same, with the values in place of their digests. */
export function resolveRequest(project: Project, request: StoredRequest) {
  const { method, ...input } = request;
  const series = Object.fromEntries(
    Object.entries(
      (input['series'] ?? {}) as Record<string, Omit<SeriesData, 'values'> & { valuesDigest: string }>,
    ).map(([role, { valuesDigest, ...description }]) => [
      role,
      { ...description, values: readValues(project, valuesDigest) },
    ]),
  );
  switch (method) {
    case 'derivation':
      return { method, input: derivationRequest.parse(input) } as const;
    case 'recomputation':
    case 'estimators':
    case 'assumptions':
      return { method, input: claimComputation.parse({ ...input, series }) } as const;
    case 'claim-sweep':
      return { method, input: claimSweepRequest.parse({ ...input, series }) } as const;
    default:
      throw new ProjectError({
        code: 'unknown-method',
        where: 'Stored result',
        expected: 'a method of this version',
        received: JSON.stringify(method),
        hint: 'The project may have been written by a newer version.',
      });
  }
}

export function requestDigest(request: StoredRequest): string {
  return createHash('sha256').update(canonicalJson(request)).digest('hex');
}

export function readValues(project: Project, digest: string) {
  return seriesValues.parse(JSON.parse(project.content(digest).toString('utf8')));
}

const noEvidence = { energyBudget: null, comparedWith: null, quotedRange: null, doublingWm2: null };

function withoutForcing(series: Record<string, unknown>): Record<string, unknown> {
  const { totalForcingSeriesId: _total, co2ForcingSeriesId: _co2, ...rest } = series;
  return rest;
}

const roleNames: Record<SeriesRole, string> = {
  temperatureSeriesId: 'Temperature',
  co2SeriesId: 'CO2',
  seriesId: 'Series of the trend or the imbalance',
  totalForcingSeriesId: 'Total forcing',
  co2ForcingSeriesId: 'CO2 forcing',
};

function plain(value: object): StoredRequest {
  return JSON.parse(JSON.stringify(value)) as StoredRequest;
}
