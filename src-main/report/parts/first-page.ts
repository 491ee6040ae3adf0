import type { Report, ReportClaim } from '../../contract/project.ts';
import { withUnit } from '../../quantities/notation.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { facts, html, joined, nothing, paragraphs, type Html, type HtmlValue } from '../html.ts';
import { currentSignatures, isDraft } from '../signing.ts';
import { capitalised, dayText } from '../words.ts';
import { decidingPart } from './deciding-part.ts';
import { figurePart } from './figure-part.ts';

/** What a reader needs who reads one page: the words, the conclusion, who signed it, the stem, what decides it. */
export function firstPage(claim: ReportClaim, report: Report): Html {
  const { statement, id } = claim.claim;
  const place = `Finding on a stated number · ${report.title} · claim ${id}`;
  return html`<header>
      ${isDraft(claim) ? html`<p class="draft">Draft. This finding is not signed; it may change.</p>` : null}
      <p class="kicker">${place}</p>
      <h1 id="claim-${id}">“${statement.words}”</h1>
    </header>
    ${facts([
      ['Stated in', statedIn(claim)],
      ['Number', statedNumber(claim)],
      ['Conclusion', conclusionText(claim)],
      ['Signed', signedText(claim)],
    ])}
    ${findingText(claim)}
    ${claim.stem ? figurePart(claim.stem) : nothing('There is no figure: nothing has been recomputed.')}
    ${decidingPart(claim)}
    <section class="together">
      <h2>Read this with care</h2>
      <p class="cautions">${joined(report.cautions, ' ')}</p>
    </section>`;
}

function statedIn({ source, claim }: ReportClaim): string {
  const { locator } = claim.statement;
  if (!source) return locator === '' ? 'no source named' : locator;
  return [`${source.title} (${source.kind})`, locator].filter((part) => part !== '').join(', ');
}

function statedNumber({ claim }: ReportClaim): string {
  const { bound, value, unit, quantity, presentedAs } = claim.statement;
  const number = withUnit(bound === 'equals' ? value : `${bound} ${value}`, unit);
  const presented = presentedAs && presentedAs !== quantity ? `, presented as ${quantityNames[presentedAs].label}` : '';
  return `${number}; ${quantityNames[quantity].label}${presented}`;
}

function conclusionText({ conclusion, finding }: ReportClaim): HtmlValue {
  if (conclusion === null) return 'none yet';
  const conditions = finding?.conditions.trim() ?? '';
  return [html`<strong>${capitalised(conclusion)}</strong>`, conditions === '' ? null : html`: ${conditions}`];
}

function signedText(claim: ReportClaim): HtmlValue {
  const signatures = currentSignatures(claim);
  if (signatures.length === 0) return 'not signed';
  return signatures.map(({ signature, check }) => {
    const who = [signature.signer.name, signature.signer.role].filter((part) => part !== '').join(', ');
    const validity = check.isValid
      ? null
      : html`; <strong class="bad">not valid: ${check.reason ?? 'reason unknown'}</strong>`;
    return html`<div>
      ${who}: ${signature.meaning}, ${dayText(signature.signedAt)}${validity}<br />
      <span class="quiet">key</span> <code class="key">${check.fingerprint}</code>
    </div>`;
  });
}

function findingText({ findingText: text, agreement }: ReportClaim): HtmlValue {
  if (text.trim() !== '') return paragraphs(text, 'say');
  return [
    nothing('No finding has been written on this claim.'),
    agreement ? html`<p class="say">${agreement.sentence}</p>` : null,
  ];
}
