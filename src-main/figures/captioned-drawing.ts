import type { Figure } from '../contract/figure.ts';
import { shortDigest } from '../quantities/notation.ts';
import { figureDrawing } from './figure-drawing.ts';
import type { Palette } from './palette.ts';
import { figureFont, shape, text, type SvgNode } from './svg-node.ts';
import { wrapText } from './text-width.ts';

const margin = 24;
const fontSize = 12;
const lineHeight = 16.5;

/** A figure that stands alone in a file: on paper, with what it shows and which data it is from written beneath. */
export function captionedDrawing(figure: Figure, palette: Palette, width: number): SvgNode {
  const inner = figureDrawing(figure, palette, width - 2 * margin);
  const innerHeight = Number(inner.attributes.height);
  const data = figure.digests.length === 0 ? '' : `From data ${figure.digests.map(shortDigest).join(', ')} (SHA-256).`;
  const lines = [figure.caption, data].flatMap((line) => wrapText(line, width - 2 * margin, fontSize));
  const captionTop = margin + innerHeight + 22;
  const height = Math.ceil(captionTop + lines.length * lineHeight + margin - lineHeight);
  return {
    tag: 'svg',
    attributes: {
      xmlns: 'http://www.w3.org/2000/svg',
      viewBox: `0 0 ${width} ${height}`,
      width,
      height,
      role: 'img',
      'aria-label': `${figure.title}. ${figure.caption}`,
      'font-family': figureFont,
    },
    children: [
      { tag: 'title', attributes: {}, text: figure.title },
      shape('rect', { x: 0, y: 0, width, height, fill: palette.paper }),
      { ...inner, attributes: { ...inner.attributes, x: margin, y: margin } },
      ...lines.map((line, at) =>
        text(line, margin, captionTop + at * lineHeight, { fill: palette.ink2, 'font-size': fontSize }),
      ),
    ],
  };
}
