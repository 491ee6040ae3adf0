import type { Caveat } from '../../contract/primitives.ts';
import { parameterCaveats } from './check-parameters.ts';
import { searchBounds, type FitProblem, type FittedErrors } from './fit-likelihood.ts';
import type { FitSummit } from './fit-summit.ts';
import type { FitProfiles } from './fit-profiles.ts';

/** Far above every published range, and beyond what a constant feedback can stand for. */
const HARDLY_BOUNDED_K = 20;

interface FitDoubts {
  problem: FitProblem;
  fit: FittedErrors;
  profiles: Pick<FitProfiles, 'feedback' | 'exchange' | 'fallAtZeroFeedback'>;
  fallOfInterval: number;
  isEcsBoundedAbove: boolean;
  ecsHighK: number | null;
  summit: Pick<FitSummit, 'nClimbs' | 'nAtTop'>;
}

/**
 * What must stand beside a fit of the two-layer model. The bounds are common practice.
 *
 * @returns  forcing-taken-as-known always; ecs-unbounded-above, ecs-hardly-bounded, feedback-unbounded, exchange-unbounded, heat-capacity-at-bound,
 *           one-record, near-unit-root, several-summits, and those of the parameters
 *
 * Checked  test/unit/climate/two-layer/fit-caveats.test.ts (C: each on and off)
 */
export function fitCaveats(doubts: FitDoubts): Caveat[] {
  const { problem, fit, profiles, fallOfInterval, isEcsBoundedAbove, ecsHighK, summit } = doubts;
  const caveats: Caveat[] = [];
  const add = (isDoubtful: boolean, code: string, detail: string) => {
    if (isDoubtful) caveats.push({ code, detail });
  };
  add(
    !isEcsBoundedAbove,
    'ecs-unbounded-above',
    `These records cannot bound ECS from above: down to no feedback at all (λ → 0) the log-likelihood falls by ${profiles.fallAtZeroFeedback.toFixed(2)}, and ${fallOfInterval.toFixed(2)} would be needed.`,
  );
  add(
    (ecsHighK ?? 0) > HARDLY_BOUNDED_K,
    'ecs-hardly-bounded',
    `The upper end of ECS, ${ecsHighK?.toPrecision(2)} K, is a bound in name only: the likelihood falls by just ${profiles.fallAtZeroFeedback.toFixed(2)} down to no feedback at all.`,
  );
  add(
    profiles.feedback.high === null,
    'feedback-unbounded',
    `The records do not bound λ from above within ${searchBounds.feedback} W m⁻² K⁻¹, so ECS has no lower end above 0.`,
  );
  add(
    profiles.exchange.high === null,
    'exchange-unbounded',
    `The records do not bound the heat exchange γ from above within ${searchBounds.exchange} W m⁻² K⁻¹.`,
  );
  const atBound = (['heatCapacity', 'deepHeatCapacity'] as const).filter((name) => {
    const { low, high } = searchBounds[name];
    const value = fit.parameters[name];
    return problem[name] === null && (value < 1.01 * low || value > 0.99 * high);
  });
  add(
    atBound.length > 0,
    'heat-capacity-at-bound',
    `${atBound.join(' and ')} went to the bound of the search: the records do not say how large it is.`,
  );
  add(
    !problem.temperature || !problem.heatUptake,
    'one-record',
    `From ${problem.temperature ? 'temperature' : 'heat uptake'} alone feedback and heat exchange are hard to tell apart.`,
  );
  for (const [name, errors] of [
    ['temperature', fit.temperature],
    ['heat uptake', fit.heatUptake],
  ] as const) {
    add(
      (errors?.rho ?? 0) > 0.95,
      'near-unit-root',
      `Errors of the ${name} record carry over almost wholly (ρ = ${errors?.rho.toFixed(3)}): they may hold a trend that the model lacks.`,
    );
  }
  add(
    summit.nAtTop < summit.nClimbs,
    'several-summits',
    `${summit.nAtTop} of ${summit.nClimbs} climbs from different starts ended at the highest likelihood; the others lower.`,
  );
  add(
    true,
    'forcing-taken-as-known',
    'Forcing, efficacy and the forcing of a doubling are taken as known: their uncertainty would widen the intervals.',
  );
  const { heatCapacity, deepHeatCapacity, exchange, feedback, efficacy } = fit.parameters;
  return [
    ...caveats,
    ...parameterCaveats({
      heatCapacity: [heatCapacity],
      deepHeatCapacity: [deepHeatCapacity],
      exchange: [exchange],
      feedback: [feedback],
      efficacy: [efficacy],
    }),
  ];
}
