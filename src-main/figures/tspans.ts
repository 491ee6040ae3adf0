import type { SvgNode } from './svg-node.ts';
import { levelShift, smallScale, textRuns } from './text-runs.ts';

/** A text's content for SVG: plain strings, and small runs moved off the baseline and back. */
export function tspans(content: string): (string | Extract<SvgNode, { text: string }>)[] {
  let shift = 0;
  return textRuns(content).map((run) => {
    const scale = run.level === 'base' ? 1 : smallScale;
    const dy = (levelShift[run.level] - shift) / scale;
    shift = levelShift[run.level];
    if (dy === 0) return run.content;
    const attributes = {
      dy: `${Math.round(dy * 1000) / 1000}em`,
      ...(scale === 1 ? {} : { 'font-size': `${scale * 100}%` }),
    };
    return { tag: 'tspan', attributes, text: run.content };
  });
}
