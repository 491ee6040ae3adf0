import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lightPalette } from '../../../src-main/figures/palette.ts';
import { stemDrawing } from '../../../src-main/figures/stem-drawing.ts';
import { stemLayout, stemFontSize } from '../../../src-main/figures/stem-layout.ts';
import type { SvgNode } from '../../../src-main/figures/svg-node.ts';
import { textWidth } from '../../../src-main/figures/text-width.ts';
import { sampleStem } from './sample-stem.ts';

const width = 760;

function flat(node: SvgNode): SvgNode[] {
  return 'text' in node ? [node] : [node, ...node.children.flatMap(flat)];
}
const texts = (node: SvgNode) => flat(node).flatMap((each) => ('text' in each ? [each.text] : []));

describe('stemLayout', () => {
  it('shows every value, the stated digits’ interval and all bands on the axis', () => {
    const { domain } = stemLayout(sampleStem, width);
    expect(domain.low).toBeLessThan(1.2);
    expect(domain.high).toBeGreaterThan(4);
  });

  it('does not let one far interval squeeze the rest', () => {
    const [first, ...others] = sampleStem.rows;
    if (!first) throw new Error('the sample has rows');
    const far = { ...first, interval: { low: 2.1, high: 400, levelPercent: 90 } };
    const { domain } = stemLayout({ ...sampleStem, rows: [far, ...others] }, width);
    expect(domain.high).toBeLessThan(6);
  });

  it('keeps the rounding interval narrow when there is nothing else to show', () => {
    const { domain } = stemLayout({ ...sampleStem, recomputed: null, rows: [], bands: [] }, width);
    expect((1.95 - 1.85) / (domain.high - domain.low)).toBeLessThanOrEqual(1 / 8);
  });

  it('prints the stated value with its own digits', () => {
    const [stated] = stemLayout(sampleStem, width).rows;
    expect(stated?.valueText).toBe('1.9');
    const whole = { ...sampleStem, stated: { ...sampleStem.stated, value: 2, interval: { low: 1.995, high: 2.005 } } };
    expect(stemLayout(whole, width).rows[0]?.valueText).toBe('2.00');
  });

  it('names the level of a bar only where it departs from the others', () => {
    const { rangeHeading, rows } = stemLayout(sampleStem, width);
    expect(rangeHeading).toBe('5–95\u202f%');
    expect(rows.map((row) => row.rangeText)).toEqual([
      '',
      '1.74 – 2.01 (95\u202f%)',
      '2.10 – 2.52',
      '1.74 – 2.35',
      '1.90 – unbounded',
      '',
    ]);
  });

  it('never lets band labels touch, whatever the bands', () => {
    const band = fc
      .tuple(
        fc.double({ min: 0, max: 8, noNaN: true }),
        fc.double({ min: 0.1, max: 4, noNaN: true }),
        fc.integer({ min: 3, max: 30 }),
      )
      .map(([low, length, letters]) => ({
        label: 'n'.repeat(letters),
        low,
        high: low + length,
        quantity: 'ratio' as const,
      }));
    fc.assert(
      fc.property(fc.array(band, { maxLength: 8 }), (bands) => {
        const boxes = stemLayout({ ...sampleStem, bands }, width).bands.map(({ label, labelX, labelY }) => {
          const half = textWidth(label, stemFontSize) / 2;
          return { from: labelX - half, to: labelX + half, labelY };
        });
        boxes.forEach((box, at) => {
          for (const other of boxes.slice(at + 1)) {
            expect(box.labelY !== other.labelY || box.to <= other.from || other.to <= box.from).toBe(true);
          }
        });
      }),
    );
  });

  it('gives every row its own height, so that no two touch', () => {
    const { rows } = stemLayout(sampleStem, width);
    expect(rows.some((row) => row.lines.length > 1)).toBe(true);
    rows.slice(1).forEach((row, at) => {
      const above = rows[at];
      expect(row.y - row.height / 2).toBeGreaterThanOrEqual((above?.y ?? 0) + (above?.height ?? 0) / 2 - 1e-9);
    });
  });
});

describe('stemDrawing', () => {
  it('says everything in text: labels, values, ranges, quantities, unit and editions', () => {
    const all = texts(stemDrawing(sampleStem, lightPalette, width));
    for (const content of [
      'Stated, at most 1.9',
      'Recomputed as stated',
      '1.87',
      '2.71',
      'EffCS',
      'apparent',
      'K per doubling',
      'ECS, likely (AR6)',
    ]) {
      expect(all).toContain(content);
    }
  });

  it('has an accessible name with the same numbers', () => {
    const { attributes } = stemDrawing(sampleStem, lightPalette, width);
    expect(attributes.role).toBe('img');
    expect(attributes['aria-label']).toContain(
      'Stated, at most 1.9 K per doubling; recomputed as stated 1.87 (1.74 – 2.01)',
    );
    expect(attributes['aria-label']).toContain('published ECS, likely (AR6): 2.50 – 4.00');
  });

  it('connects the rows that apply on top of the one above, and no others', () => {
    const dotted = flat(stemDrawing(sampleStem, lightPalette, width)).filter(
      (node) => node.attributes['stroke-dasharray'] !== undefined,
    );
    expect(dotted).toHaveLength(2);
  });

  it('ends an interval without a limit in an arrow at the end of the axis', () => {
    const { plot } = stemLayout(sampleStem, width);
    const right = Math.round(plot.right * 100) / 100;
    const arrows = flat(stemDrawing(sampleStem, lightPalette, width)).filter((node) =>
      String(node.attributes.d ?? '').includes(`L${right} `),
    );
    expect(arrows).toHaveLength(1);
  });

  it('draws the direction of a limit and no arrow for a plain value', () => {
    const tips = (bound: 'equals' | 'at most' | 'at least') =>
      flat(stemDrawing({ ...sampleStem, stated: { ...sampleStem.stated, bound }, rows: [] }, lightPalette, width))
        .filter((node) => node.tag === 'path' && node.attributes.stroke === lightPalette.stated)
        .map((node) => /M([\d.]+) \S+L([\d.]+)/.exec(String(node.attributes.d)))
        .map((match) => Math.sign(Number(match?.[2]) - Number(match?.[1])));
    expect(tips('at most')).toEqual([-1]);
    expect(tips('at least')).toEqual([1]);
    expect(tips('equals')).toEqual([]);
  });

  it('tints a published range more strongly in the rows of its own quantity', () => {
    const rects = flat(stemDrawing(sampleStem, lightPalette, width)).filter((node) => node.tag === 'rect');
    const strong = rects.filter((node) => node.attributes['fill-opacity'] === 1);
    // One row is a TCR and two bands are; no row is an ECS.
    expect(strong).toHaveLength(2);
  });

  it('draws what there is before anything has been recomputed', () => {
    const all = texts(stemDrawing({ ...sampleStem, recomputed: null, rows: [], bands: [] }, lightPalette, width));
    expect(all).toContain('Not recomputed yet');
    expect(all.join(' ')).not.toMatch(/NaN|undefined|null/);
  });
});
