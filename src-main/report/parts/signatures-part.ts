import type { ReportClaim } from '../../contract/project.ts';
import { facts, html, nothing, type Html, type HtmlValue } from '../html.ts';
import { capitalised, timeText } from '../words.ts';
import { digestPart } from './digest-part.ts';

/** Who signed what, with all that is needed to check it, and what earlier revisions said. */
export function signaturesPart({ signatures, finding, earlierFindings }: ReportClaim): Html {
  const blocks = signatures.map(({ signature, check }) => {
    const isCurrent = signature.revision === finding?.revision;
    return html`<section class="together">
      <h3>${capitalised(signature.meaning)} by ${signature.signer.name}</h3>
      ${facts([
        ['Role', signature.signer.role === '' ? 'none given' : signature.signer.role],
        ['Signed', timeText(signature.signedAt)],
        [
          'Covers',
          `revision ${signature.revision} of the finding${isCurrent ? '' : ', not the one in this report'}, the results it cites, signer, meaning and time, and the trail up to entry ${signature.trailSequence}`,
        ],
        [
          'Verified',
          check.isValid
            ? 'valid: an Ed25519 signature (RFC 8032) of the statement below'
            : html`<strong class="bad">not valid: ${check.reason ?? 'reason unknown'}</strong>`,
        ],
        ['Key fingerprint', html`<code>${check.fingerprint}</code>`],
        ['Public key', digestPart(signature.publicKey)],
        ['Signature', digestPart(signature.signature)],
        [
          'Statement',
          html`${digestPart(signature.payloadDigest)}
            <div class="quiet">
              SHA-256 of the statement that was signed: what it covers, as canonical JSON (RFC 8785)
            </div>`,
        ],
        ['Trail hash', digestPart(signature.trailHash)],
        ['Remark', signature.remark === '' ? 'none' : signature.remark],
      ])}
    </section>`;
  });
  return html`<h2>Signatures</h2>
    ${blocks.length > 0 ? blocks : nothing('Nobody has signed this finding. It is a draft.')}
    ${earlierPart(earlierFindings, finding)}`;
}

function earlierPart(earlier: ReportClaim['earlierFindings'], finding: ReportClaim['finding']): HtmlValue {
  if (!finding) return null;
  if (earlier.length === 0) return nothing(`The finding in this report is revision ${finding.revision}, the first.`);
  return [
    html`<h3>Earlier revisions</h3>`,
    html`<p>
      The finding in this report is revision ${finding.revision}. Changed because:
      ${finding.reason === '' ? 'no reason given' : finding.reason}
    </p>`,
    earlier.map(
      (one) =>
        html`<p>
          <strong>Revision ${one.revision}, ${one.conclusion ?? 'no conclusion'}.</strong> ${one.text}${
            one.conditions === '' ? null : ` Conditions: ${one.conditions}`
          }${one.reason === '' ? null : ` Changed because: ${one.reason}`}
        </p>`,
    ),
  ];
}
