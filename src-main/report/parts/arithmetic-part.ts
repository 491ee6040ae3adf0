import type { ReportClaim } from '../../contract/project.ts';
import { formatInterval, formatNumber } from '../../quantities/notation.ts';
import { html, nothing, table, type Html } from '../html.ts';

/** The arithmetic that the source shows, line by line. */
export function arithmeticPart({ claim, derivation }: ReportClaim): Html {
  return html`<h2>Arithmetic</h2>
    ${content(claim.derivation.length, derivation)}`;
}

function content(nLines: number, derivation: ReportClaim['derivation']): Html {
  if (nLines === 0) return nothing('The source shows no arithmetic for this number, or none was taken down.');
  if (!derivation) return nothing('Lines of arithmetic were taken down but have not been re-evaluated.');
  const range = (interval: { low: number; high: number } | null) => (interval ? formatInterval(interval) : '–');
  return table(
    'Each line of the source, evaluated again. A line agrees when the range of its result, from the rounding of its inputs, meets the range of the stated digits.',
    [
      { heading: 'Line' },
      { heading: 'Result', isNumber: true },
      { heading: 'Its range', isNumber: true },
      { heading: 'Stated', isNumber: true },
      { heading: 'Rounds from', isNumber: true },
      { heading: 'Agrees' },
    ],
    derivation.lines.map((line) => [
      html`<code>${line.line}</code>${[line.problem, line.likelySlip, line.remark].map((note) =>
          note === null ? null : html`<div class="quiet">${note}</div>`,
        )}`,
      line.value === null ? '–' : formatNumber(line.value, { significantDigits: 5 }),
      range(line.computedInterval),
      line.stated === null ? '–' : `${line.stated}${line.unit === null ? '' : ` ${line.unit}`}`,
      range(line.statedInterval),
      line.agrees === null ? 'cannot be said' : line.agrees ? 'yes' : html`<strong class="bad">no</strong>`,
    ]),
  );
}
