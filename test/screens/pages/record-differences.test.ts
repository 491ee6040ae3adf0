import { describe, expect, it } from 'vitest';
import { recordDifferences } from '../../../src-renderer/pages/trail/record-differences.ts';

describe('recordDifferences', () => {
  it('names each place that changed, and no other', () => {
    const before = { name: 'air', unit: '°C', procedure: { window: null, lag: 3 } };
    const after = { name: 'air', unit: 'K', procedure: { window: { start: 1961, end: 1990 }, lag: 3 } };
    expect(recordDifferences(before, after)).toEqual([
      { path: 'unit', before: '°C', after: 'K' },
      { path: 'procedure › window › start', before: null, after: '1961' },
      { path: 'procedure › window › end', before: null, after: '1990' },
    ]);
  });

  it('lists all of a record that was added or removed', () => {
    expect(recordDifferences(undefined, { text: '', file: null, years: [1, 2] })).toEqual([
      { path: 'text', before: null, after: '(empty)' },
      { path: 'file', before: null, after: '(none)' },
      { path: 'years', before: null, after: '[1,2]' },
    ]);
    expect(recordDifferences({ text: 'gone' }, undefined)).toEqual([{ path: 'text', before: 'gone', after: null }]);
  });

  it('goes into lists of records, but leaves lists of numbers whole', () => {
    const before = { leftOut: [{ line: 3, reason: 'x' }], yearsUsed: [1, 2] };
    const after = {
      leftOut: [
        { line: 3, reason: 'y' },
        { line: 9, reason: 'z' },
      ],
      yearsUsed: [1, 2, 3],
    };
    expect(recordDifferences(before, after)).toEqual([
      { path: 'left out › 1 › reason', before: 'x', after: 'y' },
      { path: 'left out › 2 › line', before: null, after: '9' },
      { path: 'left out › 2 › reason', before: null, after: 'z' },
      { path: 'years used', before: '[1,2]', after: '[1,2,3]' },
    ]);
  });

  it('sees a value take the place of an object', () => {
    expect(recordDifferences({ a: 'x' }, { a: { b: 1 } })).toEqual([{ path: 'a', before: 'x', after: '{"b":1}' }]);
  });
});
