import papa from 'papaparse';
import type { Figure } from '../contract/figure.ts';
import { InputError } from '../errors.ts';
import { captionedDrawing } from '../figures/captioned-drawing.ts';
import { figureTable } from '../figures/figure-table.ts';
import { printPalette } from '../figures/palette.ts';
import { svgText } from '../figures/svg-text.ts';

export type FigureFormat = 'svg' | 'png' | 'csv';

export interface ExportedFigure {
  readonly fileName: string;
  readonly mediaType: string;
  readonly bytes: Buffer;
}

const mediaTypes: Readonly<Record<FigureFormat, string>> = { svg: 'image/svg+xml', png: 'image/png', csv: 'text/csv' };
const widthPx = 860;
const pngScale = 2;

/**
 * A figure as a file: a picture with its caption and data digests, on white, fonts included; or its data, unrounded.
 * The same figure gives the same bytes.
 *
 * @throws InputError png-unavailable when the drawing library does not load on this machine
 */
export async function exportFigure(figure: Figure, format: FigureFormat): Promise<ExportedFigure> {
  const bytes = { svg: svgFile, png: pngFile, csv: csvFile }[format];
  return { fileName: `${fileStem(figure.name)}.${format}`, mediaType: mediaTypes[format], bytes: await bytes(figure) };
}

async function svgFile(figure: Figure): Promise<Buffer> {
  // Loaded when first needed: the fonts are a third of a megabyte.
  const { figureFontFaces } = await import('./font-faces.ts');
  const drawing = captionedDrawing(figure, printPalette, widthPx);
  const fonts = figureFontFaces(JSON.stringify(figure));
  const styled =
    'text' in drawing
      ? drawing
      : { ...drawing, children: [{ tag: 'style' as const, attributes: {}, text: fonts }, ...drawing.children] };
  return Buffer.from(`<?xml version="1.0" encoding="UTF-8"?>\n${svgText(styled)}\n`, 'utf8');
}

async function pngFile(figure: Figure): Promise<Buffer> {
  const { drawingPng } = await import('./drawing-png.ts').catch((error: unknown) => {
    throw new InputError({
      code: 'png-unavailable',
      where: 'saving a figure as PNG',
      expected: 'the drawing library for this kind of machine',
      received: error instanceof Error ? error.message : String(error),
      hint: 'Save the figure as SVG; it needs no library.',
    });
  });
  return drawingPng(captionedDrawing(figure, printPalette, widthPx), pngScale);
}

function csvFile(figure: Figure): Promise<Buffer> {
  const { columns, rows } = figureTable(figure);
  // A label that begins like a formula must stay a label in a spreadsheet.
  const csv = papa.unparse(
    { fields: [...columns], data: rows.map((row) => [...row]) },
    { escapeFormulae: true, newline: '\n' },
  );
  return Promise.resolve(Buffer.from(`${csv}\n`, 'utf8'));
}

function fileStem(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .toLowerCase();
  return plain === '' ? 'figure' : plain;
}
