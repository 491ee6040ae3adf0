import type { ReportClaim } from '../../contract/project.ts';
import { html, nothing, table, type HtmlValue } from '../html.ts';
import { capitalised, countWord } from '../words.ts';
import { alternativePart } from './alternative-part.ts';

/** As many as a first page has room for. */
const mostShown = 3;

/** The assumptions that move the number by as much as the reviewer called notable, the heaviest first. */
export function decidingPart({ ledger }: ReportClaim): HtmlValue {
  const ofWeight = (weight: 'decisive' | 'notable') =>
    ledger
      .filter(({ outcome }) => outcome.weight === weight)
      .sort((a, b) => Math.abs(b.outcome.effect ?? 0) - Math.abs(a.outcome.effect ?? 0));
  const [decisive, notable] = [ofWeight('decisive'), ofWeight('notable')];
  const weighty = [...decisive, ...notable];
  if (weighty.length === 0) {
    const none = `Of the ${countWord(ledger.length)} assumptions in the ledger none moves the number by a notable amount.`;
    return [html`<h2>What it rests on</h2>`, nothing(ledger.length === 0 ? 'No assumption has been tested.' : none)];
  }
  const shown = weighty.slice(0, mostShown);
  return [
    html`<h2>${heading(decisive.length, notable.length)}</h2>`,
    table(
      null,
      [
        { heading: 'The number needs' },
        { heading: 'Test' },
        { heading: 'Moves it to', isNumber: true },
        { heading: 'Weight' },
        { heading: 'Marked' },
      ],
      shown.map(({ outcome, title, mark }) => [
        title,
        outcome.test,
        alternativePart(outcome.alternative),
        outcome.weight,
        mark?.mark ?? 'untested',
      ]),
    ),
    rest(decisive.length - shown.length, notable.length - Math.max(0, shown.length - decisive.length)),
  ];
}

function heading(nDecisive: number, nNotable: number): string {
  if (nDecisive === 1) return 'The assumption that decides it';
  if (nDecisive > mostShown) return `The ${countWord(mostShown)} assumptions that move it most`;
  if (nDecisive > 1) return `The ${countWord(nDecisive)} assumptions that decide it`;
  return nNotable === 1 ? 'The assumption that moves it' : 'The assumptions that move it';
}

function rest(nDecisive: number, nNotable: number): HtmlValue {
  const parts = [
    ...(nDecisive > 0 ? [`${countWord(nDecisive)} more ${nDecisive === 1 ? 'is' : 'are'} decisive`] : []),
    ...(nNotable > 0 ? [`${countWord(nNotable)} ${nNotable === 1 ? 'is' : 'are'} notable`] : []),
  ];
  if (parts.length === 0) return null;
  return html`<p class="quiet">${capitalised(parts.join(', and '))}; the full ledger follows in the check.</p>`;
}
