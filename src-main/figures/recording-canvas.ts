import type { TextStyle } from './canvas-text.ts';
import { shape, text, type SvgNode } from './svg-node.ts';
import { textWidth } from './text-width.ts';

const start = {
  fillStyle: '#000000',
  strokeStyle: '#000000',
  lineWidth: 1,
  lineDash: [] as readonly number[],
  globalAlpha: 1,
  font: '400 12px sans-serif',
  textAlign: 'start',
  textBaseline: 'alphabetic',
  offsetX: 0,
  offsetY: 0,
};
type State = typeof start;

/** How far the baseline lies below what a text is placed by, as shares of the font size. */
const baselineShift: Readonly<Record<string, number>> = { top: 0.78, hanging: 0.78, middle: 0.35, bottom: -0.22 };

/**
 * The part of a 2D canvas that chart.js needs for the house style, recording shapes and texts as a drawing instead of
 * painting them, so that a file shows what the screen shows. Clipping is not recorded: the axes span all data.
 */
export class RecordingCanvas {
  readonly nodes: SvgNode[] = [];
  readonly canvas: { width: number; height: number; getContext: () => RecordingCanvas };
  lineCap = 'butt';
  lineJoin = 'miter';
  lineDashOffset = 0;
  #state: State = { ...start };
  #saved: State[] = [];
  #path = '';
  /** The only part of the path so far, when it is a full circle. */
  #circle: { cx: number; cy: number; r: number } | null = null;

  constructor(width: number, height: number) {
    this.canvas = { width, height, getContext: () => this };
  }

  get fillStyle(): string {
    return this.#state.fillStyle;
  }
  set fillStyle(value: string) {
    this.#state.fillStyle = value;
  }
  get strokeStyle(): string {
    return this.#state.strokeStyle;
  }
  set strokeStyle(value: string) {
    this.#state.strokeStyle = value;
  }
  get lineWidth(): number {
    return this.#state.lineWidth;
  }
  set lineWidth(value: number) {
    this.#state.lineWidth = value;
  }
  get globalAlpha(): number {
    return this.#state.globalAlpha;
  }
  set globalAlpha(value: number) {
    this.#state.globalAlpha = value;
  }
  get font(): string {
    return this.#state.font;
  }
  set font(value: string) {
    this.#state.font = value;
  }
  get textAlign(): string {
    return this.#state.textAlign;
  }
  set textAlign(value: string) {
    this.#state.textAlign = value;
  }
  get textBaseline(): string {
    return this.#state.textBaseline;
  }
  set textBaseline(value: string) {
    this.#state.textBaseline = value;
  }

  save(): void {
    this.#saved.push({ ...this.#state });
  }
  restore(): void {
    this.#state = this.#saved.pop() ?? { ...start };
  }
  translate(x: number, y: number): void {
    this.#state.offsetX += x;
    this.#state.offsetY += y;
  }
  resetTransform(): void {
    this.#state.offsetX = 0;
    this.#state.offsetY = 0;
  }
  setTransform(a: number, b: number, c: number, d: number, e: number, f: number): void {
    if (a !== 1 || b !== 0 || c !== 0 || d !== 1) throw new Error('A recorded drawing is neither scaled nor turned.');
    this.#state.offsetX = e;
    this.#state.offsetY = f;
  }
  rotate(angle: number): void {
    if (angle !== 0) throw new Error('A recorded drawing is neither scaled nor turned.');
  }
  clearRect(): void {
    this.nodes.length = 0;
  }
  clip(): void {
    // See above.
  }
  setLineDash(dash: readonly number[]): void {
    this.#state.lineDash = [...dash];
  }
  getLineDash(): readonly number[] {
    return this.#state.lineDash;
  }

  beginPath(): void {
    this.#path = '';
    this.#circle = null;
  }
  closePath(): void {
    if (this.#path !== '') this.#path += 'Z';
  }
  moveTo(x: number, y: number): void {
    this.#add(`M${this.#point(x, y)}`);
  }
  lineTo(x: number, y: number): void {
    this.#add(`${this.#path === '' ? 'M' : 'L'}${this.#point(x, y)}`);
  }
  bezierCurveTo(x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    this.#add(`C${this.#point(x1, y1)} ${this.#point(x2, y2)} ${this.#point(x, y)}`);
  }
  rect(x: number, y: number, width: number, height: number): void {
    this.#add(`M${this.#point(x, y)}h${rounded(width)}v${rounded(height)}h${rounded(-width)}Z`);
  }
  arc(x: number, y: number, radius: number, from: number, to: number): void {
    const isOnly = this.#path === '';
    const at = (angle: number) => this.#point(x + radius * Math.cos(angle), y + radius * Math.sin(angle));
    const middle = (from + to) / 2;
    const r = rounded(radius);
    this.#add(`${isOnly ? 'M' : 'L'}${at(from)}A${r} ${r} 0 0 1 ${at(middle)}A${r} ${r} 0 0 1 ${at(to)}`);
    if (isOnly && Math.abs(to - from) >= 2 * Math.PI - 1e-9) {
      const [cx, cy] = [rounded(x + this.#state.offsetX), rounded(y + this.#state.offsetY)];
      this.#circle = { cx, cy, r };
    }
  }
  fillRect(x: number, y: number, width: number, height: number): void {
    this.beginPath();
    this.rect(x, y, width, height);
    this.fill();
  }

  fill(): void {
    this.#draw({ fill: this.#state.fillStyle, ...this.#opacity('fill-opacity') });
  }
  stroke(): void {
    const { strokeStyle, lineWidth, lineDash } = this.#state;
    this.#draw({
      fill: 'none',
      stroke: strokeStyle,
      'stroke-width': rounded(lineWidth),
      ...(lineDash.length > 0 ? { 'stroke-dasharray': lineDash.join(' ') } : {}),
      ...this.#opacity('stroke-opacity'),
    });
  }

  measureText(content: string): { width: number; actualBoundingBoxAscent: number; actualBoundingBoxDescent: number } {
    const { fontSize } = fontOf(this.#state.font);
    const [actualBoundingBoxAscent, actualBoundingBoxDescent] = [fontSize * 0.75, fontSize * 0.22];
    return { width: textWidth(content, fontSize), actualBoundingBoxAscent, actualBoundingBoxDescent };
  }
  fillText(content: string, x: number, y: number): void {
    const { fontSize, weight } = fontOf(this.#state.font);
    const align = ({ center: 'middle', right: 'end', end: 'end' } as const)[this.#state.textAlign] ?? 'start';
    const baseline = y + (baselineShift[this.#state.textBaseline] ?? 0) * fontSize;
    this.recordText(content, x, baseline, { fontSize, weight, align });
  }
  recordText(content: string, x: number, y: number, { fontSize, weight = 400, align = 'start' }: TextStyle): void {
    const { fillStyle, offsetX, offsetY } = this.#state;
    this.nodes.push(
      text(content, rounded(x + offsetX), rounded(y + offsetY), {
        fill: fillStyle,
        'font-size': fontSize,
        ...(weight === 400 ? {} : { 'font-weight': weight }),
        ...(align === 'start' ? {} : { 'text-anchor': align }),
      }),
    );
  }

  #add(command: string): void {
    this.#circle = null;
    this.#path += command;
  }
  #point(x: number, y: number): string {
    return `${rounded(x + this.#state.offsetX)} ${rounded(y + this.#state.offsetY)}`;
  }
  #opacity(name: string): Record<string, number> {
    return this.#state.globalAlpha === 1 ? {} : { [name]: this.#state.globalAlpha };
  }
  #draw(attributes: Record<string, string | number>): void {
    if (this.#path === '' || attributes['stroke-width'] === 0) return;
    this.nodes.push(
      this.#circle
        ? shape('circle', { ...this.#circle, ...attributes })
        : shape('path', { d: this.#path, ...attributes }),
    );
  }
}

function fontOf(font: string): { fontSize: number; weight: number } {
  const [, weight, size] = /(?:(\d{3}) )?(\d+(?:\.\d+)?)px/.exec(font) ?? [];
  return { fontSize: Number(size ?? 12), weight: Number(weight ?? 400) };
}

function rounded(value: number): number {
  return Math.round(value * 100) / 100;
}
