export type SvgAttributes = Readonly<Record<string, string | number>>;

/** A drawing as plain data: the screen renders it, the report writes it out, the exporter paints it. */
export type SvgNode =
  | { readonly tag: string; readonly attributes: SvgAttributes; readonly children: readonly SvgNode[] }
  | { readonly tag: 'text' | 'title' | 'tspan' | 'style'; readonly attributes: SvgAttributes; readonly text: string };

/** Greek comes from Literata: the first family has none. */
export const figureFont =
  "'Atkinson Hyperlegible Next Variable', 'Atkinson Hyperlegible Next', 'Literata Variable', 'Literata', sans-serif";

export function shape(tag: 'line' | 'rect' | 'circle' | 'path', attributes: SvgAttributes): SvgNode {
  return { tag, attributes, children: [] };
}

/** Text with its baseline at y; figures of equal width, so that columns of numbers line up. */
export function text(content: string, x: number, y: number, attributes: SvgAttributes = {}): SvgNode {
  return { tag: 'text', attributes: { x, y, 'font-variant': 'tabular-nums', ...attributes }, text: content };
}
