import type { OfferedSeries, SeriesQuantity, SeriesValues } from '../contract/series.ts';
import { statedBasePeriods, zeroMeanPeriod } from './base-period.ts';
import { heatUptakeNotes } from './heat-uptake-notes.ts';

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
  [/\b(?:Mt|Tg) ?C\b ?(?:\/ ?yr|yr ?\^?-1|per year)/i, 'MtC/yr'],
  [/\b(?:Gt|Pg) ?C\b ?(?:\/ ?yr|yr ?\^?-1|per year)/i, 'GtC/yr'],
  [/\bGt ?CO2\b ?(?:\/ ?yr|yr ?\^?-1|per year)/i, 'GtCO2/yr'],
  [/\bZJ\b/, 'ZJ'],
  [/(?:\b10(?:\^|\*\*)?22|\b1e\+?22|10²²) ?(?:J\b|joules?\b)/i, '10²² J'],
  [/[([]\s*%\s*[)\]]|\bin percent\b|(?<=\s)%$/, '%'],
];
/** What Joules a unit of heat is. */
const joulesPerUnit: Readonly<Record<string, number>> = { ZJ: 1e21, '10²² J': 1e22 };
const genericColumn = /^(values?|mean|avg|average|data|anomal(y|ies)|monthly|annual|column \d+|y)\b/i;
const temperatureWords = /temp|\banom|\bgmst\b|\bgsat\b|\btas\b|\bt2m\b|\bsst\b|\blsat\b|\btlt\b/i;
const co2Words = /\bx?co2|carbon dioxide/i;
const forcingWords = /\b(erf|sarf|rf|forcings?)\b/i;
/** No forcing of the industrial era is as large, in W/m²; sunlight and heat fluxes are. */
const largestForcingWm2 = 50;
/** Surface air temperatures of large regions, in K; as many °C or °F would be none. */
const plausibleK = { low: 180, high: 330 };
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
  const unit = statedUnit(column) ?? (/per.?capita/i.test(column) ? null : unitOfAll(words.preamble));
  const quantity = quantityOf({ ...words, column }, unit, values);
  const fallback = unit ?? unitInText(words.preamble, quantity);
  const base = basePeriod(column, words.preamble, quantity);
  const isCelsiusDifference = quantity === 'temperature-anomaly' && fallback === '°C';
  const notes = [...base.notes];
  if (quantity === 'temperature-anomaly' && base.baseline === null)
    notes.push(...hintAtBasePeriod(words.column, values));
  notes.push(...doubts(words.column, quantity, fallback, values));
  return {
    quantity,
    agent: quantity === 'forcing' ? agentOf(column) : null,
    unit: isCelsiusDifference ? 'K' : (fallback ?? ''),
    unitFrom: fallback === null ? 'unknown' : 'file',
    baseline: base.baseline,
    baselineFrom: base.from,
    isCelsiusDifference,
    notes: fallback === '°F' ? [...notes, fahrenheitNote(words.column)] : notes,
  };
}

function fahrenheitNote(column: string): string {
  return `“${column}” is in °F: a difference of 1.8 °F is one of 1 K, and computations divide by that.`;
}

/** The unit that words state; null when they state none that is known here. */
export function statedUnit(text: string): string | null {
  return [...temperatureUnits, ...otherUnits].find(([pattern]) => pattern.test(text))?.[1] ?? null;
}

/** A unit that the text above the table states for all columns: “Units: K”, or a line that begins with a cell of it alone. */
function unitOfAll(preamble: string): string | null {
  const stated = /^[^\n]*\bunits?\s*[:=]\s*([^\n]+)/im.exec(preamble)?.[1];
  if (stated !== undefined) return statedUnit(stated);
  const cells = preamble
    .split('\n')
    .map((line) => (line.split(/[,;\t]/)[0] ?? '').replaceAll(/^[\s"#%(]+|[\s")]+$/g, ''));
  return statedUnit(cells.find((cell) => cell.length <= 12 && statedUnit(cell) !== null) ?? '');
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
  if (unit === 'W/m²' && Math.abs(median) > largestForcingWm2) return 'other';
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

/** What a careful reader would ask about values that do not look like their unit. */
function doubts(column: string, quantity: SeriesQuantity, unit: string | null, values: SeriesValues): string[] {
  const present = values.values.filter((value) => value !== null).toSorted((a, b) => a - b);
  const [lowest = 0, highest = 0] = [present[0], present.at(-1)];
  const range = `from ${rounded(lowest)} to ${rounded(highest)}`;
  if (quantity === 'temperature') {
    const looksLikeK = lowest > plausibleK.low && highest < plausibleK.high;
    if (unit === 'K' && !looksLikeK) {
      return [`“${column}” is said to be in K and runs ${range}: no absolute temperatures in K. Is it in °C or °F?`];
    }
    if (unit === '°C' && looksLikeK) return [`“${column}” is said to be in °C and runs ${range}: that looks like K.`];
    return [`“${column}” runs ${range}${unit ? ` ${unit}` : ''}: absolute temperatures, not anomalies.`];
  }
  const joules = unit === null ? undefined : joulesPerUnit[unit];
  return joules === undefined ? [] : heatUptakeNotes(column, values, joules);
}

function rounded(value: number): string {
  return String(Number(value.toPrecision(4)));
}

function agentOf(column: string): string | null {
  if (/\btotal\b/i.test(column)) {
    return /anthro/i.test(column) ? 'total-anthropogenic' : /natural/i.test(column) ? 'total-natural' : 'total';
  }
  return co2Words.test(column) ? 'co2' : null;
}
