import { Path2D, type SKRSContext2D } from '@napi-rs/canvas';
import { fillTextRuns } from '../figures/canvas-text.ts';
import type { SvgAttributes, SvgNode } from '../figures/svg-node.ts';

/** Paints a drawing of the figures folder on a canvas: the tags and attributes that its drawings use, no others. */
export function paintDrawing(context: SKRSContext2D, node: SvgNode, inheritedFontSize = 12.5): void {
  const { attributes } = node;
  const fontSize = Number(attributes['font-size'] ?? inheritedFontSize);
  if ('text' in node) {
    if (node.tag === 'text') paintText(context, node.text, attributes, fontSize);
    return;
  }
  context.save();
  context.translate(
    Number(attributes.x ?? 0) * Number(node.tag === 'svg'),
    Number(attributes.y ?? 0) * Number(node.tag === 'svg'),
  );
  for (const child of node.children) paintDrawing(context, child, fontSize);
  context.restore();
  const path = pathOf(node.tag, attributes);
  if (path !== null) paintPath(context, path, attributes, node.tag);
}

function paintText(context: SKRSContext2D, content: string, attributes: SvgAttributes, fontSize: number): void {
  const anchor = attributes['text-anchor'];
  context.fillStyle = String(attributes.fill ?? '#000000');
  if (attributes['font-variant'] === 'tabular-nums') context.fontVariantNumeric = 'tabular-nums';
  fillTextRuns(context, content, Number(attributes.x ?? 0), Number(attributes.y ?? 0), {
    fontSize,
    weight: Number(attributes['font-weight'] ?? 400),
    align: anchor === 'middle' || anchor === 'end' ? anchor : 'start',
  });
}

function paintPath(context: SKRSContext2D, path: Path2D, attributes: SvgAttributes, tag: string): void {
  const fill = attributes.fill ?? (tag === 'line' ? 'none' : '#000000');
  if (fill !== 'none') {
    context.globalAlpha = Number(attributes['fill-opacity'] ?? 1);
    context.fillStyle = String(fill);
    context.fill(path);
  }
  if (attributes.stroke !== undefined) {
    context.globalAlpha = Number(attributes['stroke-opacity'] ?? 1);
    context.strokeStyle = String(attributes.stroke);
    context.lineWidth = Number(attributes['stroke-width'] ?? 1);
    context.setLineDash(
      String(attributes['stroke-dasharray'] ?? '')
        .split(' ')
        .filter(Boolean)
        .map(Number),
    );
    context.stroke(path);
  }
  context.globalAlpha = 1;
}

function pathOf(tag: string, attributes: SvgAttributes): Path2D | null {
  const number = (name: string) => Number(attributes[name] ?? 0);
  if (tag === 'path') return new Path2D(String(attributes.d));
  const path = new Path2D();
  if (tag === 'rect') path.rect(number('x'), number('y'), number('width'), number('height'));
  else if (tag === 'circle') path.arc(number('cx'), number('cy'), number('r'), 0, 2 * Math.PI);
  else if (tag === 'line') {
    path.moveTo(number('x1'), number('y1'));
    path.lineTo(number('x2'), number('y2'));
  } else return null;
  return path;
}
