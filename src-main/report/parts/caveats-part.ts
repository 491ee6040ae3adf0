import type { Caveat } from '../../contract/primitives.ts';
import { html, type HtmlValue } from '../html.ts';

/** Doubts that came with a result, each once; nothing when there are none. */
export function caveatsPart(caveats: readonly Caveat[]): HtmlValue {
  const details = new Set(caveats.map(({ detail }) => detail));
  if (details.size === 0) return null;
  return html`<ul class="caveats">
    ${[...details].map((detail) => html`<li>${detail}</li>`)}
  </ul>`;
}
