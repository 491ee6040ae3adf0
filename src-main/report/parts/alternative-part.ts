import type { AssumptionOutcome } from '../../contract/result.ts';
import { formatInterval, formatNumber } from '../../quantities/notation.ts';
import { html, type HtmlValue } from '../html.ts';

/** The number under a changed assumption, with its interval. */
export function alternativePart(alternative: AssumptionOutcome['alternative']): HtmlValue {
  if (alternative === null) return '–';
  const { value, interval } = alternative;
  const range = interval ? html` <span class="quiet range">${formatInterval(interval)}</span>` : null;
  return html`${formatNumber(value)}${range}`;
}
