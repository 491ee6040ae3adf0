import type { ReportClaim } from '../../contract/project.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { statementQuestions } from '../../quantities/statement-questions.ts';
import { formatInterval } from '../../quantities/notation.ts';
import { facts, html, nothing, table, type Html } from '../html.ts';
import { unitText } from '../words.ts';

/** What exactly is stated, and what a careful colleague would ask about it. */
export function statementPart({ claim, source, agreement }: ReportClaim): Html {
  const { statement, answers } = claim;
  const questions = statementQuestions(statement, answers);
  const rounding = agreement
    ? ` The numbers that round to it: ${formatInterval({ ...agreement.statedInterval }, '', printedDecimals(statement.value) + 1)}.`
    : '';
  return html`<h2>Statement</h2>
    ${facts([
      [
        'Source',
        source
          ? [source.title, source.details === '' ? null : html`<br /><span class="quiet">${source.details}</span>`]
          : 'none named',
      ],
      ['Place', statement.locator === '' ? 'not given' : statement.locator],
      ['As printed', `${statement.bound} ${statement.value}, ${unitText(statement.unit)}.${rounding}`],
      ['Quantity', `${quantityNames[statement.quantity].label}. ${quantityNames[statement.quantity].definition}`],
      ['Definition', statement.definition === '' ? 'none stated' : statement.definition],
      ['Presented as', statement.presentedAs === null ? 'not said' : quantityNames[statement.presentedAs].label],
      ['R² stated', statement.statedRSquared ?? 'none'],
    ])}
    ${
      questions.length === 0
        ? nothing('No questions apply to this statement.')
        : table(
            'Questions about the statement',
            [{ heading: 'Question' }, { heading: 'Answer of the reviewer' }],
            questions.map(({ question, why, answer }) => [
              html`${question}
                <div class="quiet">${why}</div>`,
              answer ?? html`<em>not answered</em>`,
            ]),
            'halves',
          )
    }`;
}

function printedDecimals(value: string): number {
  return /[.,](\d*)/.exec(value)?.[1]?.length ?? 0;
}
