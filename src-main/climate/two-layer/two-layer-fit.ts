import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { TwoLayerFitInput, TwoLayerFitValue } from '../../contract/climate-response.ts';
import { NumericError } from '../../errors.ts';
import { simplexMaximum } from '../../statistics/simplex-maximum.ts';
import { fitCaveats } from './fit-caveats.ts';
import { fitLikelihood, parametersAt, type FitProblem, type FittedErrors } from './fit-likelihood.ts';
import { fitProblem } from './fit-problem.ts';
import { fitProfiles } from './fit-profiles.ts';
import { fitHeight, fitSteps, fitSummit } from './fit-summit.ts';
import { linearResponse } from './linear-response.ts';
import { sensitivities } from './sensitivities.ts';

const MOST_SUMMITS = 5;
/** W m⁻² K⁻¹; a λ below this is none: ECS would be a number without meaning. */
const NO_FEEDBACK = 1e-6;

/**
 * Fit of the two-layer model to what was observed: which feedback and heat exchange, and so which ECS, go with a
 * temperature record and a heat-uptake record under a given forcing — and whether the records can tell.
 *
 * Model    record = annual mean of the model (`yearlyResponse`) + offset + e, e_t = ρ e_(t−1) + u_t, for warming T and
 *          imbalance N each with its own ρ, σ; maximum of the exact likelihood over λ, γ ≥ 0 (and C, C0 where they are
 *          fitted). Intervals by profile likelihood: the values at which the log-likelihood, everything else fitted anew,
 *          lies z²/2 below its top (1.92 at 95 %). ECS = F2x/λ, with the ends of λ's interval turned round
 * Assumes  balance before the first year of the forcing; forcing, F2x and efficacy known, so that the intervals leave their
 *          uncertainty out; errors of both records normal, stationary and independent of each other; one λ at all times
 *
 * @param forcing            startYear and a value for each year from it on, W/m²
 * @param temperature        annual means, K; heatUptake  annual means, W/m²; years rising, gaps allowed; one of both needed
 * @param temperatureOffset  fitted: the record's baseline is its own; zero: it counts from the start of the forcing
 * @param heatCapacity, deepHeatCapacity  W yr m⁻² K⁻¹, or fitted within 0.5–100 and 5–5000
 * @param onProgress         called with the share done; may throw to stop
 * @returns  isEcsBoundedAbove false, and no upper end of ECS, where the likelihood at λ = 0 is not z²/2 below its top.
 *           λ and γ end at 0 where 0 belongs to the interval, and have no upper end where none lies within 20 W m⁻² K⁻¹
 * @throws   InputError too-few-values, no-record, outside-forcing, unordered-years, not-finite, out-of-range; NumericError exact-fit,
 *           not-settled
 *
 * Source   profile likelihood: Cox & Snell 1989; of climate parameters with AR errors: Aldrin et al. 2012,
 *          Environmetrics 23, 253–271 (from memory); Geoffroy et al. 2013a, b for the model
 * Checked  test/reference/climate/two-layer-fit.test.ts (B: R's eigen, arima and optim; C: coverage in worlds of known λ, γ)
 */
export function twoLayerFit(input: TwoLayerFitInput, onProgress?: (shareDone: number) => void): TwoLayerFitValue {
  const problem = fitProblem(input);
  const { doublingWm2, levelPercent } = input;
  const fallOfInterval = normalQuantile(0.5 + levelPercent / 200, 0, 1) ** 2 / 2;

  let summit = fitSummit(problem, (share) => onProgress?.(0.5 * share));
  refuseExact(problem, fitLikelihood(problem, parametersAt(problem, summit.at)));
  let profiles = fitProfiles(problem, summit, fallOfInterval, onProgress);
  for (let nSummits = 1; profiles.higher && nSummits < MOST_SUMMITS; nSummits++) {
    const higher = simplexMaximum(fitHeight(problem), profiles.higher.at, fitSteps(problem));
    summit = { ...higher, nClimbs: summit.nClimbs + 1, nAtTop: 1 };
    profiles = fitProfiles(problem, summit, fallOfInterval, onProgress);
  }
  if (profiles.higher) throw notSettled();
  const fit = fitLikelihood(problem, parametersAt(problem, summit.at));
  const { feedback, exchange, heatCapacity, deepHeatCapacity } = fit.parameters;
  const { low, high } = profiles.feedback;
  const isEcsBoundedAbove = profiles.fallAtZeroFeedback > fallOfInterval;
  const toEcs = (lambda: number | null) => (lambda === null || lambda < NO_FEEDBACK ? null : doublingWm2 / lambda);
  const ecsHighK = isEcsBoundedAbove ? toEcs(low) : null;
  return {
    feedbackWm2PerK: feedback,
    exchangeWm2PerK: exchange,
    heatCapacity,
    deepHeatCapacity,
    ecsK: toEcs(feedback),
    tcrK: sensitivities(linearResponse(fit.parameters), doublingWm2).tcrK,
    intervals: {
      feedbackWm2PerK: { low, high, levelPercent },
      exchangeWm2PerK: { ...profiles.exchange, levelPercent },
      ecsK: { low: toEcs(high), high: ecsHighK, levelPercent },
    },
    isEcsBoundedAbove,
    fallAtZeroFeedback: profiles.fallAtZeroFeedback,
    fallOfInterval,
    logLikelihood: fit.logLikelihood,
    temperature: recordAnswer(fit.temperature),
    heatUptake: recordAnswer(fit.heatUptake),
    starts: { nClimbs: summit.nClimbs, nAtTop: summit.nAtTop },
    caveats: fitCaveats({ problem, fit, profiles, fallOfInterval, isEcsBoundedAbove, ecsHighK, summit }),
  };
}

function recordAnswer(errors: FittedErrors['temperature']): TwoLayerFitValue['temperature'] {
  if (!errors) return null;
  const { level, rho, sigma, model } = errors;
  return { nObs: model.length, offset: level, rho, sigma, fitted: Array.from(model, (value) => value + level) };
}

function notSettled(): NumericError {
  return new NumericError({
    code: 'not-settled',
    where: 'twoLayerFit',
    expected: 'a likelihood with one highest point',
    received: `a higher one than the last, ${MOST_SUMMITS} times`,
    hint: 'The records hardly tell the parameters apart: give heat capacities instead of fitting them, or a longer record.',
  });
}

/** A record that was computed has no errors that could say anything. */
function refuseExact({ temperature, heatUptake }: FitProblem, fit: FittedErrors): void {
  for (const [name, record, errors] of [
    ['temperature', temperature, fit.temperature],
    ['heatUptake', heatUptake, fit.heatUptake],
  ] as const) {
    if (!record || !errors || errors.sigma > 1e-6 * Math.max(...record.values.map(Math.abs))) continue;
    throw new NumericError({
      code: 'exact-fit',
      where: `twoLayerFit, ${name}`,
      expected: 'a record that scatters about the model',
      received: 'an exact fit',
      hint: 'Check that the record was observed: one that a model computed has no errors to judge the fit by.',
    });
  }
}
