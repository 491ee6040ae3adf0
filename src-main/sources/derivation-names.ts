import type { Token } from './derivation-tokens.ts';

/** Cuts a line at its equals signs; every side ends in an `end` token. */
export function splitAtEquals(tokens: readonly Token[]): Token[][] {
  const sides: Token[][] = [[]];
  for (const token of tokens) {
    if (token.kind === 'equals') {
      sides.at(-1)?.push({ kind: 'end', text: '', column: token.column });
      sides.push([]);
    } else {
      sides.at(-1)?.push(token);
    }
  }
  return sides;
}

/**
 * The name that a line gives a value: a name without a value yet that stands alone before the first "=". A name with a
 * power ("r² = 0.37") is a name of its own, unless its base has a value: then it is an expression.
 */
export function nameGivenValue(
  sides: readonly (readonly Token[])[],
  isKnown: (name: string) => boolean,
): string | null {
  const [first, second] = sides;
  if (!first || !second) return null;
  const [name, ...marks] = first.slice(0, -1);
  if (name?.kind !== 'name' || isKnown(name.text)) return null;
  if (marks.length === 0) return name.text;
  return isWholePower(marks) ? nameWithPower(name, marks) : null;
}

/** Draws "r²" together into one name where it has been given a value as such. */
export function joinNamedPowers(tokens: readonly Token[], isKnown: (name: string) => boolean): Token[] {
  const joined: Token[] = [];
  for (let place = 0; place < tokens.length; place++) {
    const token = tokens[place];
    if (!token) continue;
    const next = tokens[place + 1];
    const marks = tokens.slice(place + 1, next?.kind === 'operator' ? place + 3 : place + 2);
    const name = token.kind === 'name' && isWholePower(marks) ? nameWithPower(token, marks) : null;
    if (name !== null && !isKnown(token.text) && isKnown(name)) {
      joined.push({ ...token, text: name });
      place += marks.length;
    } else {
      joined.push(token);
    }
  }
  return joined;
}

/** "²", or "^ 2". */
function isWholePower(marks: readonly Token[]): boolean {
  const [first, second, ...more] = marks;
  if (more.length > 0) return false;
  if (first?.kind === 'power') return second === undefined;
  return first?.kind === 'operator' && first.text === '^' && second?.kind === 'number' && /^\d+$/.test(second.text);
}

function nameWithPower(name: Token, marks: readonly Token[]): string {
  return `${name.text}^${marks.at(-1)?.text ?? ''}`;
}
