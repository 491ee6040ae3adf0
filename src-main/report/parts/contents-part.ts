import type { Report } from '../../contract/project.ts';
import { withUnit } from '../../quantities/notation.ts';
import { html, nothing, table, type Html } from '../html.ts';
import { isDraft } from '../signing.ts';
import { dayText } from '../words.ts';

/** The findings of a report on several claims, at a glance. */
export function contentsPart({ title, claims, writtenAt }: Report): Html {
  return html`<section class="page" aria-labelledby="title">
    <p class="kicker">Findings on stated numbers · ${dayText(writtenAt)}</p>
    <h1 id="title">${title}</h1>
    ${
      claims.length === 0
        ? nothing('The project has no claims, or none was chosen for this report.')
        : table(
            'The claims and what was found',
            [
              { heading: 'Claim' },
              { heading: 'The words' },
              { heading: 'Number', isNumber: true },
              { heading: 'Conclusion' },
              { heading: 'Signed' },
            ],
            claims.map((one) => {
              const { id, statement } = one.claim;
              return [
                html`<a href="#claim-${id}">${id}</a>`,
                `“${statement.words}”`,
                withUnit(
                  statement.bound === 'equals' ? statement.value : `${statement.bound} ${statement.value}`,
                  statement.unit,
                ),
                one.conclusion ?? 'none yet',
                isDraft(one) ? 'draft' : 'yes',
              ];
            }),
            'contents',
          )
    }
  </section>`;
}
