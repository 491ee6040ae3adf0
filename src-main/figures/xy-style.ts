import type { XyFigure } from '../contract/figure.ts';
import type { Palette } from './palette.ts';

export type XyMark = XyFigure['marks'][number];

export interface MarkStyle {
  readonly colour: string;
  /** Second cue beside the colour: the dash of a line, the shape of a point. */
  readonly dash: readonly number[];
  readonly point: 'circle' | 'triangle' | 'rect' | 'rectRot';
  readonly lineWidth: number;
  readonly radius: number;
}

const dashes: readonly (readonly number[])[] = [[], [8, 4], [2, 3], [8, 3, 2, 3], [12, 5]];
const points: readonly MarkStyle['point'][] = ['circle', 'triangle', 'rect', 'circle', 'triangle'];

/**
 * House style of each mark of a figure. The stated number has its own colour in every figure; a reference line is
 * grey and dotted; data and alternatives take the series colours in turn, and a band that of the mark it surrounds.
 */
export function markStyles(marks: readonly XyMark[], palette: Palette): MarkStyle[] {
  const turnOf = new Map<XyMark, number>();
  for (const mark of marks) {
    const takesTurn = mark.mark !== 'band' && (mark.role === 'data' || mark.role === 'alternative');
    if (takesTurn) turnOf.set(mark, turnOf.size);
  }
  return marks.map((mark) => {
    const radius = pointRadius(mark.x.length);
    if (mark.role === 'stated')
      return { colour: palette.stated, dash: [], point: 'rectRot', lineWidth: 2, radius: radius + 0.6 };
    if (mark.role === 'reference') return { colour: palette.ink3, dash: [2, 3], point: 'rect', lineWidth: 1.4, radius };
    const turn = turnOf.get(mark) ?? turnOf.get(surrounded(mark, marks) ?? mark) ?? 0;
    const colour = palette.series[turn % palette.series.length] ?? palette.ink;
    return {
      colour,
      dash: dashes[turn % dashes.length] ?? [],
      point: points[turn % points.length] ?? 'circle',
      lineWidth: 1.8,
      radius,
    };
  });
}

/** The mark that a band belongs to: the nearest one of its role. */
function surrounded(band: XyMark, marks: readonly XyMark[]): XyMark | undefined {
  const at = marks.indexOf(band);
  const distance = (mark: XyMark) => Math.abs(marks.indexOf(mark) - at);
  return marks
    .filter((mark) => mark.mark !== 'band' && mark.role === band.role)
    .sort((a, b) => distance(a) - distance(b))[0];
}

function pointRadius(count: number): number {
  return count > 2000 ? 0.9 : count > 400 ? 1.4 : count > 120 ? 2 : 2.6;
}
