import { html, joined, type Html } from '../html.ts';

/** A digest, key or signature in full, in groups of eight for the eye; copied, it has no gaps. */
export function digestPart(hex: string): Html {
  const groups = (hex.match(/.{1,8}/gsu) ?? []).map((group) => html`<span>${group}</span>`);
  return html`<code class="digest">${joined(groups, html`<wbr />`)}</code>`;
}
