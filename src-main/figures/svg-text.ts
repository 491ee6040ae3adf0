import type { SvgNode } from './svg-node.ts';
import { tspans } from './tspans.ts';

const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Writes text so that no character of it can become markup; characters that XML forbids become U+FFFD. */
export function escapeMarkup(content: string): string {
  return content
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|\p{Surrogate}/gu, '\ufffd')
    .replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

/** Serialises a drawing; attribute values and texts are escaped. */
export function svgText(node: SvgNode): string {
  const attributes = Object.entries(node.attributes).map(
    ([name, value]) => ` ${name}="${escapeMarkup(String(value))}"`,
  );
  const open = `<${node.tag}${attributes.join('')}`;
  if ('text' in node) {
    const spans = node.tag === 'text' ? tspans(node.text) : [node.text];
    const content = spans.map((span) => (typeof span === 'string' ? escapeMarkup(span) : svgText(span)));
    return `${open}>${content.join('')}</${node.tag}>`;
  }
  return node.children.length === 0 ? `${open}/>` : `${open}>${node.children.map(svgText).join('')}</${node.tag}>`;
}
