import { describe, expect, it } from 'vitest';
import { miniatureDrawing, type Miniature } from '../../../src-main/figures/miniature-drawing.ts';
import { lightPalette } from '../../../src-main/figures/palette.ts';
import type { SvgNode } from '../../../src-main/figures/svg-node.ts';

const domain = { low: 0, high: 4 };
const nodes = (miniature: Miniature): readonly SvgNode[] => {
  const drawing = miniatureDrawing(miniature, domain, lightPalette, 180);
  return 'text' in drawing ? [] : drawing.children;
};
const stated = (all: readonly SvgNode[]) => all.find((node) => node.attributes.stroke === lightPalette.stated);
const bar = (all: readonly SvgNode[]) =>
  all.find((node) => node.tag === 'line' && node.attributes.stroke === lightPalette.accent);

describe('miniatureDrawing', () => {
  it('puts tick, dot and interval on the shared axis', () => {
    const all = nodes({ statedValue: 2, recomputed: { value: 3, low: 2, high: 4 } });
    expect(stated(all)?.attributes.x1).toBe(90);
    expect(all.find((node) => node.tag === 'circle')?.attributes.cx).toBe(132);
    expect(bar(all)?.attributes).toMatchObject({ x1: 90, x2: 174 });
  });

  it('draws the stated value alone before anything is recomputed', () => {
    const all = nodes({ statedValue: 2, recomputed: null });
    expect(all).toHaveLength(2);
  });

  it('points beyond the axis instead of leaving it', () => {
    const all = nodes({ statedValue: 9, recomputed: { value: -1, low: -2, high: 1 } });
    expect(stated(all)?.tag).toBe('path');
    expect(all.some((node) => node.tag === 'circle')).toBe(false);
    expect(bar(all)?.attributes).toMatchObject({ x1: 6, x2: 48 });
  });

  it('carries an end without a limit to the end of the axis, and draws no bar without an interval', () => {
    expect(bar(nodes({ statedValue: 2, recomputed: { value: 2, low: 1, high: null } }))?.attributes.x2).toBe(174);
    const none = bar(nodes({ statedValue: 2, recomputed: { value: 3, low: null, high: null } }));
    expect(none?.attributes.x1).toBe(none?.attributes.x2);
  });
});
