import { InputError } from '../errors.ts';

export type TokenKind =
  'number' | 'name' | 'function' | 'operator' | 'percent' | 'power' | 'unit' | 'equals' | 'open' | 'close' | 'end';

export interface Token {
  kind: TokenKind;
  /** Operators and powers in their plain spelling; everything else as written. */
  text: string;
  /** 1-based, as an editor counts. */
  column: number;
}

/** Functions that a line may use, with what they do to the logarithm slips. */
export const functionNames = ['ln', 'log10', 'log2', 'log', 'sqrt', 'exp'] as const;
export type FunctionName = (typeof functionNames)[number];

const plainOperators: Readonly<Record<string, string>> = {
  '+': '+',
  '-': '-',
  '−': '-',
  '–': '-',
  '*': '*',
  '×': '*',
  '·': '*',
  '⋅': '*',
  '∙': '*',
  '/': '/',
  '÷': '/',
  '∕': '/',
  '^': '^',
};

const plainDigits: Readonly<Record<string, string>> = {
  '⁰': '0',
  '¹': '1',
  '²': '2',
  '³': '3',
  '⁴': '4',
  '⁵': '5',
  '⁶': '6',
  '⁷': '7',
  '⁸': '8',
  '⁹': '9',
  '⁻': '-',
};

const numberPattern = /^(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+\-−]?\d+)?/;
const powerPattern = /^⁻?[⁰¹²³⁴-⁹]+/;
const namePattern = /^[\p{L}_][\p{L}\p{Nd}_₀-₉′']*/u;

const perUnit = '(?:K|°C|°F|W|ppm|GtCO2|GtC|m²|m2|year|yr|decade|month|century|doubling|e-folding)';
/** Units are recognised behind a number or a bracket, never where an operand must stand; the longest reading wins. */
const unitPattern = new RegExp(
  '^(?:' +
    '(?:W ?/ ?m(?:²|\\^?2)|W ?m(?:⁻²|\\^?[-−]2)|°C|°F|deg ?[CF]|K|ppmv?|ppb|GtCO[2₂]|GtC|PgC|Gt|ZJ|µatm|years?|yrs?|decades?|months?|m²|W|J)' +
    `(?: ?/ ?${perUnit}| per ${perUnit}| (?:K|°C|yr|year|decade)(?:⁻¹|\\^?[-−]1))*` +
    `|per ${perUnit}` +
    ')(?: of CO[2₂])?(?![\\p{L}\\p{Nd}_])',
  'u',
);

/** Kinds behind which a unit may stand. */
const takesUnit: readonly TokenKind[] = ['number', 'close', 'power', 'percent'];

/**
 * The words of a derivation line: numbers, names, functions, operators, units.
 *
 * @throws InputError `unreadable` at a mark that belongs to no token
 */
export function derivationTokens(line: string): Token[] {
  const tokens: Token[] = [];
  let place = 0;
  const take = (kind: TokenKind, text: string, length = text.length): void => {
    tokens.push({ kind, text, column: place + 1 });
    place += length;
  };
  while (place < line.length) {
    const rest = line.slice(place);
    const mark = [...rest][0] ?? '';
    if (/^\s/.test(rest)) {
      place++;
      continue;
    }
    const previous = tokens.at(-1)?.kind;
    const unit = previous && takesUnit.includes(previous) ? unitPattern.exec(rest)?.[0] : undefined;
    const number = numberPattern.exec(rest)?.[0];
    const power = powerPattern.exec(rest)?.[0];
    const name = namePattern.exec(rest)?.[0];
    if (unit !== undefined) take('unit', unit);
    else if (number !== undefined) take('number', number);
    else if (power !== undefined)
      take('power', [...power].map((digit) => plainDigits[digit] ?? '').join(''), power.length);
    else if (name !== undefined) takeName(name, take);
    else if (rest.startsWith('**')) take('operator', '^', 2);
    else if (mark in plainOperators) take('operator', plainOperators[mark] ?? mark, mark.length);
    else if (mark === '%') take('percent', mark);
    else if ('=≈≃≅'.includes(mark)) take('equals', mark);
    else if ('([{'.includes(mark)) take('open', mark);
    else if (')]}'.includes(mark)) take('close', mark);
    else if (mark === '√') take('function', 'sqrt', 1);
    else {
      throw new InputError({
        code: 'unreadable',
        where: `column ${place + 1}`,
        expected: 'a number, a name, an operator, a bracket or “=”',
        received: `“${mark}”`,
      });
    }
  }
  tokens.push({ kind: 'end', text: '', column: line.length + 1 });
  return tokens;
}

function takeName(name: string, take: (kind: TokenKind, text: string, length?: number) => void): void {
  const lower = name.toLowerCase();
  const known = functionNames.find((candidate) => candidate === lower);
  if (known) {
    take('function', known, name.length);
    return;
  }
  // "ln2" is ln 2; "log2" and "log10" were found above.
  const joined = /^(ln|exp|sqrt)(?=\d+$)/.exec(lower)?.[1];
  if (joined) take('function', joined, joined.length);
  else take('name', name);
}
