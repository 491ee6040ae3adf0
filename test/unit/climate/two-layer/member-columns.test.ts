import { expect, it } from 'vitest';
import { memberAt, memberColumn, memberColumns } from '../../../../src-main/climate/two-layer/member-columns.ts';

const one = { heatCapacity: 8, deepHeatCapacity: 100, exchange: 0.7, feedback: 1.2, efficacy: 1.3 };

it('memberColumns: one for all beside one for each', () => {
  const columns = memberColumns('test', { ...one, feedback: [0.8, 1, 1.2], exchange: [0.5, 0.6, 0.7] });
  expect([...columns.feedback]).toEqual([0.8, 1, 1.2]);
  expect([...columns.heatCapacity]).toEqual([8, 8, 8]);
  expect(memberAt(columns, 1)).toEqual({ ...one, feedback: 1, exchange: 0.6 });
  expect(memberColumns('test', one).feedback.length).toBe(1);
});

it('memberColumns names the parameter and the member', () => {
  expect(() => memberColumns('test', { ...one, feedback: [1, -1] })).toThrow('test, feedback[1]');
  expect(() => memberColumns('test', { ...one, efficacy: [1, NaN] })).toThrow('test, efficacy[1]');
  expect(() => memberColumns('test', { ...one, feedback: [1, 1], exchange: [1, 1, 1] })).toThrow(
    'one value, or 3 as for the other parameters, but found 2',
  );
});

it('memberColumn', () => {
  expect([...memberColumn('test', 'doublingWm2', 3.9, 2)]).toEqual([3.9, 3.9]);
  expect(() => memberColumn('test', 'doublingWm2', [3.9], 2)).toThrow('test, doublingWm2');
});
