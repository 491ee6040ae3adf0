import { describe, expect, it } from 'vitest';
import { figureTable } from '../../../src-main/figures/figure-table.ts';
import { sampleStem } from './sample-stem.ts';
import { sampleXy } from './sample-xy.ts';

describe('figureTable', () => {
  it('has a row for everything that a stem draws, unrounded', () => {
    const { columns, rows } = figureTable(sampleStem);
    expect(columns).toEqual(['what', 'applied to', 'value', 'low', 'high', 'level, %', 'quantity', 'unit']);
    expect(rows).toHaveLength(2 + sampleStem.rows.length + sampleStem.bands.length);
    expect(rows[0]).toEqual([
      'stated, at most',
      'limits: all that rounds to it',
      1.9,
      1.85,
      1.95,
      null,
      null,
      'K per doubling',
    ]);
    expect(rows[1]).toEqual(['recomputed as stated', null, 1.874, 1.74, 2.01, 95, null, 'K per doubling']);
    expect(rows[2]?.slice(0, 2)).toEqual(['Line need not pass zero', 'the row above']);
    expect(rows[4]?.slice(1, 6)).toEqual(['the recomputation', 2.71, 1.9, null, 90]);
    expect(rows.at(-1)).toEqual([
      'published: ECS, likely (AR6)',
      null,
      null,
      2.5,
      4,
      null,
      'equilibrium climate sensitivity',
      'K per doubling',
    ]);
    for (const row of rows) expect(row).toHaveLength(columns.length);
  });

  it('has a column per mark when all share their x', () => {
    expect(figureTable(sampleXy)).toEqual({
      columns: ['Year', 'limits, lower', 'limits, upper', 'air', 'line as stated', 'readings'],
      rows: [
        [1990, 0, 0.2, 0.1, 0.1, 0.12],
        [1991, 0.1, 0.3, 0.2, 0.15, 0.18],
        [1992, null, null, null, 0.2, 0.2],
        [1993, 0.2, 0.4, 0.3, 0.25, 0.31],
      ],
    });
  });

  it('has a row per point otherwise', () => {
    const line = { label: 'line', mark: 'line' as const, x: [0, 1], y: [0, 2], y2: null, role: 'stated' as const };
    const point = { ...line, label: 'point', mark: 'points' as const, x: [0.5], y: [1.1] };
    expect(figureTable({ ...sampleXy, xLabel: 'x', yLabel: 'y', marks: [line, point] })).toEqual({
      columns: ['mark', 'x', 'y'],
      rows: [
        ['line', 0, 0],
        ['line', 1, 2],
        ['point', 0.5, 1.1],
      ],
    });
  });
});
