import type { GregoryLine, GregoryValue } from '../../contract/climate-response.ts';
import type { GregoryProcedure } from '../../contract/procedure.ts';
import type { WorkingTable } from '../../contract/result.ts';
import type { SeriesData } from '../../contract/series.ts';
import { formatYearList, formatYears } from '../../quantities/notation.ts';
import type { WindowedColumns } from './align-window.ts';

/**
 * The figures of a Gregory regression as tables: what goes in, the lines through all years and through parts, the bracket,
 * the convention.
 *
 * @param series  of the imbalance and of the warming
 *
 * Checked   test/unit/climate/procedures/gregory-working.test.ts (C: points on a line, by hand)
 */
export function gregoryWorking(
  procedure: GregoryProcedure,
  series: readonly [SeriesData, SeriesData],
  aligned: WindowedColumns,
  answer: GregoryValue,
): WorkingTable[] {
  return [
    inputTable(procedure, series, aligned),
    lineTable(procedure, aligned, answer),
    bracketTable(procedure, answer),
    { caption: 'How it was worked out', columns: ['Convention'], rows: [[answer.convention]] },
  ];
}

function inputTable(
  { divisor }: GregoryProcedure,
  [imbalance, temperature]: readonly [SeriesData, SeriesData],
  { window, years, leftOut }: WindowedColumns,
): WorkingTable {
  return {
    caption: 'What goes in',
    columns: ['Quantity', 'Value'],
    rows: [
      ['imbalance N', imbalance.name],
      ['warming ΔT', temperature.name],
      ['years', `${formatYears(window)}, ${years.length} of them`],
      ...(leftOut.length === 0 ? [] : [['years left out', formatYearList(leftOut.map(({ year }) => year))]]),
      ['equilibrium is divided by', String(divisor)],
    ],
  };
}

function lineTable(
  { divisor, split: { early, late } }: GregoryProcedure,
  { window }: WindowedColumns,
  answer: GregoryValue,
): WorkingTable {
  const row = (label: string, line: GregoryLine | null) => [
    line ? `${label} (n = ${line.nYears})` : label,
    line?.forcingWm2 ?? null,
    line?.forcingStandardErrorWm2 ?? null,
    line?.feedbackWm2PerK ?? null,
    line?.feedbackStandardErrorWm2PerK ?? null,
    line?.equilibriumK ?? null,
    line?.equilibriumStandardErrorK ?? null,
    overDivisor(line, divisor),
  ];
  return {
    caption:
      'The line N = F − λΔT through all years and through parts, counted from the first; a dash: too few, or unbounded',
    columns: ['Years', 'F (W/m²)', 'F ±', 'λ (W/m² per K)', 'λ ±', 'F/λ (K)', 'F/λ ±', 'K per doubling'],
    rows: [
      row(`all, ${formatYears(window)}`, answer),
      row(`${early.from}–${early.to}`, answer.early),
      row(`${late.from}–${late.to}`, answer.late),
    ],
  };
}

function bracketTable({ divisor }: GregoryProcedure, { bracket }: GregoryValue): WorkingTable {
  const named = [
    ['in N: N on ΔT, as above', bracket?.imbalanceOnWarming],
    ['in ΔT: ΔT on N, turned round', bracket?.warmingOnImbalance],
    ['in both: total least squares', bracket?.totalLeastSquares],
  ] as const;
  return {
    caption: 'The same points with their scatter laid to one or both',
    columns: ['Scatter', 'F (W/m²)', 'λ (W/m² per K)', 'F/λ (K)', 'K per doubling'],
    rows: named.map(([label, line]) => [
      label,
      line?.forcingWm2 ?? null,
      line?.feedbackWm2PerK ?? null,
      line?.equilibriumK ?? null,
      overDivisor(line, divisor),
    ]),
  };
}

function overDivisor(line: { equilibriumK: number | null } | null | undefined, divisor: number): number | null {
  return line?.equilibriumK === null || line?.equilibriumK === undefined ? null : line.equilibriumK / divisor;
}
