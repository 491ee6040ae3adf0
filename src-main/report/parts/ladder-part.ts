import type { ReportClaim } from '../../contract/project.ts';
import { formatInterval, formatNumber } from '../../quantities/notation.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { capitalised } from '../words.ts';
import { caveatsPart } from './caveats-part.ts';

/** The assumptions applied one after the other. */
export function ladderPart({ ladder, ledger }: ReportClaim): Html {
  return html`<h2>Ladder</h2>
    ${content(ladder, ledger)}`;
}

function content(ladder: ReportClaim['ladder'], ledger: ReportClaim['ledger']): HtmlValue {
  if (!ladder) return nothing('No ladder has been computed: it needs a recomputation and tested assumptions.');
  const { start, rungs, notApplied, random, unit } = ladder;
  const title = (id: string) => ledger.find(({ outcome }) => outcome.id === id)?.title ?? id;
  return [
    table(
      `Each step applies one more change to the step above; ${unit}. The order decides the single steps, not the end.`,
      [
        { heading: 'Step' },
        { heading: 'Number', isNumber: true },
        { heading: '5–95 %', isNumber: true },
        { heading: 'Change', isNumber: true },
        { heading: 'Quantity' },
      ],
      [
        [
          'As recomputed',
          formatNumber(start.value),
          formatInterval(start.interval90),
          '–',
          quantityNames[start.quantity].label,
        ],
        ...rungs.map((rung) => [
          rung.label,
          formatNumber(rung.value),
          formatInterval(rung.interval90),
          formatNumber(rung.step, { withSign: true }),
          quantityNames[rung.quantity].label,
        ]),
      ],
    ),
    rungs.length === 0 ? nothing('No assumption could become a step.') : null,
    notApplied.length === 0
      ? null
      : html`<p>Not applied:</p>
          <ul>
            ${notApplied.map(({ assumptionId, reason }) => html`<li>${capitalised(title(assumptionId))}: ${reason}</li>`)}
          </ul>`,
    html`<p class="quiet">Random numbers: ${random.generator}, seed ${random.seed}, ${random.nDraws} draws.</p>`,
    caveatsPart(ladder.caveats),
  ];
}
