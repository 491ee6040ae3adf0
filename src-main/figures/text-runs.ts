export interface TextRun {
  readonly content: string;
  readonly level: 'base' | 'sub' | 'super';
}

/** Size of a lowered or raised run, and how far it moves down, as shares of the font size. */
export const smallScale = 0.72;
export const levelShift: Readonly<Record<TextRun['level'], number>> = { base: 0, sub: 0.18, super: -0.34 };

/** Runs of subscripts; runs of superscripts with at least one that the bundled fonts lack (they do have ¹ ² ³). */
const smallRun = /([₀-₉]+|[¹²³]*[⁰⁴-⁹⁻][⁰¹²³⁴-⁹⁻]*)/u;
const subscripts = '₀₁₂₃₄₅₆₇₈₉';
const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Splits text where a subscript or a superscript begins or ends, so that "CO₂" and "10⁻⁵" are set from the text's
 * own figures: the bundled fonts lack those characters, and what a machine puts in their place varies.
 */
export function textRuns(content: string): TextRun[] {
  return content
    .split(smallRun)
    .map((part, index): TextRun => {
      if (index % 2 === 0) return { content: part, level: 'base' };
      const level = subscripts.includes(part.charAt(0)) ? 'sub' : 'super';
      return { content: [...part].map(plainCharacter).join(''), level };
    })
    .filter((run) => run.content !== '');
}

function plainCharacter(character: string): string {
  if (character === '⁻') return '−';
  return String(Math.max(subscripts.indexOf(character), superscripts.indexOf(character)));
}
