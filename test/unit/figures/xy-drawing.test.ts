import { describe, expect, it } from 'vitest';
import { lightPalette } from '../../../src-main/figures/palette.ts';
import type { SvgNode } from '../../../src-main/figures/svg-node.ts';
import { xyDrawing } from '../../../src-main/figures/xy-drawing.ts';
import { sampleXy } from './sample-xy.ts';

const size = [760, 360] as const;
const drawing = xyDrawing(sampleXy, lightPalette, ...size);

function flat(node: SvgNode): SvgNode[] {
  return 'text' in node ? [node] : [node, ...node.children.flatMap(flat)];
}
const texts = (node: SvgNode) => flat(node).flatMap((each) => ('text' in each ? [each.text] : []));
const paths = flat(drawing).filter((node) => node.tag === 'path');

describe('xyDrawing', () => {
  it('names both axes with their units and labels every mark beside it', () => {
    for (const content of ['Year', 'T − T₀ (K)', 'limits', 'air', 'line as stated', 'readings']) {
      expect(texts(drawing)).toContain(content);
    }
  });

  it('sets years without thousands marks and without decimals', () => {
    const labels = texts(drawing).filter((content) => /^\d/.test(content) && Number(content) > 100);
    expect(labels.length).toBeGreaterThan(1);
    expect(labels.every((label) => /^\d{4}$/.test(label))).toBe(true);
  });

  it('sets minus signs as such', () => {
    const below = {
      ...sampleXy,
      marks: sampleXy.marks.map((mark) => ({ ...mark, y: mark.y.map((y) => (y === null ? null : -y)), y2: null })),
    };
    const labels = texts(xyDrawing(below, lightPalette, ...size));
    expect(labels.some((label) => /^−\d/.test(label))).toBe(true);
    expect(labels.some((label) => label.startsWith('-'))).toBe(false);
  });

  it('draws the stated line in the colour that the stated number has everywhere', () => {
    expect(paths.filter((node) => node.attributes.stroke === lightPalette.stated).length).toBeGreaterThan(0);
  });

  it('gives every series a second cue beside its colour', () => {
    const second = {
      ...sampleXy,
      marks: sampleXy.marks.map((mark) => ({ ...mark, mark: 'line' as const, y2: null, role: 'data' as const })),
    };
    const lines = flat(xyDrawing(second, lightPalette, ...size)).filter(
      (node) => node.tag === 'path' && Number(node.attributes['stroke-width']) === 1.8,
    );
    const cues = new Map(
      lines.map((node) => [node.attributes.stroke, String(node.attributes['stroke-dasharray'] ?? 'solid')]),
    );
    expect(cues.size).toBe(4);
    expect(new Set(cues.values()).size).toBe(4);
  });

  it('leaves a gap where a value is missing, and marks a value that stands alone between gaps', () => {
    const [blue] = lightPalette.series;
    const lines = paths.filter((node) => node.attributes.stroke === blue && node.attributes['stroke-width'] === 1.8);
    // From 1990 to 1991; 1993, a line without length; the swatch beside the label.
    expect(lines.map((node) => String(node.attributes.d).match(/[ML]/g)?.join(''))).toEqual(['MLL', 'ML', 'ML']);
    const alone = flat(drawing).filter((node) => node.tag === 'circle' && node.attributes.fill === blue);
    expect(alone).toHaveLength(1);
  });

  it('fills bands', () => {
    expect(paths.some((node) => String(node.attributes.fill).startsWith(lightPalette.series[0]))).toBe(true);
  });

  it('keeps everything inside its frame', () => {
    for (const node of flat(drawing)) {
      const numbers = String(node.attributes.d ?? '').match(/-?\d+(\.\d+)?(?= )| -?\d+(\.\d+)?/g) ?? [];
      for (const number of numbers) expect(Math.abs(Number(number))).toBeLessThanOrEqual(size[0]);
    }
  });

  it('has an accessible name', () => {
    expect(drawing.attributes.role).toBe('img');
    expect(drawing.attributes['aria-label']).toBe('Air. Air temperature at an invented harbour.');
  });

  it('draws the same figure into the same drawing, and one without data without failing', () => {
    expect(xyDrawing(sampleXy, lightPalette, ...size)).toEqual(drawing);
    expect(texts(xyDrawing({ ...sampleXy, marks: [] }, lightPalette, ...size)).join(' ')).not.toMatch(/NaN|undefined/);
  });

  it('puts many marks into a legend instead of a crowd of labels', () => {
    const [first] = sampleXy.marks;
    if (!first) throw new Error('the sample has marks');
    const many = Array.from({ length: 9 }, (_, at) => ({
      ...first,
      mark: 'line' as const,
      y2: null,
      label: `record ${at + 1}`,
    }));
    const labels = texts(xyDrawing({ ...sampleXy, marks: many }, lightPalette, ...size));
    for (const { label } of many) expect(labels.filter((each) => each === label)).toHaveLength(1);
  });
});
