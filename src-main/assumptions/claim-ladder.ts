import type { Ladder } from '../contract/result.ts';
import { isFootingError } from '../errors.ts';
import { ladder, type Rung } from '../robustness/ladder.ts';
import type { Assumption } from './assumption.ts';
import { logClaimLine } from './claim-line.ts';
import { footingOf, numberOnFooting, type Footing, type RungOffer } from './footing.ts';
import type { TestContext } from './test-context.ts';

/** Lines first, then what the slope stands for: each step is read on the footing of those before. */
const order = ['zero-intercept', 'omitted-forcings', 'transient-as-equilibrium'];

/**
 * The ladder of a log-regression claim, from the number as recomputed: free intercept, all forcings, heat uptake.
 *
 * @param assumptions  the catalogue; those with a rung are used, in the default order
 * @throws  InputError `no-line` for another kind of claim; NumericError as the fits
 */
export function claimLadder(context: TestContext, assumptions: readonly Assumption[]): Ladder {
  const { procedure } = logClaimLine(context);
  const rungs: Rung<Footing>[] = [];
  const notApplied: Ladder['notApplied'] = [];
  const caveats: Ladder['caveats'] = [];
  const inOrder = assumptions.filter(({ rung }) => rung).sort((a, b) => order.indexOf(a.id) - order.indexOf(b.id));
  for (const assumption of inOrder) {
    const offer = offerOf(assumption, context);
    if ('reason' in offer) {
      notApplied.push({ assumptionId: assumption.id, reason: offer.reason });
    } else {
      rungs.push({ assumptionId: assumption.id, label: offer.label, change: offer.change });
      caveats.push(...offer.caveats);
    }
  }
  const isApplied = (id: string) => rungs.some(({ assumptionId }) => assumptionId === id);
  if (isApplied('transient-as-equilibrium') && !isApplied('omitted-forcings')) {
    caveats.push({
      code: 'co2-alone',
      detail:
        'The step for heat uptake stands on a slope that puts all warming on CO₂: its number is an effective sensitivity only if the other forcings cancel out.',
    });
  }
  return ladder({
    start: footingOf(procedure),
    rungs,
    numberOn: (footing, draws) => numberOnFooting(context, footing, draws),
    notApplied,
    unit: context.recomputation.unit,
    draws: context.draws,
    caveats,
  });
}

/** What stands in the way of one rung is no reason to withhold the ladder. */
function offerOf({ rung }: Assumption, context: TestContext): RungOffer {
  try {
    return rung?.(context) ?? { reason: 'This assumption makes no change of its own.' };
  } catch (error) {
    if (isFootingError(error)) return { reason: error.message };
    throw error;
  }
}
