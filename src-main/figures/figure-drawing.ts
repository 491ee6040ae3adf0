import type { Figure } from '../contract/figure.ts';
import type { Palette } from './palette.ts';
import { stemDrawing } from './stem-drawing.ts';
import type { SvgNode } from './svg-node.ts';
import { xyDrawing } from './xy-drawing.ts';

/** Height of a figure with two axes at this width. */
export function xyHeight(width: number): number {
  return Math.round(Math.min(400, Math.max(260, width * 0.48)));
}

/** Any figure as a drawing of this width. */
export function figureDrawing(figure: Figure, palette: Palette, width: number): SvgNode {
  return figure.kind === 'stem'
    ? stemDrawing(figure, palette, width)
    : xyDrawing(figure, palette, width, xyHeight(width));
}
