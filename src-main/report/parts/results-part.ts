import type { ReportClaim } from '../../contract/project.ts';
import { facts, html, nothing, type Html } from '../html.ts';
import { timeText } from '../words.ts';
import { digestPart } from './digest-part.ts';

const methodNames = {
  recomputation: 'Recomputation',
  assumptions: 'Assumptions and ladder',
  'claim-sweep': 'Other windows',
  estimators: 'Other estimators',
  derivation: 'Arithmetic',
} as const;

/** Every stored computation that the finding stands on: run the request again and the answer has this digest. */
export function resultsPart({ results }: ReportClaim): Html {
  if (results.length === 0)
    return html`<h2>Results</h2>
      ${nothing('Nothing has been computed for this claim.')}`;
  return html`<h2>Results</h2>
    <p>
      A second reviewer who runs the same request on the same engine gets an answer with the same digest, to the last
      digit.
    </p>
    ${results.map(
      (result) =>
        html`<section class="together">
          <h3>${methodNames[result.method]}</h3>
          ${facts([
            ['Computed', `${timeText(result.computedAt)}, as result ${result.id}`],
            [
              'Engine, seed',
              `Footing ${result.engineVersion}; ${result.seed === null ? 'no random numbers' : `seed ${result.seed}`}`,
            ],
            ['Request', digestPart(result.requestDigest)],
            ['Answer', digestPart(result.answerDigest)],
          ])}
        </section>`,
    )}`;
}
