import { roundsToStated, statedValue } from '../quantities/stated-number.ts';
import { InputError } from '../errors.ts';

export interface StatedRSquared {
  /** The digits as printed. */
  text: string;
  value: number;
  /** Whether a computed measure rounds to the printed digits. */
  agreesWith: (measure: number | null) => boolean;
}

const printed =
  /^(?:R(?:²|2|\^2|-squared)?\s*(?:=|≈|:|of|is)?\s*)?([+\-−]?(?:\d+(?:[.,]\d*)?|[.,]\d+))\s*(%|per ?cent)?$/i;

/**
 * A goodness of fit as a source prints it: "0.88", "88 %", "R² = 0.88".
 *
 * @throws InputError `not-a-number`
 */
export function statedRSquared(text: string): StatedRSquared {
  const [, digits, percent] = printed.exec(text.trim()) ?? [];
  if (digits === undefined) {
    throw new InputError({
      code: 'not-a-number',
      where: 'stated R²',
      expected: 'a number as printed, such as 0.88 or 88 %',
      received: `“${text}”`,
      hint: 'Correct it in the statement.',
    });
  }
  const scale = percent === undefined ? 1 : 100;
  return {
    text: text.trim(),
    value: statedValue(digits) / scale,
    agreesWith: (measure) => measure !== null && roundsToStated(digits, measure * scale),
  };
}
