import { createCanvas, loadImage } from '@napi-rs/canvas';
import { describe, expect, it } from 'vitest';
import { exportFigure } from '../../../src-main/report/figure-export.ts';
import { inventedFit, inventedStem, inventedWindows } from './invented-report.ts';

const figures = { inventedStem, inventedFit, inventedWindows };

/** Share of pixels of a picture that are close to a colour. */
async function shareOf(png: Buffer, [red, green, blue]: readonly [number, number, number]): Promise<number> {
  const image = await loadImage(png);
  const context = createCanvas(image.width, image.height).getContext('2d');
  context.drawImage(image, 0, 0);
  const { data } = context.getImageData(0, 0, image.width, image.height);
  let found = 0;
  for (let at = 0; at < data.length; at += 4) {
    const distance = Math.max(
      Math.abs((data[at] ?? 0) - red),
      Math.abs((data[at + 1] ?? 0) - green),
      Math.abs((data[at + 2] ?? 0) - blue),
    );
    if (distance < 12) found += 1;
  }
  return found / (image.width * image.height);
}

describe.each(Object.entries(figures))('exportFigure of %s', (_name, figure) => {
  it('writes an SVG that stands alone: caption, digests, fonts inside, nothing to fetch', async () => {
    const { fileName, mediaType, bytes } = await exportFigure(figure, 'svg');
    const svg = bytes.toString('utf8');
    expect(fileName).toBe(`${figure.name}.svg`);
    expect(mediaType).toBe('image/svg+xml');
    expect(svg.startsWith('<?xml version="1.0" encoding="UTF-8"?>\n<svg ')).toBe(true);
    expect(svg).toContain('font-family:&quot;Atkinson Hyperlegible Next&quot;');
    expect(svg).toContain('From data aaaaaa…aaaa, bbbbbb…bbbb (SHA-256).');
    expect(svg.match(/https?:\/\/[^"&]*/g)).toEqual(svg.match(/http:\/\/www\.w3\.org\/2000\/svg/g));
  });

  it('paints a PNG with marks, text and white paper', async () => {
    const { fileName, mediaType, bytes } = await exportFigure(figure, 'png');
    expect(fileName).toBe(`${figure.name}.png`);
    expect(mediaType).toBe('image/png');
    expect((await loadImage(bytes)).width).toBe(1720);
    expect(await shareOf(bytes, [255, 255, 255])).toBeGreaterThan(0.5);
    // The stated number's colour, and that of the caption: marks and text are there.
    expect(await shareOf(bytes, [0xa2, 0x3b, 0x12])).toBeGreaterThan(0.0005);
    expect(await shareOf(bytes, [0x4d, 0x58, 0x62])).toBeGreaterThan(0.0005);
  });

  it.each(['svg', 'png', 'csv'] as const)('gives the same bytes for the same figure: %s', async (format) => {
    const [one, other] = [await exportFigure(figure, format), await exportFigure(structuredClone(figure), format)];
    expect(one.bytes.equals(other.bytes)).toBe(true);
  });
});

describe('exportFigure', () => {
  it('writes data unrounded as CSV', async () => {
    const { bytes, mediaType } = await exportFigure(inventedFit, 'csv');
    const lines = bytes.toString('utf8').split('\n');
    expect(mediaType).toBe('text/csv');
    expect(lines[0]).toBe('mark,ln(C/C₀),T − T₀ (K)');
    const [x, y] = [inventedFit.marks[0]?.x[1], inventedFit.marks[0]?.y[1]];
    expect(lines[2]).toBe(`years,${x},${y}`);
  });

  it('keeps labels that look like formulas as labels, and negative numbers as numbers', async () => {
    const [mark] = inventedFit.marks;
    if (!mark) throw new Error('the sample has marks');
    const odd = {
      ...inventedFit,
      marks: [
        { ...mark, label: '=1+1', x: [0], y: [-0.5] },
        { ...mark, x: [1], y: [1] },
      ],
    };
    const lines = (await exportFigure(odd, 'csv')).bytes.toString('utf8').split('\n');
    expect(lines[1]).toBe(`"'=1+1",0,-0.5`);
  });

  it('makes a file name of any name', async () => {
    const named = async (name: string) => (await exportFigure({ ...inventedFit, name }, 'csv')).fileName;
    expect(await named('../Östliche Luft/2')).toBe('o-stliche-luft-2.csv');
    expect(await named('…')).toBe('figure.csv');
  });

  it('carries Greek and accented letters in fonts of its own', async () => {
    const plain = await exportFigure({ ...inventedFit, yLabel: 'K' }, 'svg');
    const greek = await exportFigure({ ...inventedFit, yLabel: 'ΔT, K' }, 'svg');
    expect(plain.bytes.toString()).not.toContain('U+0370-03FF');
    expect(greek.bytes.toString()).toContain('U+0370-03FF');
  });
});
