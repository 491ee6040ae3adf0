import type { Claim } from '../contract/claim.ts';
import type { ClaimComputation } from '../contract/compute.ts';
import type { Procedure } from '../contract/procedure.ts';

export type SeriesRole = keyof ClaimComputation['series'];
type SeriesRoles = Partial<Record<SeriesRole, number>>;

/** The series that a procedure works on, by the field that names each. */
export function procedureSeries(procedure: Procedure | null): SeriesRoles {
  switch (procedure?.kind) {
    case 'log-regression':
      return { temperatureSeriesId: procedure.temperatureSeriesId, co2SeriesId: procedure.co2SeriesId };
    case 'trend':
      return { seriesId: procedure.seriesId };
    case 'gregory':
      return { seriesId: procedure.seriesId, temperatureSeriesId: procedure.temperatureSeriesId };
    case 'forcing':
      return procedure.co2SeriesId === null ? {} : { co2SeriesId: procedure.co2SeriesId };
    default:
      return {};
  }
}

/** The series that a claim stands on: those of its procedure and those of its evidence. */
export function claimSeries({ procedure, evidence }: Pick<Claim, 'procedure' | 'evidence'>): SeriesRoles {
  const { totalForcingSeriesId, co2ForcingSeriesId } = evidence;
  return {
    ...procedureSeries(procedure),
    ...(totalForcingSeriesId === null ? {} : { totalForcingSeriesId }),
    ...(co2ForcingSeriesId === null ? {} : { co2ForcingSeriesId }),
  };
}
