import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SvgNode } from '../../../src-main/figures/svg-node.ts';
import { svgText } from '../../../src-main/figures/svg-text.ts';

const drawing = (content: string): SvgNode => ({
  tag: 'svg',
  attributes: { 'aria-label': content },
  children: [{ tag: 'text', attributes: { x: 1 }, text: content }],
});

describe('svgText', () => {
  it('writes elements, attributes and texts', () => {
    expect(svgText(drawing('a'))).toBe('<svg aria-label="a"><text x="1">a</text></svg>');
    expect(svgText({ tag: 'rect', attributes: { width: 2 }, children: [] })).toBe('<rect width="2"/>');
  });

  it('escapes what would be markup and replaces what XML forbids', () => {
    expect(svgText(drawing('<b>"&\''))).toBe(
      '<svg aria-label="&lt;b&gt;&quot;&amp;&#39;"><text x="1">&lt;b&gt;&quot;&amp;&#39;</text></svg>',
    );
    expect(svgText(drawing('\u0000\ud800x'))).toContain('>\ufffd\ufffdx</text>');
  });

  it('never lets a text become markup', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (content) => {
        const tags = svgText(drawing(content)).match(/<[^>]*>/g) ?? [];
        const names = tags.map((tag) => /^<\/?([a-z]+)/.exec(tag)?.[1]);
        expect(names.every((name) => name === 'svg' || name === 'text' || name === 'tspan')).toBe(true);
      }),
    );
  });
});
