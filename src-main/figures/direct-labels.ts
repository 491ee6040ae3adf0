import { textWidth, wrapText } from './text-width.ts';

export const labelFontSize = 12;
export const labelLineHeight = 15;
/** A piece of the line or the point itself, before its label. */
export const swatchWidth = 18;
const widestLabel = 170;

export interface DirectLabel {
  readonly lines: readonly string[];
  /** Where the mark ends; the label wants to stand there. */
  readonly anchorY: number;
}
export interface PlacedLabel extends DirectLabel {
  /** Middle of the label. */
  readonly y: number;
}

export function labelLines(label: string): string[] {
  return wrapText(label, widestLabel, labelFontSize);
}

/** Width of the column that the labels take at the right of a figure. */
export function labelColumnWidth(labels: readonly (readonly string[])[]): number {
  const widest = Math.max(0, ...labels.flat().map((line) => textWidth(line, labelFontSize)));
  return Math.ceil(widest * 1.03) + swatchWidth + 14;
}

/** Moves labels apart until none touches another, each as near to its mark as the order of the marks allows. */
export function placeLabels(labels: readonly DirectLabel[], top: number, bottom: number): PlacedLabel[] {
  const boxes = labels.map((label) => ({ label, top: 0, height: label.lines.length * labelLineHeight + 3 }));
  const downwards = [...boxes].sort((a, b) => a.label.anchorY - b.label.anchorY);
  let free = top;
  for (const box of downwards) {
    box.top = Math.max(free, box.label.anchorY - box.height / 2);
    free = box.top + box.height;
  }
  // What was pushed out at the bottom moves back up, and pushes its upper neighbours.
  let limit = Math.max(bottom, top + boxes.reduce((sum, { height }) => sum + height, 0));
  for (const box of downwards.toReversed()) {
    box.top = Math.min(box.top, limit - box.height);
    limit = box.top;
  }
  return boxes.map((box) => ({ ...box.label, y: box.top + box.height / 2 }));
}
