import { describe, expect, it } from 'vitest';
import { heatUptakeNotes } from '../../../src-main/readers/heat-uptake-notes.ts';
import { preview } from './fixtures/preview.ts';

/** A rise by the same amount each year. */
function rising(perYear: number, nYears = 20) {
  const steps = Array.from({ length: nYears }, (_, place) => place);
  return {
    years: steps.map((place) => 2000 + place),
    months: null,
    values: steps.map((place) => place * perYear),
    lower: null,
    upper: null,
    boundsLevelPercent: null,
  };
}

describe('heatUptakeNotes', () => {
  it('gives the uptake that 10 ZJ a year are: 10²² J / (3.1557·10⁷ s · 5.101·10¹⁴ m²) = 0.62 W/m²', () => {
    expect(heatUptakeNotes('WO', rising(1), 1e22)).toEqual([
      'The trend of WO is a heat uptake of 0.62 W/m² over the Earth’s surface, as it would be in this unit.',
    ]);
  });

  it.each([
    ['10²² J taken for ZJ', 1, 1e21, '0.062 W/m²', 'far less'],
    ['ZJ taken for 10²² J', 10, 1e22, '6.2 W/m²', 'far more'],
  ])('doubts the power of ten when %s', (_, perYear, joules, uptake, doubt) => {
    const [note] = heatUptakeNotes('WO', rising(perYear), joules);
    expect(note).toContain(uptake);
    expect(note).toContain(doubt);
    expect(note).toContain('power of ten');
  });

  it('says nothing on a few years, and does not doubt a loss of heat', () => {
    expect(heatUptakeNotes('WO', rising(1, 8), 1e22)).toEqual([]);
    expect(heatUptakeNotes('WO', rising(-1), 1e22)[0]).toContain('-0.62 W/m²');
    expect(heatUptakeNotes('WO', rising(-1), 1e22)[0]).not.toContain('power of ten');
  });

  it('speaks up on any table that names a unit of heat', () => {
    const rows = Array.from({ length: 12 }, (_, place) => `${2005 + place}.5,${10 + place}`).join('\n');
    const asZJ = preview(`year,ocean heat content (ZJ)\n${rows}\n`);
    expect(asZJ.series[0]?.unit).toBe('ZJ');
    expect(asZJ.notes.join('\n')).toContain('power of ten');
    const asH22 = preview(`year,ocean heat content (10^22 J)\n${rows}\n`);
    expect(asH22.series[0]?.unit).toBe('10²² J');
    expect(asH22.notes.join('\n')).toContain('as it would be in this unit');
  });
});
