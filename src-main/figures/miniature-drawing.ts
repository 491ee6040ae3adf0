import type { Domain } from './axis.ts';
import type { Palette } from './palette.ts';
import { shape, type SvgNode } from './svg-node.ts';

export interface Miniature {
  readonly statedValue: number;
  readonly recomputed: { readonly value: number; readonly low: number | null; readonly high: number | null } | null;
}

const height = 12;
const middle = height / 2;
const edge = 6;

/**
 * The stem at its smallest: a tick for the stated value, a dot with its interval for the recomputed one, on an axis
 * that all miniatures of one unit share. What lies beyond the axis is drawn at its end as an arrow.
 */
export function miniatureDrawing(miniature: Miniature, domain: Domain, palette: Palette, width: number): SvgNode {
  const { statedValue, recomputed } = miniature;
  const share = (value: number) => (value - domain.low) / (domain.high - domain.low);
  const x = (value: number) => Math.round((edge + share(value) * (width - 2 * edge)) * 100) / 100;
  const isInside = (value: number) => value >= domain.low && value <= domain.high;
  const axis = shape('line', { x1: 0, x2: width, y1: middle, y2: middle, stroke: palette.rule });
  const tick = shape('line', {
    x1: x(statedValue),
    x2: x(statedValue),
    y1: 1,
    y2: height - 1,
    stroke: palette.stated,
    'stroke-width': 2,
  });
  const dot = (value: number) => shape('circle', { cx: x(value), cy: middle, r: 3.2, fill: palette.accent });
  return {
    tag: 'svg',
    attributes: { viewBox: `0 0 ${width} ${height}`, width, height, 'aria-hidden': 'true' },
    children: [
      axis,
      isInside(statedValue) ? tick : arrow(statedValue > domain.high, width, palette.stated),
      ...(recomputed ? [bar(recomputed, domain, x, palette)] : []),
      ...(recomputed
        ? [
            isInside(recomputed.value)
              ? dot(recomputed.value)
              : arrow(recomputed.value > domain.high, width, palette.accent),
          ]
        : []),
    ],
  };
}

function bar(
  { value, low, high }: NonNullable<Miniature['recomputed']>,
  domain: Domain,
  x: (value: number) => number,
  palette: Palette,
): SvgNode {
  const within = (end: number) => Math.min(domain.high, Math.max(domain.low, end));
  // A value without any interval has no bar; an end without a limit reaches the end of the axis.
  const from = low === null && high === null ? value : (low ?? domain.low);
  const to = low === null && high === null ? value : (high ?? domain.high);
  return shape('line', {
    x1: x(within(from)),
    x2: x(within(to)),
    y1: middle,
    y2: middle,
    stroke: palette.accent,
    'stroke-width': 2,
  });
}

function arrow(pointsRight: boolean, width: number, stroke: string): SvgNode {
  const [tip, back] = pointsRight ? [width - 1, width - 6] : [1, 6];
  return shape('path', {
    d: `M${back} 2L${tip} ${middle}L${back} ${height - 2}`,
    stroke,
    'stroke-width': 1.7,
    fill: 'none',
  });
}
