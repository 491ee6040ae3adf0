import type { Ladder } from '../contract/result.ts';
import { ladder, type Rung } from '../robustness/ladder.ts';
import type { Assumption } from './assumption.ts';
import { logClaimLine } from './claim-line.ts';
import { footingOf, numberOnFooting, type Footing } from './footing.ts';
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
  const inOrder = assumptions.filter(({ rung }) => rung).sort((a, b) => order.indexOf(a.id) - order.indexOf(b.id));
  for (const { id: assumptionId, rung } of inOrder) {
    const offer = rung?.(context);
    if (!offer) continue;
    if ('reason' in offer) notApplied.push({ assumptionId, reason: offer.reason });
    else rungs.push({ assumptionId, ...offer });
  }
  const isApplied = (id: string) => rungs.some(({ assumptionId }) => assumptionId === id);
  const caveats: Ladder['caveats'] = [];
  if (isApplied('transient-as-equilibrium')) {
    caveats.push({
      code: 'budget-periods',
      detail:
        'The step for heat uptake takes the forcing and heat uptake of the energy budget for those of the record’s own years.',
    });
    if (!isApplied('omitted-forcings')) {
      caveats.push({
        code: 'co2-alone',
        detail:
          'The step for heat uptake stands on a slope that puts all warming on CO2: its number is an effective sensitivity only if the other forcings cancel out.',
      });
    }
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
