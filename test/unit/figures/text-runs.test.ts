import { describe, expect, it } from 'vitest';
import { textRuns } from '../../../src-main/figures/text-runs.ts';
import { textWidth, wrapText } from '../../../src-main/figures/text-width.ts';
import { tspans } from '../../../src-main/figures/tspans.ts';

const base = (content: string) => ({ content, level: 'base' });

describe('textRuns', () => {
  it('lowers subscripts and raises the superscripts that the fonts lack', () => {
    expect(textRuns('CO₂ rises')).toEqual([base('CO'), { content: '2', level: 'sub' }, base(' rises')]);
    expect(textRuns('3.1 × 10⁻¹⁵ K')).toEqual([base('3.1 × 10'), { content: '−15', level: 'super' }, base(' K')]);
  });

  it('leaves alone what the fonts have', () => {
    expect(textRuns('3.7 W/m²')).toEqual([base('3.7 W/m²')]);
    expect(textRuns('')).toEqual([]);
  });
});

describe('tspans', () => {
  it('moves a small run off the baseline and the rest back onto it', () => {
    expect(tspans('CO₂ up')).toEqual([
      'CO',
      { tag: 'tspan', attributes: { dy: '0.25em', 'font-size': '72%' }, text: '2' },
      { tag: 'tspan', attributes: { dy: '-0.18em' }, text: ' up' },
    ]);
  });
});

describe('wrapText', () => {
  it('breaks between words, keeps a longer word whole and drops nothing', () => {
    const label = 'All forcings, not carbon dioxide alone, in Überlandwasserkraftwerksverordnungsgebieten';
    const lines = wrapText(label, 120, 12.5);
    expect(lines.join(' ')).toBe(label);
    expect(lines.slice(0, -1).every((line) => textWidth(line, 12.5) <= 120)).toBe(true);
    expect(wrapText('   ', 120, 12.5)).toEqual([]);
  });
});
