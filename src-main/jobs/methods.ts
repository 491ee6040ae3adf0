import { testAssumptions } from '../assumptions/test-assumptions.ts';
import { carbonBudget } from '../climate/carbon/carbon-budget.ts';
import { exchange } from '../climate/carbon/exchange.ts';
import { energyBudget } from '../climate/energy-budget.ts';
import { compareEstimators } from '../climate/estimators/compare-estimators.ts';
import { forcing } from '../climate/forcing/forcing.ts';
import { coupledSlope } from '../climate/coupled-slope.ts';
import { gregory } from '../climate/gregory.ts';
import { recompute } from '../climate/procedures/recompute.ts';
import { twoLayer } from '../climate/two-layer/two-layer.ts';
import { twoLayerEnsemble } from '../climate/two-layer/two-layer-ensemble.ts';
import { twoLayerFit } from '../climate/two-layer/two-layer-fit.ts';
import type {
  LeaveOneOutInput,
  LeaveOneOutValue,
  PhaseSurrogatesInput,
  PhaseSurrogatesValue,
} from '../contract/resampling.ts';
import type { ComputeInput, ComputeMethod, ComputeValue } from '../contract/compute.ts';
import { claimSweep } from '../robustness/claim-sweep.ts';
import { windowSweep } from '../robustness/window-sweep.ts';
import { evaluateDerivation } from '../sources/derivation.ts';
import { adf } from '../statistics/adf.ts';
import { ar1Line } from '../statistics/ar1-line.ts';
import { attenuation } from '../statistics/attenuation.ts';
import { chowTest } from '../statistics/chow-test.ts';
import { cusum } from '../statistics/cusum.ts';
import { deming } from '../statistics/deming.ts';
import { designColumns } from '../statistics/design-columns.ts';
import { effectiveSampleSizes } from '../statistics/effective-sample-sizes.ts';
import { engleGranger } from '../statistics/engle-granger.ts';
import { glsArma11 } from '../statistics/gls-arma11.ts';
import { huber } from '../statistics/huber.ts';
import { kpss } from '../statistics/kpss.ts';
import { leastSquares } from '../statistics/least-squares.ts';
import { leaveOneOut } from '../statistics/leave-one-out.ts';
import { movingBlockBootstrap } from '../statistics/moving-block-bootstrap.ts';
import { phaseSurrogates } from '../statistics/phase-surrogates.ts';
import { generatorId } from '../statistics/random-stream.ts';
import { regression } from '../statistics/regression.ts';
import { resetTest } from '../statistics/reset-test.ts';
import { residualTests } from '../statistics/residual-tests.ts';
import { theilSen } from '../statistics/theil-sen.ts';
import { york } from '../statistics/york.ts';

export type ReportProgress = (shareDone: number) => void;

type Methods = {
  [Method in ComputeMethod]: (input: ComputeInput<Method>, onProgress: ReportProgress) => ComputeValue<Method>;
};

/** The pure function behind each method: data in, data out, the same digits wherever it runs. */
export const methods: Methods = {
  regression: (input) => regression(input),
  'effective-sample-size': (input) => effectiveSampleSizes(input),
  'residual-tests': (input) => residualTests(input),
  'gls-ar1': (input) => ar1Line(input),
  'gls-arma11': (input) => glsArma11(input),
  'theil-sen': (input) => theilSenAt95(input),
  huber: (input) => huber(input),
  york: ({ r = 0, ...input }) => york({ ...input, r }),
  deming: (input) => deming(input),
  attenuation: (input) => attenuation(input),
  adf: (input) => adf(input),
  kpss: (input) => kpss(input),
  'engle-granger': (input) => engleGranger(input),
  'block-bootstrap': (input, onProgress) => movingBlockBootstrap(input, onProgress),
  'leave-one-out': (input) => leaveOneOutOf(input),
  'phase-surrogates': (input, onProgress) => surrogatesOf(input, onProgress),
  reset: (input) => resetTest(input),
  chow: (input) => chowTest(input),
  cusum: (input) => cusum(input),
  'two-layer': (input) => twoLayer(input),
  'two-layer-ensemble': (input, onProgress) => twoLayerEnsemble(input, onProgress),
  'two-layer-fit': (input, onProgress) => twoLayerFit(input, onProgress),
  gregory: (input) => gregory(input),
  'coupled-slope': (input, onProgress) => coupledSlope(input, onProgress),
  'window-sweep': (input, onProgress) => windowSweep(input, onProgress),
  forcing: (input) => forcing(input),
  exchange: (input) => exchange(input),
  'carbon-budget': (input) => carbonBudget(input),
  'energy-budget': (input, onProgress) => energyBudget(input, onProgress),
  derivation: ({ lines }) => evaluateDerivation(lines),
  recomputation: (input) => recompute(input),
  assumptions: (input, onProgress) => testAssumptions(input, onProgress),
  'claim-sweep': (input, onProgress) => claimSweep(input, onProgress),
  estimators: (input, onProgress) => compareEstimators(input, onProgress),
};

function theilSenAt95(input: ComputeInput<'theil-sen'>): ComputeValue<'theil-sen'> {
  const { confidence: confidence95, ...fit } = theilSen({ ...input, levelPercent: 95 });
  return { ...fit, confidence95 };
}

function leaveOneOutOf({ x, y, intercept, weights, place }: LeaveOneOutInput): LeaveOneOutValue {
  const columns = designColumns('leaveOneOut', x, y.length, intercept);
  return leaveOneOut(leastSquares({ columns, y, weights, caller: 'leaveOneOut' }), place);
}

function surrogatesOf(input: PhaseSurrogatesInput, onProgress: ReportProgress): PhaseSurrogatesValue {
  const surrogates = phaseSurrogates(input, onProgress).map((values) => [...values]);
  return { surrogates, random: { generator: generatorId, seed: input.seed, nDraws: input.draws } };
}

/** Runs a method by its name; the input has been checked against the method's schema before. */
export function runMethod<Method extends ComputeMethod>(
  method: Method,
  input: ComputeInput<Method>,
  onProgress: ReportProgress,
): ComputeValue<Method> {
  return methods[method](input, onProgress);
}
