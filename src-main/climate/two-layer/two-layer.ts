import type { ResponseForcing, TwoLayerInput, TwoLayerValue } from '../../contract/climate-response.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { finiteNumber, finiteValues } from '../../statistics/finite-values.ts';
import { checkForcing } from './check-forcing.ts';
import { checkParameter, parameterCaveats, parameterNames } from './check-parameters.ts';
import { flowIntegral } from './flow-integral.ts';
import { advanced, imbalanceWm2, type LayerState } from './layer-state.ts';
import { linearResponse, type LinearResponse, type TwoLayerParameters } from './linear-response.ts';
import { sensitivities } from './sensitivities.ts';

const REST: LayerState = { surfaceK: 0, deepK: 0 };

/**
 * Two-layer energy-balance model: the warming of the surface and of the deep ocean, and the heat that the planet takes
 * up, after a forcing sets in on a planet in balance.
 *
 * Model    C dT/dt = F − λT − εγ(T − T0), C0 dT0/dt = γ(T − T0), N = F − λT − (ε − 1)γ(T − T0). Solved by its two modes,
 *          without time steps: a step and a ramp from the start to each time at once, annual forcing from year to year with
 *          the forcing held within each. ECS = F2x/λ. a_f = τ_f λ (b* + √δ)/(2C√δ) and a_s = 1 − a_f are the shares of both
 *          modes, φ_f,s = C(b* ∓ √δ)/(2εγ) their deep-ocean ratios
 * Assumes  T = T0 = 0 at the start; λ, γ, ε constant in time
 *
 * @param heatCapacity, deepHeatCapacity  W yr m⁻² K⁻¹; exchange (γ ≥ 0), feedback (λ > 0)  W m⁻² K⁻¹; efficacy (ε ≥ 0)
 * @param forcing      W/m²; annual: a value for each year
 * @param years        times since the start, at least 0; annual: up to the end of the forcing
 * @param doublingWm2  F2x above 0, or left out: ECS and TCR are then null, since a forcing does not say how many
 *                     doublings it stands for
 * @returns  caveats outside-published, no-exchange, no-efficacy, one-time-scale, no-doubling-forcing
 * @throws   InputError no-restoring-feedback, out-of-range, not-finite
 *
 * Differs  codes that step forward by a year or a month are off by some hundredths of a kelvin after an abrupt change;
 *          an efficacy can also be put on the imbalance instead of on the exchange
 * Source   Geoffroy et al. 2013a, b, J. Climate 26, 1841–1857 and 1859–1876; Held et al. 2010, J. Climate 23, 2418–2427
 * Checked  test/reference/climate/two-layer.test.ts (B: R's eigen, an integration of the equations; C: tabulated values)
 */
export function twoLayer(input: TwoLayerInput): TwoLayerValue {
  const parameters: TwoLayerParameters = { ...input, efficacy: input.efficacy ?? 1 };
  for (const name of parameterNames) checkParameter('twoLayer', name, parameters[name]);
  const { forcing, doublingWm2 } = input;
  checkForcing('twoLayer', forcing);
  const latest = forcing.kind === 'annual' ? forcing.wm2.length : 1e6;
  const years = finiteValues('twoLayer', 'years', input.years);
  years.forEach((time, i) => finiteNumber('twoLayer', `years[${i}]`, time, { atLeast: 0, atMost: latest }));
  if (doublingWm2 !== undefined) finiteNumber('twoLayer', 'doublingWm2', doublingWm2, { above: 0, atMost: 1e6 });

  const response = linearResponse(parameters);
  const reached = statesUnder(response, forcing, years);
  const sensitivity = doublingWm2 === undefined ? null : sensitivities(response, doublingWm2);
  return {
    surfaceK: reached.map(({ state }) => state.surfaceK),
    deepK: reached.map(({ state }) => state.deepK),
    imbalanceWm2: reached.map(({ state, forcingWm2 }) => imbalanceWm2(parameters, forcingWm2, state)),
    ecsK: sensitivity?.ecsK ?? null,
    tcrK: sensitivity?.tcrK ?? null,
    tcrOnePercentK: sensitivity?.tcrOnePercentK ?? null,
    tcrNoDeepWarmingK: sensitivity?.tcrNoDeepWarmingK ?? null,
    ...modes(response),
    caveats: caveatsOf(response, doublingWm2),
  };
}

interface Reached {
  state: LayerState;
  /** At that time; at the turn of a year that of the year that ends. */
  forcingWm2: number;
}

function statesUnder(response: LinearResponse, forcing: ResponseForcing, years: Float64Array): Reached[] {
  const { heatCapacity } = response.parameters;
  if (forcing.kind === 'annual') return statesUnderAnnual(response, Float64Array.from(forcing.wm2), years);
  const [times, unit] = forcing.kind === 'step' ? [1, forcing.wm2] : [2, forcing.wm2PerYr];
  return Array.from(years, (time) => {
    const flow = flowIntegral(response, times, time);
    const state = {
      surfaceK: (flow.surfaceFromSurface * unit) / heatCapacity,
      deepK: (flow.deepFromSurface * unit) / heatCapacity,
    };
    return { state, forcingWm2: forcing.kind === 'step' ? unit : unit * time };
  });
}

function statesUnderAnnual(response: LinearResponse, wm2: Float64Array, years: Float64Array): Reached[] {
  const { heatCapacity } = response.parameters;
  const [flow, integral] = [flowIntegral(response, 0, 1), flowIntegral(response, 1, 1)];
  const atStartOfYear = [REST];
  for (const value of wm2) atStartOfYear.push(advanced(atStartOfYear.at(-1)!, flow, integral, value / heatCapacity));
  return Array.from(years, (time) => {
    const year = Math.max(0, Math.ceil(time) - 1);
    const [rest, forcingWm2] = [time - year, wm2[year]!];
    if (rest === 1) return { state: atStartOfYear[year + 1]!, forcingWm2 };
    const state = advanced(
      atStartOfYear[year]!,
      flowIntegral(response, 0, rest),
      flowIntegral(response, 1, rest),
      forcingWm2 / heatCapacity,
    );
    return { state, forcingWm2 };
  });
}

type Modes = Pick<TwoLayerValue, 'fastYr' | 'slowYr' | 'fastShare' | 'slowShare' | 'fastDeepRatio' | 'slowDeepRatio'>;

function modes({ parameters, fastRate, slowRate, spread, surfaceExcess, deepExcess }: LinearResponse): Modes {
  const { heatCapacity, exchange, feedback, efficacy } = parameters;
  const perMode = feedback / heatCapacity / spread;
  const ratio = heatCapacity / (efficacy * exchange);
  const hasRatios = efficacy * exchange > 0;
  return {
    fastYr: -1 / fastRate,
    slowYr: slowRate === 0 ? null : -1 / slowRate,
    fastShare: spread === 0 ? null : (-deepExcess * perMode) / fastRate,
    slowShare: spread === 0 ? null : slowRate === 0 ? 0 : (-surfaceExcess * perMode) / slowRate,
    fastDeepRatio: hasRatios ? -surfaceExcess * ratio : null,
    slowDeepRatio: hasRatios ? deepExcess * ratio : null,
  };
}

function caveatsOf({ parameters, spread }: LinearResponse, doublingWm2: number | undefined): Caveat[] {
  const caveats = parameterCaveats({
    heatCapacity: [parameters.heatCapacity],
    deepHeatCapacity: [parameters.deepHeatCapacity],
    exchange: [parameters.exchange],
    feedback: [parameters.feedback],
    efficacy: [parameters.efficacy],
  });
  if (spread === 0) {
    caveats.push({
      code: 'one-time-scale',
      detail: 'Both modes have the same time scale: the response does not fall into a fast and a slow share.',
    });
  }
  if (doublingWm2 === undefined) {
    caveats.push({
      code: 'no-doubling-forcing',
      detail: 'ECS and TCR need the forcing of a doubling of CO2 (doublingWm2), which was not given.',
    });
  }
  return caveats;
}
