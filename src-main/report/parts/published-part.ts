import type { PublishedValue } from '../../contract/finding.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { formatInterval, formatNumber } from '../../quantities/notation.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { html, joined, nothing, table, type Html, type HtmlValue } from '../html.ts';

const provenanceWords = {
  seen: 'seen in the publication',
  'second-hand': 'second-hand, from a text that cites it',
  memory: 'from memory; look it up before it decides anything',
} as const;

/** Published ranges, those of the number's own quantity apart from all others. */
export function publishedPart({ claim, recomputation, published }: ReportClaim): Html {
  const own = recomputation?.quantity ?? claim.statement.quantity;
  const { presentedAs } = claim.statement;
  const same = published.filter(({ quantity }) => quantity === own);
  const presented = published.filter(({ quantity }) => quantity !== own && quantity === presentedAs);
  const rest = published.filter(({ quantity }) => quantity !== own && quantity !== presentedAs);
  const ownName = quantityNames[own].label;
  return html`<h2>Published ranges</h2>
    ${same.length > 0 ? rangeTable(`Of the same quantity, ${ownName}: like for like`, same) : nothing(`No published range of the number’s own quantity (${ownName}) is quoted.`)}
    ${presentedAs === null || presentedAs === own || presented.length === 0 ? null : rangeTable(`Of the quantity that the number is presented as, ${quantityNames[presentedAs].label}`, presented)}
    ${rest.length === 0 ? null : rangeTable('Of other quantities, for orientation only: the number is not one of these', rest)}`;
}

function rangeTable(caption: string, values: readonly PublishedValue[]): Html {
  return table(
    caption,
    [
      { heading: 'Value' },
      { heading: 'Best', isNumber: true },
      { heading: 'Ranges' },
      { heading: 'Edition and place' },
    ],
    values.map((value): HtmlValue[] => [
      html`${value.label}
        <div class="quiet">${value.unit}</div>`,
      value.best === null ? '–' : formatNumber(value.best),
      joined(
        value.ranges.map(
          ({ interval, words }) => html`${formatInterval(interval)} <span class="quiet">${words}</span>`,
        ),
        html`<br />`,
      ),
      html`${value.edition}
        <div class="quiet">${value.source}; ${provenanceWords[value.provenance]}</div>
        ${value.remark === null ? null : html`<div class="quiet">${value.remark}</div>`}`,
    ]),
    'published',
  );
}
