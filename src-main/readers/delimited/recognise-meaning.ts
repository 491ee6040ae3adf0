import type { OfferedSeries, SeriesQuantity, SeriesValues } from '../../contract/series.ts';
import { statedBasePeriods, zeroMeanPeriod } from '../base-period.ts';

export type Meaning = Pick<OfferedSeries, 'quantity' | 'agent' | 'unit' | 'unitFrom' | 'baseline' | 'baselineFrom'> & {
  /** The file gives differences in °C, which are the same in K. */
  isCelsiusDifference: boolean;
  notes: string[];
};

interface Words {
  /** Name of the column. */
  column: string;
  /** Titles and comments above the table. */
  preamble: string;
  fileName: string;
}

/** As old tables print anomalies; computations know the unit. */
const hundredths = '0.01 °C';
const temperatureUnits: readonly [RegExp, string][] = [
  [/\b0[.,]01 ?(?:[°º]|[Dd]eg(?:ree)?s?\.?)? ?(?:C\b|[Cc]elsius|K\b)/, hundredths],
  [/[°º]\s?C\b|\b[Dd]eg(?:ree)?s?\.?[ -]?C\b|[Cc]elsius|[([]C[)\]]|(?<=\s)C$/, '°C'],
  [/[°º]\s?F\b|\b[Dd]eg(?:ree)?s?\.?[ -]?F\b|[Ff]ahrenheit|[([]F[)\]]|(?<=\s)F$/, '°F'],
  [/\b[Kk]elvin\b|[([]K\b[^)\]]*[)\]]|(?<=\s)K$|\bin K\b/, 'K'],
];
const otherUnits: readonly [RegExp, string][] = [
  [/\bppmv?\b|[µμu]mol[ /]*mol|micromol[ /]*mol/i, 'ppm'],
  [/\bppbv?\b|\bnmol[ /]*mol/i, 'ppb'],
  [/\bpptv?\b/i, 'ppt'],
  [/\bW ?\/? ?m ?\^?(?:[-−⁻]?2|²|⁻²|\*\*-?2)/i, 'W/m²'],
  [/\bGt ?C\b ?(?:\/ ?yr|yr ?\^?-1|per year)/i, 'GtC/yr'],
  [/\bZJ\b/, 'ZJ'],
];
const genericColumn = /^(values?|mean|avg|average|data|anomal(y|ies)|monthly|annual|column \d+|y)\b/i;
const temperatureWords = /temp|\banom|\bgmst\b|\bgsat\b|\btas\b|\bt2m\b|\bsst\b|\blsat\b|\btlt\b/i;
const co2Words = /\bx?co2|carbon dioxide/i;
const forcingWords = /\b(erf|sarf|rf|forcings?)\b/i;
/** Mole fractions of CO2 in air, in ppm, from ice ages to the highest scenarios. */
const co2RangePpm = { low: 150, high: 5000 };
/** Anomalies of large-scale temperatures stay within this, in K or °F. */
const largestAnomaly = 12;
/** Large-scale temperatures that never exceed this are anomalies, even where none is negative. */
const largestSureAnomaly = 5;

/**
 * What a column of numbers is, as far as its name, the text above the table and the values say. A unit that no words
 * state stays empty: the reviewer is asked.
 */
export function recogniseMeaning(words: Words, values: SeriesValues): Meaning {
  const column = words.column.replaceAll('_', ' ');
  const unit = statedUnit(column) ?? statedUnit(/^[^\n]*\bunits?\s*[:=]\s*([^\n]+)/im.exec(words.preamble)?.[1] ?? '');
  const quantity = quantityOf({ ...words, column }, unit, values);
  const fallback = unit ?? unitInText(words.preamble, quantity);
  const base = basePeriod(column, words.preamble, quantity);
  const isCelsiusDifference = quantity === 'temperature-anomaly' && fallback === '°C';
  const notes = [...base.notes];
  if (quantity === 'temperature-anomaly' && base.baseline === null)
    notes.push(...hintAtBasePeriod(words.column, values));
  return {
    quantity,
    agent: quantity === 'forcing' ? agentOf(column) : null,
    unit: isCelsiusDifference ? 'K' : (fallback ?? ''),
    unitFrom: fallback === null ? 'unknown' : 'file',
    baseline: base.baseline,
    baselineFrom: base.from,
    isCelsiusDifference,
    notes,
  };
}

function statedUnit(text: string): string | null {
  return [...temperatureUnits, ...otherUnits].find(([pattern]) => pattern.test(text))?.[1] ?? null;
}

/** The one unit of the quantity that the text above the table mentions; null when it mentions none or several. */
function unitInText(preamble: string, quantity: SeriesQuantity): string | null {
  const isTemperature = quantity === 'temperature' || quantity === 'temperature-anomaly';
  const fitting = isTemperature
    ? temperatureUnits
    : otherUnits.filter(([, unit]) =>
        quantity === 'co2' ? unit === 'ppm' : quantity === 'forcing' && unit === 'W/m²',
      );
  const mentioned = fitting.filter(([pattern]) => pattern.test(preamble));
  return mentioned.length === 1 ? (mentioned[0]?.[1] ?? null) : null;
}

function quantityOf({ column, preamble, fileName }: Words, unit: string | null, values: SeriesValues): SeriesQuantity {
  const present = values.values.filter((value) => value !== null).toSorted((a, b) => a - b);
  const median = present[Math.floor(present.length / 2)] ?? 0;
  const about = genericColumn.test(column) ? `${column} ${preamble} ${fileName.replaceAll(/[_.-]/g, ' ')}` : column;
  const isTemperatureUnit = temperatureUnits.some(([, name]) => name === unit);
  if (unit === 'W/m²' || (unit === null && forcingWords.test(about))) return 'forcing';
  const isCo2 = co2Words.test(about) && median >= co2RangePpm.low && median <= co2RangePpm.high;
  if (isCo2 && (unit === 'ppm' || unit === null)) return 'co2';
  if (!isTemperatureUnit && (unit !== null || !temperatureWords.test(about))) return 'other';
  const scale = unit === hundredths ? 0.01 : 1;
  const [lowest, highest] = [(present[0] ?? 0) * scale, (present.at(-1) ?? 0) * scale];
  const isSaid = /\banom/i.test(`${column} ${preamble}`);
  const isSmall = Math.max(-lowest, highest) <= largestAnomaly;
  return isSmall && (isSaid || lowest < 0 || highest <= largestSureAnomaly) ? 'temperature-anomaly' : 'temperature';
}

function basePeriod(
  column: string,
  preamble: string,
  quantity: SeriesQuantity,
): { baseline: Meaning['baseline']; from: Meaning['baselineFrom']; notes: string[] } {
  if (quantity !== 'temperature-anomaly') return { baseline: null, from: 'not needed', notes: [] };
  const inColumn = statedBasePeriods(column);
  const stated = inColumn.length > 0 ? inColumn : statedBasePeriods(preamble);
  const [first] = stated;
  if (first === undefined) return { baseline: null, from: 'unknown', notes: [] };
  if (stated.length === 1) return { baseline: first, from: 'file', notes: [] };
  const listed = stated.map(({ start, end }) => `${start}–${end}`).join(', ');
  return { baseline: null, from: 'unknown', notes: [`The file names several base periods: ${listed}.`] };
}

function hintAtBasePeriod(column: string, values: SeriesValues): string[] {
  const span = zeroMeanPeriod(values);
  if (span === null) return [];
  return [
    `“${column}” averages to zero over ${span.start}–${span.end}; that may be its base period. The file does not say.`,
  ];
}

function agentOf(column: string): string | null {
  if (/\btotal\b/i.test(column)) {
    return /anthro/i.test(column) ? 'total-anthropogenic' : /natural/i.test(column) ? 'total-natural' : 'total';
  }
  return co2Words.test(column) ? 'co2' : null;
}
