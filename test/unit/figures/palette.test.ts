import { describe, expect, it } from 'vitest';
import { darkPalette, lightPalette, printPalette } from '../../../src-main/figures/palette.ts';

/** Relative luminance and contrast ratio after WCAG 2.1, sections "relative luminance" and "contrast ratio". */
function luminance(hex: string): number {
  const channels = [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16) / 255);
  const [red = 0, green = 0, blue = 0] = channels.map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}
function contrast(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

it('measures contrast as WCAG defines it', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  // The lightest grey that passes on white, a much-quoted pair: common practice.
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
});

describe.each(Object.entries({ lightPalette, darkPalette, printPalette }))('%s', (_name, palette) => {
  it('keeps texts at 4.5:1 or more, on paper and on every band', () => {
    for (const ground of [palette.paper, ...palette.bands]) {
      for (const text of [palette.ink, palette.ink2]) expect(contrast(text, ground)).toBeGreaterThanOrEqual(4.5);
    }
    expect(contrast(palette.stated, palette.paper)).toBeGreaterThanOrEqual(4.5);
  });

  it('keeps marks at 3:1 or more', () => {
    for (const mark of [palette.ink3, palette.accent, ...palette.series]) {
      expect(contrast(mark, palette.paper)).toBeGreaterThanOrEqual(3);
    }
    for (const ground of palette.bands) {
      for (const mark of [palette.accent, palette.ink, palette.stated, palette.ink3]) {
        expect(contrast(mark, ground)).toBeGreaterThanOrEqual(3);
      }
    }
  });
});
