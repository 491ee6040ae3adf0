import type { ChartConfiguration, ChartDataset, ScaleOptionsByType } from 'chart.js';
import type { XyFigure } from '../contract/figure.ts';
import { formatNumber, formatYear } from '../quantities/notation.ts';
import { paddedDomain } from './axis.ts';
import { labelColumnWidth, labelLines } from './direct-labels.ts';
import type { Palette } from './palette.ts';
import { figureFont } from './svg-node.ts';
import { xyAnnotations } from './xy-annotations.ts';
import { markStyles, type MarkStyle, type XyMark } from './xy-style.ts';

export type XyConfiguration = ChartConfiguration<'scatter'>;
type XyDataset = ChartDataset<'scatter'>;

/** More marks than this and labels beside them would be a crowd; they go into a legend. */
const mostDirectLabels = 8;

/**
 * A figure with two axes as a chart.js configuration, the same for the screen and for files: axis titles with units,
 * a light horizontal grid, labels beside the marks, every series with a second cue beside its colour, no animation.
 */
export function xyChart(figure: XyFigure, palette: Palette): XyConfiguration {
  const styles = markStyles(figure.marks, palette);
  const isLabelled = figure.marks.length > 1 && figure.marks.length <= mostDirectLabels;
  const font = { family: figureFont, size: 12 };
  const scale = { title: { display: false }, border: { display: false } };
  return {
    type: 'scatter',
    data: { datasets: figure.marks.flatMap((mark, index) => datasets(mark, styles[index], palette)) },
    plugins: [xyAnnotations(figure, styles, palette, isLabelled)],
    options: {
      animation: false,
      responsive: false,
      font,
      color: palette.ink2,
      layout: {
        padding: {
          top: 26,
          bottom: 18,
          left: 0,
          right: isLabelled ? labelColumnWidth(figure.marks.map(({ label }) => labelLines(label))) : 12,
        },
      },
      scales: {
        x: {
          ...scale,
          type: 'linear',
          ...xLimits(figure),
          grid: { drawOnChartArea: false, color: palette.ink3, tickLength: 4 },
          border: { display: true, color: palette.ink3 },
          ticks: {
            ...ticks(palette, figure.isXYears ? formatYear : null),
            font,
            maxRotation: 0,
            autoSkipPadding: 24,
            ...(figure.isXYears ? { precision: 0 } : {}),
          },
        },
        y: {
          ...scale,
          type: 'linear',
          grace: '4%',
          grid: { color: ({ tick }) => (tick.value === 0 ? palette.ink3 : palette.rule), drawTicks: false },
          ticks: { ...ticks(palette, null), font, padding: 8, maxTicksLimit: 7 },
        },
      },
      plugins: {
        legend: {
          display: figure.marks.length > mostDirectLabels,
          labels: { color: palette.ink2, font, usePointStyle: true },
        },
        tooltip: {
          backgroundColor: palette.ink,
          titleColor: palette.paper,
          bodyColor: palette.paper,
          bodyFont: font,
          displayColors: false,
          callbacks: {
            title: () => '',
            label: ({ dataset, parsed }) => `${dataset.label ?? ''}: ${pointText(parsed, figure)}`,
          },
        },
      },
    },
  };
}

function datasets(mark: XyMark, style: MarkStyle | undefined, palette: Palette): XyDataset[] {
  if (!style) return [];
  const pointsOf = (values: readonly (number | null)[]) =>
    // chart.js breaks a line at NaN, which is how missing values are to be seen.
    mark.x.map((x, at) => ({ x, y: values[at] ?? NaN }));
  const common = { label: mark.label, borderColor: style.colour, backgroundColor: style.colour, spanGaps: false };
  if (mark.mark === 'band') {
    const edge = {
      ...common,
      borderColor: `${style.colour}66`,
      borderWidth: 0.8,
      showLine: true,
      pointRadius: 0,
      pointHitRadius: 0,
      order: 3,
    };
    return [
      { ...edge, data: pointsOf(mark.y), fill: false },
      { ...edge, data: pointsOf(mark.y2 ?? mark.y), fill: '-1', backgroundColor: `${style.colour}26` },
    ];
  }
  if (mark.mark === 'line') {
    return [
      {
        ...common,
        data: pointsOf(mark.y),
        showLine: true,
        borderWidth: style.lineWidth,
        borderDash: [...style.dash],
        // A value with gaps on both sides would leave no trace on a line.
        pointRadius: mark.y.map((_, at) => (isAlone(mark.y, at) ? style.lineWidth : 0)),
        pointStyle: style.point,
        pointHitRadius: 6,
        order: mark.role === 'stated' ? 0 : 1,
      },
    ];
  }
  return [
    {
      ...common,
      data: pointsOf(mark.y),
      showLine: false,
      pointRadius: style.radius,
      pointStyle: style.point,
      pointBorderColor: palette.paper,
      pointBorderWidth: style.radius > 2 ? 0.5 : 0,
      pointHitRadius: 4,
      order: 2,
    },
  ];
}

function isAlone(values: readonly (number | null)[], at: number): boolean {
  return (values[at - 1] ?? null) === null && (values[at + 1] ?? null) === null;
}

/** The data's own span with a little room; years are not rounded outwards to decades. */
function xLimits({ marks, isXYears }: XyFigure): { min?: number; max?: number } {
  const all = marks.flatMap(({ x }) => x);
  if (all.length === 0) return {};
  const { low, high } = paddedDomain([...new Set(all)], isXYears ? 0.015 : 0.03);
  return { min: low, max: high };
}

function ticks(
  palette: Palette,
  format: ((value: number) => string) | null,
): Pick<ScaleOptionsByType<'linear'>['ticks'], 'color' | 'includeBounds' | 'callback'> {
  return {
    color: palette.ink2,
    includeBounds: false,
    callback(value, _index, all) {
      const number = Number(value);
      if (format) return format(number);
      const step = Math.abs((all[1]?.value ?? 1) - (all[0]?.value ?? 0));
      return formatNumber(number, { decimals: Math.min(12, Math.max(0, -Math.floor(Math.log10(step) + 1e-9))) });
    },
  };
}

/** Full precision: the figure itself has shown the rounded picture. */
function pointText({ x, y }: { x: number | null; y: number | null }, { isXYears }: XyFigure): string {
  const plain = (value: number | null) => (value === null ? '' : String(value).replace('-', '−'));
  return `${isXYears && x !== null ? formatYear(x) : plain(x)}; ${plain(y)}`;
}
