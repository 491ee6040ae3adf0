import { BasicPlatform } from 'chart.js';
import type { XyFigure } from '../contract/figure.ts';
import { Chart } from './chart-library.ts';
import type { Palette } from './palette.ts';
import { RecordingCanvas } from './recording-canvas.ts';
import { figureFont, type SvgNode } from './svg-node.ts';
import { xyChart } from './xy-chart.ts';

/** The chart of a figure as a drawing: the house style's chart.js configuration, recorded instead of painted. */
export function xyDrawing(figure: XyFigure, palette: Palette, width: number, height: number): SvgNode {
  const recording = new RecordingCanvas(width, height);
  const { options, ...configuration } = xyChart(figure, palette);
  const chart = new Chart(recording.canvas as unknown as HTMLCanvasElement, {
    ...configuration,
    platform: BasicPlatform,
    options: { ...options, devicePixelRatio: 1 },
  });
  const children = [...recording.nodes];
  chart.destroy();
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
    children,
  };
}
