import type { Chart, Plugin } from 'chart.js';
import type { XyFigure } from '../contract/figure.ts';
import { fillTextRuns } from './canvas-text.ts';
import {
  labelFontSize,
  labelLineHeight,
  labelLines,
  placeLabels,
  swatchWidth,
  type PlacedLabel,
} from './direct-labels.ts';
import type { Palette } from './palette.ts';
import type { MarkStyle, XyMark } from './xy-style.ts';

const fontSize = 12.5;

/** Axis titles, set level where the axes end, and the labels beside the marks: what chart.js would tilt or box. */
export function xyAnnotations(
  figure: XyFigure,
  styles: readonly MarkStyle[],
  palette: Palette,
  isLabelled: boolean,
): Plugin<'scatter'> {
  return {
    id: 'annotations',
    afterDraw(chart) {
      const { ctx, chartArea, height } = chart;
      ctx.save();
      ctx.fillStyle = palette.ink2;
      fillTextRuns(ctx, figure.yLabel, 0, 14, { fontSize });
      fillTextRuns(ctx, figure.xLabel, chartArea.right, height - 5, { fontSize, align: 'end' });
      if (isLabelled) drawLabels(chart, figure.marks, styles, palette);
      ctx.restore();
    },
  };
}

function drawLabels(chart: Chart, marks: readonly XyMark[], styles: readonly MarkStyle[], palette: Palette): void {
  const { top, bottom, right } = chart.chartArea;
  const wanted = marks.map((mark) => ({
    lines: labelLines(mark.label),
    anchorY: clamp(markEndY(chart, mark), top, bottom),
  }));
  placeLabels(wanted, top - 6, bottom + 6).forEach((label, index) => {
    const [mark, style] = [marks[index], styles[index]];
    if (!mark || !style) return;
    drawSwatch(chart, mark, style, right + 10, label.y);
    drawLines(chart, label, right + 10 + swatchWidth + 4, palette);
  });
}

/** Where a mark leaves the plot: its last point, or the middle of a band there. */
function markEndY(chart: Chart, { x, y, y2 }: XyMark): number {
  let last = -1;
  x.forEach((value, at) => {
    if (typeof y[at] === 'number' && (last < 0 || value >= (x[last] ?? value))) last = at;
  });
  const [lower, upper] = [y[last] ?? 0, y2?.[last] ?? y[last] ?? 0];
  return chart.scales.y?.getPixelForValue((lower + upper) / 2) ?? 0;
}

function drawSwatch({ ctx }: Chart, { mark }: XyMark, style: MarkStyle, x: number, y: number): void {
  ctx.save();
  ctx.strokeStyle = style.colour;
  ctx.fillStyle = style.colour;
  ctx.lineWidth = style.lineWidth;
  ctx.beginPath();
  if (mark === 'band') {
    ctx.globalAlpha = 0.3;
    ctx.fillRect(x, y - 5, swatchWidth, 10);
  } else if (mark === 'line') {
    ctx.setLineDash([...style.dash]);
    ctx.moveTo(x, y);
    ctx.lineTo(x + swatchWidth, y);
    ctx.stroke();
  } else {
    pointPath(ctx, style.point, x + swatchWidth / 2, y, Math.max(2.6, style.radius));
    ctx.fill();
  }
  ctx.restore();
}

function pointPath(ctx: Chart['ctx'], point: MarkStyle['point'], x: number, y: number, radius: number): void {
  const corners = { circle: [], triangle: [-90, 30, 150], rect: [-45, 45, 135, 225], rectRot: [0, 90, 180, 270] }[
    point
  ];
  if (corners.length === 0) ctx.arc(x, y, radius, 0, 2 * Math.PI);
  for (const degrees of corners) {
    const angle = (degrees * Math.PI) / 180;
    ctx.lineTo(x + radius * Math.cos(angle), y + radius * Math.sin(angle));
  }
  ctx.closePath();
}

function drawLines({ ctx }: Chart, label: PlacedLabel, x: number, palette: Palette): void {
  ctx.fillStyle = palette.ink;
  const first = label.y + 4 - ((label.lines.length - 1) * labelLineHeight) / 2;
  label.lines.forEach((line, at) =>
    fillTextRuns(ctx, line, x, first + at * labelLineHeight, { fontSize: labelFontSize }),
  );
}

function clamp(value: number, low: number, high: number): number {
  return Math.min(high, Math.max(low, value));
}
