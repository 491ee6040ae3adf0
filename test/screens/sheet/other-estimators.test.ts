import { flushPromises } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import { defineComponent, h, type Component } from 'vue';
import type { XyFigure } from '../../../src-main/contract/figure.ts';
import type { ClaimView } from '../../../src-main/contract/project.ts';
import OtherEstimators from '../../../src-renderer/sheet/OtherEstimators.vue';
import ResidualFigures from '../../../src-renderer/sheet/ResidualFigures.vue';
import { provideClaimSheet } from '../../../src-renderer/sheet/use-claim-sheet.ts';
import { Refusal, type FakeHost } from '../../helpers/fake-host.ts';
import { inventedComparison } from '../../helpers/invented-comparison.ts';
import { inventedFigure, inventedProject } from '../../helpers/invented-project.ts';
import { button, mountScreen, settled } from '../../helpers/mount-screen.ts';
import { inventedClaim } from '../../unit/report/invented-report.ts';

const figure = (name: string): XyFigure => ({ ...inventedFigure, name, title: name });
const nothing = { fit: null, residuals: null, lag: null, autocorrelation: null, quantiles: null, sweep: null };

/** As much of a sheet as these parts look at. */
function sheet(change: Partial<ClaimView> = {}): ClaimView {
  const trail = [{ hash: inventedProject.head.hash }];
  return { claim: inventedClaim.claim, estimators: null, figures: nothing, trail, ...change } as ClaimView;
}
const stored = (isStale: boolean) =>
  ({ result: { id: 5 }, answer: inventedComparison, isStale }) as NonNullable<ClaimView['estimators']>;

const mounted = (part: Component, view: ClaimView, prepare?: (host: FakeHost) => void) =>
  mountScreen(
    defineComponent({
      setup() {
        provideClaimSheet(1);
        return () => h(part, { disabled: false });
      },
    }),
    {
      stubs: ['FigurePanel'],
      prepare(host) {
        host.reply('claim.view', () => view);
        prepare?.(host);
      },
    },
  );

describe('OtherEstimators', () => {
  it('says what it is for, and shows the comparison when it has been made', async () => {
    const { screen, host } = await mounted(OtherEstimators, sheet(), (fake) =>
      fake.reply('claim.compareEstimators', () => sheet({ estimators: stored(false) })),
    );
    expect(screen.text()).toContain('other ways to fit the line');
    expect(screen.find('table').exists()).toBe(false);
    await button(screen, 'Compare estimators').trigger('click');
    await settled();
    expect(host.inputs('claim.compareEstimators')).toMatchObject([{ claimId: 1 }]);
    expect(screen.findAll('table')).toHaveLength(2);
    for (const said of [
      'at most 1.9',
      'Taking the years on either side for neighbours',
      'No number by York, stated errors alone and York, errors scaled to the scatter: series',
      'The anchor year is itself a row',
    ])
      expect(screen.text()).toContain(said);
  });

  it('says that it is older than the claim, and compares again', async () => {
    const { screen, host } = await mounted(OtherEstimators, sheet({ estimators: stored(true) }), (fake) =>
      fake.reply('claim.compareEstimators', () => sheet({ estimators: stored(false) })),
    );
    await button(screen, 'Compare again').trigger('click');
    await settled();
    expect(host.inputs('claim.compareEstimators')).toHaveLength(1);
    expect(screen.findAll('button').map((one) => one.text())).not.toContain('Compare again');
  });

  it('says what stands in the way', async () => {
    const { screen } = await mounted(OtherEstimators, sheet(), (fake) =>
      fake.reply('claim.compareEstimators', () => {
        throw new Refusal({ where: 'series air', hint: 'State the unit of the series.' });
      }),
    );
    await button(screen, 'Compare estimators').trigger('click');
    await settled();
    expect(screen.get('[role="alert"]').text()).toContain('State the unit of the series.');
  });

  it('says why residuals have not been tested', async () => {
    const answer = { ...inventedComparison, residualTests: [], testsMissing: 'The fit is exact.' };
    const { screen } = await mounted(OtherEstimators, sheet({ estimators: { ...stored(false), answer } }));
    expect(screen.text()).toContain('The residuals have not been tested. The fit is exact.');
    expect(screen.findAll('table')).toHaveLength(1);
  });
});

describe('ResidualFigures', () => {
  it('draws nothing until somebody looks', async () => {
    const figures = { ...nothing, lag: figure('lag'), autocorrelation: figure('acf'), quantiles: figure('normal') };
    const { screen } = await mounted(ResidualFigures, sheet({ figures }));
    const details = screen.get<HTMLDetailsElement>('details');
    expect(details.findAll('figure-panel-stub')).toHaveLength(0);
    details.element.open = true;
    await details.trigger('toggle');
    await flushPromises();
    expect(details.findAll('figure-panel-stub')).toHaveLength(3);
  });

  it('is not there when there is nothing to draw', async () => {
    const { screen } = await mounted(ResidualFigures, sheet());
    expect(screen.find('details').exists()).toBe(false);
  });
});
