import { smallScale, textRuns } from './text-runs.ts';

/** Advance widths of U+0020–U+007E in Atkinson Hyperlegible Next, weight 400, in hundredths of the font size. */
const widths = (
  '28 29 30 65 59 92 73 16 30 30 48 61 21 36 21 39 65 41 55 58 61 59 60 51 61 59 21 21 55 63 55 48 78 63 61 64 67 57 55 ' +
  '69 69 39 51 63 54 82 69 71 59 72 61 59 56 69 59 86 62 57 61 32 39 34 55 37 24 52 57 48 56 54 31 56 55 25 24 49 26 84 ' +
  '55 55 57 57 35 47 33 54 46 68 48 45 46 34 24 34 55'
)
  .split(' ')
  .map(Number);
const digitWidth = 0.65;
const otherWidth = 0.7;
const thinSpaceWidth = 0.2;
const thinSpaces = '\u2009\u202f';
/** Weight 650 is at most this much wider. */
const boldFactor = 1.06;

/** Width of a line of text in the figures' font, close enough to keep labels apart where nothing can be measured. */
export function textWidth(content: string, fontSize: number, isBold = false): number {
  let total = 0;
  for (const { content: run, level } of textRuns(content)) {
    const scale = level === 'base' ? 1 : smallScale;
    for (const character of run) total += characterWidth(character) * scale;
  }
  return total * fontSize * (isBold ? boldFactor : 1);
}

function characterWidth(character: string): number {
  if (character >= '0' && character <= '9') return digitWidth;
  if (thinSpaces.includes(character)) return thinSpaceWidth;
  const hundredths = widths[character.charCodeAt(0) - 32];
  return hundredths === undefined ? otherWidth : hundredths / 100;
}

/** Breaks a label into lines no wider than `width`; a single longer word stays whole. */
export function wrapText(content: string, width: number, fontSize: number, isBold = false): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of content.split(/\s+/).filter((part) => part !== '')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && textWidth(longer, fontSize, isBold) > width) {
      lines.push(line);
      line = word;
    } else line = longer;
  }
  return line === '' ? lines : [...lines, line];
}
