import type { StemFigure } from '../contract/figure.ts';
import type { Interval, QuantityId } from '../contract/primitives.ts';
import { formatInterval, formatLevel, formatNumber, withUnit } from '../quantities/notation.ts';
import { quantityNames } from '../quantities/quantity-names.ts';
import { axisDecimals, paddedDomain, type Domain } from './axis.ts';
import { textWidth, wrapText } from './text-width.ts';

export const stemFontSize = 12.5;
const lineHeight = 16;
const rowHeight = 31;
/** A label and the bracket under it. */
const bandLevelHeight = 23;
const gap = 14;

export interface StemRow {
  readonly kind: 'stated' | 'recomputed' | 'alternative';
  readonly lines: readonly string[];
  /** Where the row's marks sit. */
  readonly y: number;
  readonly height: number;
  /** null: not computed yet. */
  readonly value: number | null;
  readonly interval: Pick<Interval, 'low' | 'high'> | null;
  readonly quantity: QuantityId | null;
  readonly isCumulative: boolean;
  readonly valueText: string;
  readonly rangeText: string;
  readonly quantityText: string;
}

export interface StemBand {
  readonly label: string;
  readonly low: number;
  readonly high: number;
  readonly quantity: QuantityId;
  readonly labelX: number;
  /** Baseline of the label; the bracket that spans the range is just below it. */
  readonly labelY: number;
}

export interface StemLayout {
  readonly domain: Domain;
  readonly x: (value: number) => number;
  readonly plot: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
  readonly columns: { readonly value: number; readonly range: number; readonly quantity: number };
  readonly rangeHeading: string;
  readonly height: number;
  readonly rows: readonly StemRow[];
  readonly bands: readonly StemBand[];
}

/**
 * The part of the axis that is shown: every value, the stated digits' interval and all published ranges in full;
 * intervals only as far as they do not squeeze the rest. Longer ones run off the end.
 */
export function stemDomain(figure: StemFigure): Domain {
  const { stated, recomputed, rows, bands } = figure;
  const core = [
    stated.interval.low,
    stated.interval.high,
    ...(recomputed ? [recomputed.value] : []),
    ...rows.map((row) => row.value),
    ...bands.flatMap((band) => [band.low, band.high]),
  ];
  const tight = paddedDomain(core, 0);
  // The stated digits' interval takes up an eighth of the axis at most.
  const missing = Math.max(0, 8 * (stated.interval.high - stated.interval.low) - (tight.high - tight.low));
  const [low, high] = [tight.low - missing / 2, tight.high + missing / 2];
  const reach = (high - low) * 0.8;
  const ends = [recomputed?.interval, ...rows.map((row) => row.interval)]
    .flatMap((interval) => [interval?.low, interval?.high])
    .filter((end) => typeof end === 'number')
    .filter((end) => end > low - reach && end < high + reach);
  return paddedDomain([low, high, ...ends], 0.05);
}

/** What a row or a range is a number of, in the space of a table column. */
export function shortQuantity(quantity: QuantityId): string {
  return quantity === 'apparent-sensitivity' ? 'apparent' : quantityNames[quantity].symbol;
}

/** What stands at the axis. */
export function unitLabel({ unit }: StemFigure): string {
  return unit === '1' ? 'a ratio, no unit' : unit;
}

/** Puts every row, label and column of a stem in its place, in units of the drawing. */
export function stemLayout(figure: StemFigure, width: number): StemLayout {
  const domain = stemDomain(figure);
  const decimals = axisDecimals(domain);
  const drafts = draftRows(figure, decimals);
  const widest = (texts: readonly string[]) =>
    Math.ceil(Math.max(0, ...texts.map((each) => textWidth(each, stemFontSize))) * 1.03);
  // Two of the labels are bold.
  const wanted = widest([unitLabel(figure), ...drafts.map((row) => row.label)]) * 1.05;
  const labelWidth = Math.min(wanted, 232, Math.max(150, width * 0.28));
  const level = commonLevel(figure);
  const rangeHeading = level === null ? '' : formatLevel(level);
  const valueWidth = widest(drafts.map((row) => row.valueText)) * 1.06;
  const rangeWidth = widest([rangeHeading, ...drafts.map((row) => row.rangeText)]);
  const quantityWidth = widest(drafts.map((row) => row.quantityText));
  const columns = {
    value: width - quantityWidth - (quantityWidth > 0 ? 10 : 0) - rangeWidth - 10,
    range: width - quantityWidth - (quantityWidth > 0 ? 10 : 0) - rangeWidth,
    quantity: width - quantityWidth,
  };
  const left = labelWidth + gap;
  const right = columns.value - valueWidth - gap;
  const x = (value: number) => left + ((value - domain.low) / (domain.high - domain.low)) * (right - left);
  const { bands, levels } = placeBands(figure, x, left, right);
  const top = Math.max(1, levels) * bandLevelHeight + 4;
  let bottom = top + 4;
  const rows = drafts.map((draft): StemRow => {
    const lines = wrapText(draft.label, labelWidth, stemFontSize, draft.kind !== 'alternative');
    const height = Math.max(rowHeight, lines.length * lineHeight + 9);
    bottom += height;
    return { ...draft, lines, height, y: bottom - height / 2 };
  });
  bottom += 4;
  return {
    domain,
    x,
    plot: { left, right, top, bottom },
    columns,
    rangeHeading,
    height: bottom + 26,
    rows,
    bands,
  };
}

/** The level that most bars have, in per cent; null without bars. Rows of another level name their own. */
function commonLevel({ recomputed, rows }: StemFigure): number | null {
  const levels = [recomputed?.interval, ...rows.map((row) => row.interval)].flatMap((each) => each?.levelPercent ?? []);
  const count = (level: number) => levels.filter((each) => each === level).length;
  return levels.toSorted((a, b) => count(b) - count(a))[0] ?? null;
}

type DraftRow = Omit<StemRow, 'lines' | 'y' | 'height'> & { readonly label: string };

function draftRows(figure: StemFigure, decimals: number): DraftRow[] {
  const { stated, recomputed } = figure;
  const level = commonLevel(figure);
  const quantities = new Set([...figure.rows, ...figure.bands].map(({ quantity }) => quantity));
  const rangeText = (interval: Interval | null) =>
    interval === null
      ? ''
      : formatInterval(interval, '', decimals) +
        (interval.levelPercent === level ? '' : ` (${withUnit(String(interval.levelPercent), '%')})`);
  // The digits as printed: their rounding interval is one unit of the last of them.
  const printedDecimals = Math.max(0, Math.round(-Math.log10(stated.interval.high - stated.interval.low)));
  const statedRow: DraftRow = {
    kind: 'stated',
    label: stated.text,
    value: stated.value,
    interval: stated.interval,
    quantity: null,
    isCumulative: false,
    valueText: formatNumber(stated.value, { decimals: printedDecimals }),
    rangeText: '',
    quantityText: '',
  };
  const recomputedRow: DraftRow = {
    kind: 'recomputed',
    label: recomputed ? 'Recomputed as stated' : 'Not recomputed yet',
    value: recomputed?.value ?? null,
    interval: recomputed?.interval ?? null,
    quantity: null,
    isCumulative: false,
    valueText: recomputed ? formatNumber(recomputed.value, { decimals }) : '',
    rangeText: rangeText(recomputed?.interval ?? null),
    quantityText: '',
  };
  const alternatives = figure.rows.map((row): DraftRow => ({
    kind: 'alternative',
    label: row.label,
    value: row.value,
    interval: row.interval,
    quantity: row.quantity,
    isCumulative: row.isCumulative,
    valueText: formatNumber(row.value, { decimals }),
    rangeText: rangeText(row.interval),
    quantityText: quantities.size > 1 ? shortQuantity(row.quantity) : '',
  }));
  return [statedRow, recomputedRow, ...alternatives];
}

/** Labels above the plot, on the lowest level where they do not touch one that is already there. */
function placeBands(figure: StemFigure, x: (value: number) => number, left: number, right: number) {
  const taken: { from: number; to: number }[][] = [];
  // Wide ranges first, so that a narrow one drawn over them stays visible.
  const ordered = [...figure.bands].sort((a, b) => b.high - b.low - (a.high - a.low));
  const placed = ordered.map((band) => {
    const half = textWidth(band.label, stemFontSize) / 2;
    const centre = (x(band.low) + x(band.high)) / 2;
    const labelX = Math.max(left + half, Math.min(right - half, centre));
    const span = { from: labelX - half - 6, to: labelX + half + 6 };
    let level = 0;
    while (taken[level]?.some((other) => other.from < span.to && span.from < other.to)) level += 1;
    (taken[level] ??= []).push(span);
    return { ...band, labelX, level };
  });
  const levels = taken.length;
  const bands = placed.map(({ level, ...band }): StemBand => ({
    ...band,
    labelY: (levels - level) * bandLevelHeight - 5,
  }));
  return { bands, levels };
}
