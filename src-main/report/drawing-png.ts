import { createCanvas, GlobalFonts } from '@napi-rs/canvas';
import type { SvgNode } from '../figures/svg-node.ts';
import { fontFiles } from './font-files.ts';
import { paintDrawing } from './paint-drawing.ts';

/** Under the names, and in the order, in which the figures' font list asks for them. */
const canvasFonts = [
  { file: fontFiles.sans, family: 'Atkinson Hyperlegible Next Variable' },
  { file: fontFiles.sansExtended, family: 'Atkinson Hyperlegible Next' },
  { file: fontFiles.greek, family: 'Literata Variable' },
];
let areFontsKnown = false;

/** A drawing as PNG, with `scale` dots to a unit, in the bundled fonts: what a machine has installed plays no part. */
export function drawingPng(drawing: SvgNode, scale: number): Promise<Buffer> {
  if (!areFontsKnown) {
    for (const { file, family } of canvasFonts) {
      GlobalFonts.register(Buffer.from(file.slice(file.indexOf(',') + 1), 'base64'), family);
    }
    areFontsKnown = true;
  }
  const canvas = createCanvas(Number(drawing.attributes.width) * scale, Number(drawing.attributes.height) * scale);
  const context = canvas.getContext('2d');
  context.scale(scale, scale);
  paintDrawing(context, drawing);
  return canvas.encode('png');
}
