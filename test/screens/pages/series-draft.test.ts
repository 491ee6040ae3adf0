import { describe, expect, it } from 'vitest';
import {
  baselineProblem,
  seriesChoice,
  seriesDraft,
  seriesProblems,
} from '../../../src-renderer/pages/series-draft.ts';
import { inventedPreview } from '../../helpers/invented-project.ts';

const [offered] = inventedPreview.series;
const draft = { ...seriesDraft(offered!), unit: 'K', baselineStart: '1961', baselineEnd: '1990' };

describe('the draft of an offered series', () => {
  it('begins with what was recognised and asks for the rest', () => {
    const fresh = seriesDraft(offered!);
    expect(fresh).toMatchObject({ isTaken: true, name: 'quay-thermometer-air', unit: '' });
    const problems = seriesProblems(fresh);
    expect(problems.unit).not.toBe('');
    expect(problems.baseline).not.toBe('');
    expect(problems.name).toBe('');
  });

  it('becomes a choice once nothing is left to be said', () => {
    expect(Object.values(seriesProblems(draft)).join('')).toBe('');
    expect(seriesChoice(draft)).toEqual({
      key: 'column-1',
      name: 'quay-thermometer-air',
      quantity: 'temperature-anomaly',
      unit: 'K',
      baseline: { start: 1961, end: 1990 },
    });
  });

  it('takes “not known” for an answer about the baseline', () => {
    const unknown = { ...draft, baselineStart: '', baselineEnd: '', isBaselineUnknown: true };
    expect(seriesProblems(unknown).baseline).toBe('');
    expect(seriesChoice(unknown).baseline).toBeNull();
  });

  it('asks for no baseline where there is none', () => {
    const gas = { ...draft, quantity: 'co2' as const, baselineStart: '', baselineEnd: '' };
    expect(seriesProblems(gas).baseline).toBe('');
    expect(seriesChoice(gas).baseline).toBeNull();
  });

  it('refuses years that are none, or in the wrong order', () => {
    expect(baselineProblem({ baselineStart: '61', baselineEnd: 'x' })).toMatch(/two years/i);
    expect(baselineProblem({ baselineStart: '1990', baselineEnd: '1961' })).toMatch(/first year/i);
    expect(baselineProblem({ baselineStart: '1951', baselineEnd: '1980' })).toBe('');
  });
});
