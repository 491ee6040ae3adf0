import type { QuotedRange } from '../contract/claim.ts';
import type { PublishedValue } from '../contract/finding.ts';
import type { AssumptionOutcome } from '../contract/result.ts';
import { checkQuotedRange } from '../quantities/check-quoted-range.ts';
import { decimalsOf, formatInterval, formatNumber, withUnit } from '../quantities/notation.ts';
import { publishedFor } from '../quantities/published-values.ts';
import { publishedQuantityNames } from '../quantities/quantity-names.ts';
import { quotedRangeText } from '../quantities/quoted-range-text.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { comparedValue } from './compared-value.ts';
import { publishedRanges, type PublishedRange } from './published-ranges.ts';
import {
  distanceWords,
  endDifference,
  hasEndsOf,
  isEndOf,
  levelRelation,
  nearestRange,
  roundingShift,
} from './range-match.ts';

/**
 * The quoted published range is what that publication says: a likely range (66 %) read as one of 90 or 95 %, or a range
 * of an edition that has been superseded, puts the number on the wrong side of what is known. The number itself stays
 * as it is, so there is no alternative and no weight.
 */
export const quotedRange: Assumption = {
  id: 'quoted-range',
  group: 'The words and units',
  title: 'The quoted published range is what that publication says',
  shortTitle: 'Range as published',
  explanation:
    'One publication gives several ranges of a quantity: a narrow one that is likely (two chances in three) and a wide one that is very likely. Reading one for the other, or quoting an older edition, makes a number look inside or outside when it is not.',
  method:
    'Compares the quoted ends, to their printed digits, with every range and one-sided statement of the value that the source names, then with those of the same quantity in other publications; and the level that is said with the published one, to within one per cent.',
  formula: 'published end rounds to the quoted digits; |level said − level published| ≤ 1 %',
  needs: 'The published value that the number is held against, and its range as the source quotes it.',
  source: 'Table of published values, each with edition and place; Mastrandrea et al. 2010 for the likelihood words',

  applies: ({ evidence }) => evidence.comparedWith !== null,

  test({ computation }) {
    const value = comparedValue(computation);
    const { quotedRange: quoted } = computation.evidence;
    if (value === null || quoted === null) {
      return untestable(quotedRange, {
        reason: `No range is on record as quoted${value ? ` for ${value.label}` : ''}.`,
        wouldNeed:
          'Under Assumptions, write the range that the source quotes, as printed, below the published value it is compared with.',
      });
    }
    checkQuotedRange('quoted range', quoted);
    const own = publishedRanges(value);
    if (own.length === 0) {
      return untestable(quotedRange, {
        reason: `The table of published values holds no range of ${value.label}.`,
        wouldNeed: 'Under Assumptions, choose a published value that has a range.',
      });
    }
    const others = publishedFor(value.quantity)
      .filter(({ id, subject, unit }) => id !== value.id && subject === value.subject && unit === value.unit)
      .flatMap(publishedRanges);
    const verdict = verdictOn(quoted, value, own, others);
    const said = `${value.label} is quoted as ${withUnit(quotedText(quoted), value.unit)}${levelText(quoted)}.`;
    const text = `${said} ${verdict.reason}${verdict.detail}`;
    return outcome('quoted-range', {
      test: `${quotedRangeText(quoted)}: ${verdict.short}`,
      reading: text,
      proposal: { mark: verdict.isMet ? 'met' : 'not met', reason: verdict.reason },
      sentence: text,
      table: tableOf(quoted, [...own, ...others]),
      caveats: verdict.named
        .filter(({ of }, place, all) => of.provenance === 'memory' && all.findIndex((one) => one.of === of) === place)
        .map(({ of }) => ({
          code: 'published-from-memory',
          detail: `${of.label} (${of.edition}) came into the table of published values from memory: look it up before it decides.`,
        })),
    });
  },
};

interface Verdict {
  isMet: boolean;
  /** A few words for the ledger. */
  short: string;
  reason: string;
  /** More of the same, for the reading. */
  detail: string;
  /** The published ranges that the verdict stands on. */
  named: PublishedRange[];
}

function verdictOn(
  quoted: QuotedRange,
  value: PublishedValue,
  own: readonly PublishedRange[],
  others: readonly PublishedRange[],
): Verdict {
  const [match] = matches(quoted, own);
  if (match) {
    const relation = levelRelation(quoted, match);
    const isMet = relation === 'same' || relation === 'not said';
    const reason = `${matchText(quoted, match, isMet)} in ${value.edition}.${levelRemark(quoted, match)}`;
    const short = isMet ? `as published, ${match.words}` : `ends of ${match.words}, another level than said`;
    const atLevel = isMet ? undefined : own.find((range) => levelRelation(quoted, range) === 'same');
    return {
      isMet,
      short,
      reason,
      detail: atLevel ? ` At the level that is said it gives ${rangeText(atLevel)}.` : '',
      named: atLevel ? [match, atLevel] : [match],
    };
  }
  const published = `${value.edition} gives ${own.map(rangeText).join('; ')}.`;
  const [elsewhere, ...further] = matches(quoted, others);
  if (elsewhere) {
    const { of } = elsewhere;
    const age = isOlder(of, value) ? 'That is an older range' : 'That is another published range';
    const more = [...new Set(further.map((range) => range.of.label).filter((label) => label !== of.label))];
    return {
      isMet: false,
      short: `not ${value.label} but ${of.label}, ${elsewhere.words}`,
      reason: `${age}: ${of.label}, ${rangeText(elsewhere)}, in ${of.edition}.${levelRemark(quoted, elsewhere)}`,
      detail: `${more.length > 0 ? ` The same ends stand in: ${more.join('; ')}.` : ''} ${published}`,
      named: [elsewhere],
    };
  }
  const nearest = nearestRange(quoted, own);
  const quantity = publishedQuantityNames[value.quantity].label + (value.subject ? ` (${value.subject})` : '');
  return {
    isMet: false,
    short: 'no published range has these ends',
    reason: `No range of ${quantity} in the table of published values has these ends.${nearest ? ` Beside ${rangeText(nearest)}, ${distanceWords(quoted, nearest)}.` : ''}`,
    detail: ` ${published}`,
    named: nearest ? [nearest] : [],
  };
}

/** Those of the level that is said first, then the nearest to the quoted digits; whole ranges before ends of one. */
function matches(quoted: QuotedRange, ranges: readonly PublishedRange[]): PublishedRange[] {
  const rank = { same: 0, 'not said': 1, 'not published': 2, other: 3 };
  return ranges
    .filter((range) => hasEndsOf(quoted, range) || isEndOf(quoted, range))
    .map((range) => ({
      range,
      level: rank[levelRelation(quoted, range)],
      rounding: roundingShift(quoted, range),
      isPart: isEndOf(quoted, range),
    }))
    .sort((a, b) => a.level - b.level || a.rounding - b.rounding || Number(a.isPart) - Number(b.isPart))
    .map(({ range }) => range);
}

function matchText(quoted: QuotedRange, range: PublishedRange, isMet: boolean): string {
  if (!isEndOf(quoted, range))
    return `${isMet ? 'That is what stands there:' : 'The ends are those of'} ${rangeText(range)},`;
  const [end, leftOut] = quoted.low === null ? ['upper', 'lower'] : ['lower', 'upper'];
  return `That is the ${end} end of ${rangeText(range)}, of which the ${leftOut} end is left out,`;
}

function levelRemark(quoted: QuotedRange, range: PublishedRange): string {
  const { levelPercent: said } = quoted;
  const percent = (level: number) => withUnit(String(level), '%');
  switch (levelRelation(quoted, range)) {
    case 'same':
      return '';
    case 'not said':
      return range.levelPercent === null
        ? ''
        : ` The source does not say its level, ${percent(range.levelPercent)}${range.isOneSided ? ' or more' : ''}.`;
    case 'not published':
      return ` The source calls it a range of ${percent(said ?? NaN)}; the publication gives it no level.`;
    case 'other':
      return ` The source calls it a range of ${percent(said ?? NaN)}; it is one of ${percent(range.levelPercent ?? NaN)}${range.isOneSided ? ' or more' : ''}.`;
  }
}

function isOlder(other: PublishedValue, than: PublishedValue): boolean {
  const yearOf = ({ edition }: PublishedValue) => Number(/\b(?:19|20)\d\d\b/.exec(edition)?.[0] ?? NaN);
  return yearOf(other) < yearOf(than);
}

function rangeText({ of, words, isOneSided, ...ends }: PublishedRange): string {
  return isOneSided ? words : `${words} ${formatInterval(ends, of.unit, printedDecimals(of))}`;
}

const printedDecimals = ({ ranges }: PublishedValue) =>
  decimalsOf(ranges.flatMap(({ interval: { low, high } }) => [low, high]));

const quotedText = (quoted: QuotedRange) => quotedRangeText({ ...quoted, levelPercent: null });
const levelText = ({ levelPercent }: QuotedRange) =>
  levelPercent === null ? '' : `, said to be ${withUnit(String(levelPercent), '%')}`;

function tableOf(quoted: QuotedRange, ranges: readonly PublishedRange[]): AssumptionOutcome['table'] {
  return {
    columns: ['Published', 'Edition', 'Range', 'Level', 'Lower end off by', 'Upper end off by', 'Equal'],
    rows: ranges.map((range) => [
      range.of.label,
      range.of.edition,
      formatInterval(range, '', printedDecimals(range.of)),
      range.words,
      offText(quoted.low, range.low),
      offText(quoted.high, range.high),
      hasEndsOf(quoted, range) ? 'yes' : isEndOf(quoted, range) ? 'one end' : 'no',
    ]),
  };
}

/** As text: a difference of printed numbers has their digits, no more. */
function offText(digits: string | null, end: number | null): string | null {
  const difference = endDifference(digits, end);
  if (difference === null) return null;
  return difference === 0 ? 'agrees' : formatNumber(difference, { decimals: decimalsOf([difference]), withSign: true });
}
