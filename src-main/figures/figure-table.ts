import type { Figure, StemFigure, XyFigure } from '../contract/figure.ts';
import { quantityNames } from '../quantities/quantity-names.ts';

export interface FigureTable {
  readonly columns: readonly string[];
  readonly rows: readonly (readonly (string | number | null)[])[];
}

/** Everything that a figure draws, as rows: for a reader who does not see it, and for a file. Nothing is rounded. */
export function figureTable(figure: Figure): FigureTable {
  return figure.kind === 'stem' ? stemTable(figure) : xyTable(figure);
}

function stemTable({ unit, stated, recomputed, rows, bands }: StemFigure): FigureTable {
  return {
    columns: ['what', 'applied to', 'value', 'low', 'high', 'level, %', 'quantity', 'unit'],
    rows: [
      [
        'stated' + (stated.bound === 'equals' ? '' : `, ${stated.bound}`),
        'limits: all that rounds to it',
        stated.value,
        stated.interval.low,
        stated.interval.high,
        null,
        null,
        unit,
      ],
      ...(recomputed
        ? [['recomputed as stated', null, recomputed.value, ...limits(recomputed.interval), null, unit]]
        : []),
      ...rows.map((row) => [
        row.label,
        row.isCumulative ? 'the row above' : 'the recomputation',
        row.value,
        ...limits(row.interval),
        quantityNames[row.quantity].label,
        unit,
      ]),
      ...bands.map((band) => [
        `published: ${band.label}`,
        null,
        null,
        band.low,
        band.high,
        null,
        quantityNames[band.quantity].label,
        unit,
      ]),
    ],
  };
}

type Limits = [low: number | null, high: number | null, levelPercent: number | null];

function limits(interval: StemFigure['rows'][number]['interval']): Limits {
  return interval ? [interval.low, interval.high, interval.levelPercent] : [null, null, null];
}

/** One column per mark when all share their x, otherwise one row per point with the mark's name. */
function xyTable({ xLabel, yLabel, marks }: XyFigure): FigureTable {
  const [first] = marks;
  const shareX =
    first && marks.every(({ x }) => x.length === first.x.length && x.every((each, at) => each === first.x[at]));
  if (!shareX) {
    const hasBand = marks.some(({ y2 }) => y2 !== null);
    return {
      columns: ['mark', xLabel, yLabel, ...(hasBand ? [`${yLabel}, upper`] : [])],
      rows: marks.flatMap(({ label, x, y, y2 }) =>
        x.map((each, at) => [label, each, y[at] ?? null, ...(hasBand ? [y2?.[at] ?? null] : [])]),
      ),
    };
  }
  return {
    columns: [xLabel, ...marks.flatMap(({ label, y2 }) => (y2 ? [`${label}, lower`, `${label}, upper`] : [label]))],
    rows: first.x.map((each, at) => [
      each,
      ...marks.flatMap(({ y, y2 }) => (y2 ? [y[at] ?? null, y2[at] ?? null] : [y[at] ?? null])),
    ]),
  };
}
