import { figureFont } from './svg-node.ts';
import { levelShift, smallScale, textRuns } from './text-runs.ts';

/** The part of a 2D canvas that setting text needs; every canvas has it. */
export interface TextCanvas {
  font: string;
  fillText(content: string, x: number, y: number): void;
  measureText(content: string): { readonly width: number };
  /** A canvas that records what is drawn, rather than painting it, takes a line whole. */
  recordText?(content: string, x: number, y: number, style: TextStyle): void;
}

export interface TextStyle {
  readonly fontSize: number;
  readonly weight?: number;
  readonly align?: 'start' | 'middle' | 'end';
}

/** Sets a line of text with its baseline at y, subscripts and superscripts from the font's own figures. */
export function fillTextRuns(canvas: TextCanvas, content: string, x: number, y: number, style: TextStyle): void {
  if (canvas.recordText) {
    canvas.recordText(content, x, y, style);
    return;
  }
  const { fontSize, weight = 400, align = 'start' } = style;
  const fontOf = (scale: number) => `${weight} ${fontSize * scale}px ${figureFont}`;
  const runs = textRuns(content).map((run) => {
    const scale = run.level === 'base' ? 1 : smallScale;
    // The bundled font has the thin space, but not its form that forbids a line break.
    const shown = run.content.replaceAll('\u202f', '\u2009');
    canvas.font = fontOf(scale);
    return { shown, scale, dy: levelShift[run.level] * fontSize, width: canvas.measureText(shown).width };
  });
  const total = runs.reduce((sum, run) => sum + run.width, 0);
  let at = x - { start: 0, middle: total / 2, end: total }[align];
  for (const { shown, scale, dy, width } of runs) {
    canvas.font = fontOf(scale);
    canvas.fillText(shown, at, y + dy);
    at += width;
  }
}
