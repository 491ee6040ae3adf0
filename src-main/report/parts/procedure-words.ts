import type { Claim } from '../../contract/claim.ts';
import {
  fitsLine,
  type AttributionProcedure,
  type EnergyBudgetProcedure,
  type FeedbackProcedure,
  type ForcingProcedure,
  type GregoryProcedure,
  type LineProcedure,
  type OutgassingProcedure,
  type SlopeCovariance,
} from '../../contract/procedure.ts';
import type { Series } from '../../contract/series.ts';
import { exchangeSourceNames } from '../../quantities/exchange-source-names.ts';
import { formulaNames } from '../../quantities/formula-names.ts';
import { formatYears, withUnit } from '../../quantities/notation.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';

/** A procedure in one paragraph: enough to run it again by hand. */
export function procedureWords({ procedure }: Claim, series: readonly Series[]): string {
  if (procedure === null) return 'No procedure has been set.';
  const name = (id: number) => series.find((one) => one.id === id)?.name ?? `series ${id}`;
  if (procedure.kind === 'ratio') {
    const { numerator, denominator } = procedure;
    return `${numerator.value} ${numerator.unit} divided by ${denominator.value} ${denominator.unit}, both as stated.`;
  }
  if (procedure.kind === 'gregory') {
    const { early, late } = procedure.split;
    return `Gregory regression: least-squares line of the imbalance N (${name(procedure.seriesId)}) on the warming ΔT (${name(procedure.temperatureSeriesId)}), N = F − λΔT; the number is F/λ over ${procedure.divisor}. Years ${early.from}–${early.to} and ${late.from}–${late.to}, counted from the first, also have lines of their own; ${yearsWords(procedure)}`;
  }
  if (!fitsLine(procedure)) return figuresWords(procedure, name);
  const common = yearsWords(procedure);
  if (procedure.kind === 'trend') {
    return `Least-squares line with intercept of ${name(procedure.seriesId)} on time, given per ${procedure.per}; ${common}`;
  }
  const anchor =
    procedure.anchor.kind === 'first-year'
      ? 'the values of the first year'
      : `the means over the first ${procedure.anchor.years} years`;
  const line = procedure.intercept ? 'with a free intercept' : 'through zero';
  const conversion =
    procedure.conversion === 'per-doubling' ? 'the slope times ln 2' : 'the slope itself, per e-folding';
  return `Least-squares line ${line} of T − T₀ (${name(procedure.temperatureSeriesId)}) on ln(C/C₀) (${name(procedure.co2SeriesId)}), C₀ and T₀ being ${anchor}; the number is ${conversion}; ${common}`;
}

/** The procedures that work from a few figures; these stand in the tables below. */
function figuresWords(
  procedure: EnergyBudgetProcedure | ForcingProcedure | FeedbackProcedure | AttributionProcedure | OutgassingProcedure,
  name: (id: number) => string,
): string {
  switch (procedure.kind) {
    case 'energy-budget':
      return `Energy budget between two periods, giving the ${quantityNames[procedure.estimate].label}; the number is that of the central inputs, its range that of ${procedure.draws} draws from the ranges of the inputs.`;
    case 'forcing': {
      const source = procedure.co2SeriesId === null ? '' : `, CO₂ from ${name(procedure.co2SeriesId)}`;
      const adjusted = procedure.isEffective ? ', turned into effective forcing by the adjustments of AR6' : '';
      return `Forcing of a change of concentrations${source}, by the formulas of ${formulaNames[procedure.formula]}${adjusted}.`;
    }
    case 'feedback':
      return `${procedure.gives === 'sensitivity' ? 'Sensitivity S = F2x/λ from the feedback parameter' : 'Feedback parameter λ = F2x/S from the sensitivity'} and the forcing of a doubling; its range is that of ${procedure.draws} draws.`;
    case 'attribution':
      return `Share of a part in a whole, 100 · part/whole; its range is that of ${procedure.draws} draws.`;
    case 'outgassing':
      return `Rise of CO₂ with a warming of ${given(procedure.warmingK, 'K')} from ${given(procedure.co2Ppm, 'ppm')}, C = C₀ exp(ΔT/τ), with the exchange coefficient τ of ${exchangeSourceNames[procedure.source]} at ${given(procedure.temperatureC, '°C')}.`;
  }
}

const given = (value: number, unit: string) => withUnit(String(value).replace('-', '−'), unit);

function yearsWords({ window, minMonths, covariance }: LineProcedure | GregoryProcedure): string {
  const years = window === null ? 'all years that can be used' : formatYears(window);
  return `${years}; annual means of monthly series need at least ${minMonths} of 12 months. ${covarianceWords(covariance)}`;
}

function covarianceWords(covariance: SlopeCovariance): string {
  if (covariance.kind === 'classical') return 'Standard errors: classical, for independent errors of equal variance.';
  const sample = covariance.smallSample ? 'with' : 'without';
  return `Standard errors: Newey–West, lag ${covariance.lag}, Bartlett weights, ${sample} the small-sample factor.`;
}
