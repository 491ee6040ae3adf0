import type { Caveat } from '../../contract/primitives.ts';
import { html, type HtmlValue } from '../html.ts';

/** Doubts that came with a result; nothing when there are none. */
export function caveatsPart(caveats: readonly Caveat[]): HtmlValue {
  if (caveats.length === 0) return null;
  return html`<ul class="caveats">
    ${caveats.map(({ detail }) => html`<li>${detail}</li>`)}
  </ul>`;
}
