import { describe, expect, it } from 'vitest';
import DataSection from '../../../src-renderer/sheet/DataSection.vue';
import { inventedProject } from '../../helpers/invented-project.ts';
import { field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const { claim } = inventedSheet();
const unchosen = () => inventedSheet({ claim: { ...claim, procedure: null }, recomputation: null });

describe('the data', () => {
  it('starts a line on the series that fit', async () => {
    const { screen, host } = await mountOnSheet(DataSection, { view: unchosen() });
    await field(screen, 'How the source gets the number').setValue('log-regression');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.procedure).toMatchObject({
      kind: 'log-regression',
      temperatureSeriesId: 1,
      co2SeriesId: 2,
      minMonths: 12,
      intercept: false,
    });
    expect(screen.text()).toContain('gas-at-the-light');
  });

  it('says which series are missing, and stores nothing', async () => {
    const project = { ...inventedProject, series: inventedProject.series.filter(({ quantity }) => quantity !== 'co2') };
    const { screen, host } = await mountOnSheet(DataSection, { view: unchosen(), session: { project } });
    await field(screen, 'How the source gets the number').setValue('log-regression');
    await settled();
    expect(screen.get('[role=alert]').text()).toMatch(/a temperature series and a CO.? series.*found 3 series/);
    expect(host.inputs('claim.update')).toEqual([]);
  });

  it('lists the series used and the years left out with their reasons', async () => {
    const { screen } = await mountOnSheet(DataSection);
    expect(screen.get('h2').text()).toBe('Data 60 years in common');
    expect(screen.get('[aria-label="Series used"]').text()).toMatch(/harbour-air.*1961–1990.*gas-at-the-light.*11/s);
    expect(screen.get('details').text()).toMatch(/Years left out: 1.*1959.*only 11 of 12 months/s);
  });
});
