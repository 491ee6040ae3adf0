import type { StemFigure } from '../contract/figure.ts';
import type { QuantityId } from '../contract/primitives.ts';
import { formatNumber } from '../quantities/notation.ts';
import { axisTicks } from './axis.ts';
import type { Palette } from './palette.ts';
import { stemDescription } from './stem-description.ts';
import { stemFontSize, stemLayout, unitLabel, type StemLayout, type StemRow } from './stem-layout.ts';
import { figureFont, shape, text, type SvgNode } from './svg-node.ts';

/**
 * The stem: the stated number, the recomputed one, and the number under each changed assumption, on one axis in
 * the claim's unit. A range that is published for the same quantity as a row is tinted more strongly in that row.
 */
export function stemDrawing(figure: StemFigure, palette: Palette, width: number): SvgNode {
  const layout = stemLayout(figure, width);
  return {
    tag: 'svg',
    attributes: {
      xmlns: 'http://www.w3.org/2000/svg',
      viewBox: `0 0 ${width} ${round(layout.height)}`,
      width,
      height: round(layout.height),
      role: 'img',
      'aria-label': stemDescription(figure),
      'font-family': figureFont,
      'font-size': stemFontSize,
    },
    children: [
      ...bandNodes(layout, palette),
      ...axisNodes(layout, unitLabel(figure), palette),
      ...statedLine(layout, figure, palette),
      ...connectors(layout, palette),
      ...layout.rows.flatMap((row) => rowNodes(row, layout, figure, palette)),
    ],
  };
}

function bandNodes({ bands, rows, plot, x }: StemLayout, palette: Palette): SvgNode[] {
  const quantities = [...new Set(bands.map((band) => band.quantity))];
  const tint = (quantity: QuantityId) =>
    palette.bands[quantities.indexOf(quantity) % palette.bands.length] ?? palette.rule;
  const areas = bands.flatMap((band) => {
    const [left, right] = [round(x(band.low)), round(x(band.high))];
    const area = (y: number, height: number, opacity: number) =>
      shape('rect', {
        x: left,
        y: round(y),
        width: round(right - left),
        height: round(height),
        fill: tint(band.quantity),
        'fill-opacity': opacity,
      });
    const edges = `M${left} ${round(plot.top)}V${round(plot.bottom)}M${right} ${round(plot.top)}V${round(plot.bottom)}`;
    return [
      area(plot.top, plot.bottom - plot.top, 0.5),
      ...rows.filter((row) => row.quantity === band.quantity).map((row) => area(row.y - row.height / 2, row.height, 1)),
      shape('path', { d: edges, stroke: palette.ink3, 'stroke-width': 0.6, fill: 'none' }),
    ];
  });
  const labels = bands.flatMap((band) => [
    shape('path', {
      d: `M${round(x(band.low))} ${band.labelY + 9}v-4H${round(x(band.high))}v4`,
      stroke: palette.ink3,
      fill: 'none',
    }),
    text(band.label, round(band.labelX), band.labelY, { fill: palette.ink2, 'text-anchor': 'middle' }),
  ]);
  return [...areas, ...labels];
}

function axisNodes({ plot, domain, x, columns, rangeHeading }: StemLayout, unit: string, palette: Palette): SvgNode[] {
  const ticks = axisTicks(domain, Math.max(3, Math.floor((plot.right - plot.left) / 70)));
  const step = (ticks[1] ?? 1) - (ticks[0] ?? 0);
  const decimals = Math.min(12, Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
  const baseline = plot.bottom + 17;
  const heading = round(plot.top - 14);
  return [
    shape('line', {
      x1: round(plot.left),
      x2: round(plot.right),
      y1: round(plot.bottom),
      y2: round(plot.bottom),
      stroke: palette.ink3,
    }),
    ...ticks.flatMap((tick) => [
      shape('line', {
        x1: round(x(tick)),
        x2: round(x(tick)),
        y1: round(plot.bottom),
        y2: round(plot.bottom + 4),
        stroke: palette.ink3,
      }),
      text(formatNumber(tick, { decimals }), round(x(tick)), round(baseline), {
        fill: palette.ink2,
        'text-anchor': 'middle',
      }),
    ]),
    text(unit, 0, round(baseline), { fill: palette.ink2 }),
    ...(rangeHeading === '' ? [] : [text(rangeHeading, round(columns.range), heading, { fill: palette.ink2 })]),
  ];
}

function statedLine({ plot, x }: StemLayout, { stated }: StemFigure, palette: Palette): SvgNode[] {
  const [low, high, at] = [x(stated.interval.low), x(stated.interval.high), round(x(stated.value))];
  const [y1, y2] = [round(plot.top), round(plot.bottom)];
  return [
    shape('rect', {
      x: round(low),
      y: y1,
      width: round(high - low),
      height: round(y2 - y1),
      fill: palette.stated,
      'fill-opacity': 0.16,
    }),
    shape('line', { x1: at, x2: at, y1, y2, stroke: palette.stated, 'stroke-width': 1.6 }),
  ];
}

/** Dotted, from the row above to each row that applies on top of it. */
function connectors({ rows, x }: StemLayout, palette: Palette): SvgNode[] {
  return rows.flatMap((row, index) => {
    const above = rows[index - 1];
    if (!row.isCumulative || row.value === null || !above || above.value === null) return [];
    const [x1, y1, x2, y2] = [round(x(above.value)), round(above.y + 5), round(x(row.value)), round(row.y - 5)];
    const middle = round((y1 + y2) / 2);
    const d = `M${x1} ${y1}C${x1} ${middle} ${x2} ${middle} ${x2} ${y2}`;
    return [shape('path', { d, stroke: palette.ink3, 'stroke-dasharray': '2 3', fill: 'none' })];
  });
}

function rowNodes(row: StemRow, layout: StemLayout, figure: StemFigure, palette: Palette): SvgNode[] {
  const { columns, x } = layout;
  const colour = { stated: palette.stated, recomputed: palette.ink, alternative: palette.accent }[row.kind];
  const labelColour = { stated: palette.stated, recomputed: palette.ink, alternative: palette.ink }[row.kind];
  const weight = row.kind === 'alternative' ? 400 : 650;
  const firstBaseline = row.y + 4.5 - ((row.lines.length - 1) * 16) / 2;
  const label = row.lines.map((line, index) =>
    text(line, 0, round(firstBaseline + index * 16), { fill: labelColour, 'font-weight': weight }),
  );
  const baseline = round(row.y + 4.5);
  const numbers = [
    text(row.valueText, round(columns.value), baseline, {
      fill: labelColour,
      'text-anchor': 'end',
      'font-weight': 650,
    }),
    text(row.rangeText, round(columns.range), baseline, { fill: palette.ink2 }),
    text(row.quantityText, round(columns.quantity), baseline, { fill: palette.ink2 }),
  ].filter((node) => 'text' in node && node.text !== '');
  if (row.value === null) return [...label, ...numbers];
  const marks =
    row.kind === 'stated'
      ? boundArrow(figure.stated.bound, x(row.value), row.y, colour)
      : [
          ...bar(row, layout, colour),
          shape('circle', { cx: round(x(row.value)), cy: round(row.y), r: 4.6, fill: colour }),
        ];
  return [...label, ...marks, ...numbers];
}

/** The interval of a row; an end beyond the axis, or without a limit, becomes an arrow at the axis end. */
function bar(row: StemRow, { domain, plot, x }: StemLayout, stroke: string): SvgNode[] {
  if (row.interval === null) return [];
  const { low, high } = row.interval;
  const runsOffLeft = low === null || low < domain.low;
  const runsOffRight = high === null || high > domain.high;
  const from = round(runsOffLeft ? plot.left : x(low));
  const to = round(runsOffRight ? plot.right : x(high));
  const y = round(row.y);
  return [
    shape('line', { x1: from, x2: to, y1: y, y2: y, stroke, 'stroke-width': 1.7 }),
    ...(runsOffLeft ? [arrowHead(from, y, 1, stroke)] : []),
    ...(runsOffRight ? [arrowHead(to, y, -1, stroke)] : []),
  ];
}

function boundArrow(bound: StemFigure['stated']['bound'], at: number, y: number, stroke: string): SvgNode[] {
  if (bound === 'equals') return [shape('circle', { cx: round(at), cy: round(y), r: 3.4, fill: stroke })];
  const direction = bound === 'at most' ? -1 : 1;
  const tip = round(at + direction * 22);
  return [
    shape('line', { x1: round(at), x2: tip, y1: round(y), y2: round(y), stroke, 'stroke-width': 1.7 }),
    arrowHead(tip, round(y), -direction, stroke),
  ];
}

/** An open arrow head at (x, y) whose barbs point back in `direction`. */
function arrowHead(x: number, y: number, direction: number, stroke: string): SvgNode {
  const back = x + direction * 6;
  return shape('path', {
    d: `M${back} ${y - 4}L${x} ${y}L${back} ${y + 4}`,
    stroke,
    'stroke-width': 1.7,
    fill: 'none',
  });
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
