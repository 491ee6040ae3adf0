import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { labelLineHeight, placeLabels } from '../../../src-main/figures/direct-labels.ts';

const label = fc.record({
  anchorY: fc.double({ min: 0, max: 300, noNaN: true }),
  lines: fc.array(fc.constant('a line'), { minLength: 1, maxLength: 3 }),
});

describe('placeLabels', () => {
  it('leaves labels where they want to be when they do not touch', () => {
    const wanted = [
      { lines: ['a'], anchorY: 250 },
      { lines: ['b'], anchorY: 40 },
    ];
    expect(placeLabels(wanted, 0, 300).map(({ y }) => y)).toEqual([250, 40]);
  });

  it('never lets two touch, keeps their order, and keeps them inside when they fit', () => {
    fc.assert(
      fc.property(fc.array(label, { maxLength: 8 }), (labels) => {
        const placed = placeLabels(labels, 0, 300);
        const half = (one: (typeof placed)[number]) => (one.lines.length * labelLineHeight) / 2;
        const byY = [...placed].sort((a, b) => a.y - b.y);
        byY.slice(1).forEach((one, at) => {
          const above = byY[at];
          if (!above) return;
          expect(one.y - half(one)).toBeGreaterThanOrEqual(above.y + half(above) - 1e-9);
          expect(one.anchorY).toBeGreaterThanOrEqual(above.anchorY);
        });
        const total = placed.reduce((sum, one) => sum + one.lines.length * labelLineHeight + 3, 0);
        if (total <= 300) {
          for (const one of placed) {
            expect(one.y - half(one)).toBeGreaterThanOrEqual(-1e-9);
            expect(one.y + half(one)).toBeLessThanOrEqual(300 + 1e-9);
          }
        }
      }),
    );
  });
});
