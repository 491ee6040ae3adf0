import { InputError } from '../errors.ts';
import type { FunctionName, Token } from './derivation-tokens.ts';

export type Expression =
  | { kind: 'number'; text: string }
  | { kind: 'name'; name: string; column: number }
  | { kind: 'negate'; operand: Expression }
  | { kind: 'percent'; operand: Expression }
  | { kind: 'binary'; operator: BinaryOperator; left: Expression; right: Expression; column: number }
  | { kind: 'call'; functionName: FunctionName; argument: Expression; column: number };

export type BinaryOperator = '+' | '-' | '*' | '/' | '^';

export interface ParsedSide {
  expression: Expression;
  /** The last unit written on this side. */
  unit: string | null;
  remarks: string[];
}

/** Binding powers, loosest first. A power binds to the right, everything else to the left. */
const bindingPower: Readonly<Record<string, number>> = { '+': 1, '-': 1, '*': 2, '/': 2, '^': 4 };
const signPower = 3;

/**
 * Reads one side of a derivation line (operator precedence after Pratt 1973). Numbers, names and brackets that stand
 * side by side are multiplied: "5.35 ln 2", "2 (a + b)". A function without brackets takes the operand that follows,
 * with its power: "ln 2²" is ln(2²), "ln C/C0" is (ln C)/C0.
 *
 * @param tokens  of one side, closed by an `end` token
 * @throws InputError `unreadable`, with the column and what was expected there
 */
export function parseExpression(tokens: readonly Token[]): ParsedSide {
  let place = 0;
  let unit: string | null = null;
  const remarks: string[] = [];

  const peek = (): Token => tokens[place] ?? { kind: 'end', text: '', column: 1 };
  const advance = (): Token => {
    const token = peek();
    place++;
    return token;
  };

  function parseOperand(): Expression {
    const token = advance();
    switch (token.kind) {
      case 'number':
        if (/^[1-9]\d{0,2},\d{3}$/.test(token.text)) {
          remarks.push(`“${token.text}” is read with a decimal comma; write thousands without a mark.`);
        }
        return withMarks({ kind: 'number', text: token.text });
      case 'name':
        return withMarks({ kind: 'name', name: token.text, column: token.column });
      case 'open':
        return withMarks(restOfBracket());
      case 'function':
        return withMarks(parseCall(token.text as FunctionName, token.column));
      case 'operator':
        if (token.text === '-') return { kind: 'negate', operand: parse(signPower) };
        if (token.text === '+') return parse(signPower);
        break;
    }
    throw unexpected(token, 'a number, a name, a function or “(”');
  }

  function parseCall(functionName: FunctionName, column: number): Expression {
    if (functionName === 'log') remarks.push('“log” is read as the logarithm to base 10.');
    const hasBrackets = peek().kind === 'open';
    if (hasBrackets) advance();
    const argument = hasBrackets ? restOfBracket() : parse(signPower);
    if (!hasBrackets && peek().kind === 'operator' && peek().text === '/') {
      remarks.push(`“${functionName}” without brackets is read as taking only what stands before the “/”.`);
    }
    return { kind: 'call', functionName, argument, column };
  }

  function restOfBracket(): Expression {
    const inner = parse(0);
    if (peek().kind !== 'close') throw unexpected(peek(), 'an operator or “)”');
    advance();
    return inner;
  }

  /** Percent signs, raised powers and units that follow an operand. */
  function withMarks(operand: Expression): Expression {
    let marked = operand;
    for (;;) {
      const { kind, text, column } = peek();
      if (kind === 'percent') marked = { kind: 'percent', operand: marked };
      else if (kind === 'power')
        marked = { kind: 'binary', operator: '^', left: marked, right: numberOf(text), column };
      else if (kind === 'unit') unit = text;
      else return marked;
      advance();
    }
  }

  function parse(minimumPower: number): Expression {
    let left = parseOperand();
    for (;;) {
      const token = peek();
      const operator = infixOperator(token);
      if (operator === null) return left;
      const power = bindingPower[operator] ?? 0;
      if (power <= minimumPower) return left;
      if (token.kind === 'operator') advance();
      const right = parse(operator === '^' ? power - 1 : power);
      left = { kind: 'binary', operator, left, right, column: token.column };
    }
  }

  const expression = parse(0);
  if (peek().kind !== 'end') throw unexpected(peek(), 'an operator, a known unit or “=”');
  return { expression, unit, remarks };
}

/** The operator at this token; names, functions and brackets side by side are multiplied. */
function infixOperator(token: Token): BinaryOperator | null {
  if (token.kind === 'operator') return token.text as BinaryOperator;
  return token.kind === 'name' || token.kind === 'function' || token.kind === 'open' ? '*' : null;
}

function numberOf(text: string): Expression {
  return text.startsWith('-')
    ? { kind: 'negate', operand: { kind: 'number', text: text.slice(1) } }
    : { kind: 'number', text };
}

function unexpected(token: Token, expected: string): InputError {
  return new InputError({
    code: 'unreadable',
    where: `column ${token.column}`,
    expected,
    received: token.kind === 'end' ? 'the end of this side' : `“${token.text}”`,
  });
}
