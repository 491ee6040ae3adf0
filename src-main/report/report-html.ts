import type { Report, ReportClaim } from '../contract/project.ts';
import { Html, html } from './html.ts';
import { arithmeticPart } from './parts/arithmetic-part.ts';
import { contentsPart } from './parts/contents-part.ts';
import { dataPart } from './parts/data-part.ts';
import { estimatorsPart } from './parts/estimators-part.ts';
import { firstPage } from './parts/first-page.ts';
import { ladderPart } from './parts/ladder-part.ts';
import { ledgerPart } from './parts/ledger-part.ts';
import { notesPart } from './parts/notes-part.ts';
import { projectPart } from './parts/project-part.ts';
import { publishedPart } from './parts/published-part.ts';
import { recomputationPart } from './parts/recomputation-part.ts';
import { residualsPart } from './parts/residuals-part.ts';
import { resultsPart } from './parts/results-part.ts';
import { signaturesPart } from './parts/signatures-part.ts';
import { statementPart } from './parts/statement-part.ts';
import { windowsPart } from './parts/windows-part.ts';
import { pageRules, reportStyle } from './report-style.ts';
import { isDraft } from './signing.ts';

// The report asks for nothing: whatever might slip into it could still load nothing and run nothing.
const policy = "default-src 'none'; style-src 'unsafe-inline'; font-src data:; form-action 'none'; base-uri 'none'";

/**
 * The report as one HTML file that needs nothing else: figures as drawings, fonts inside, no script. On paper it runs
 * in A4 pages with the trail head at the foot of each. Parts without content say why.
 */
export async function reportHtml(report: Report): Promise<string> {
  // Loaded when first needed: the fonts are a third of a megabyte.
  const { reportFontFaces } = await import('./font-faces.ts');
  const body = html`<main>
    ${report.isInvented ? html`<p class="invented">Invented data: nothing in this report is about the real world.</p>` : null}
    ${report.claims.length === 1 ? null : contentsPart(report)}
    ${report.claims.map((claim) => claimPart(claim, report))} ${projectPart(report)}
  </main>`;
  const style = new Html(`${reportFontFaces(body.markup)}${pageRules(report)}${reportStyle}`);
  return `<!doctype html>\n${
    html`<html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta http-equiv="Content-Security-Policy" content="${policy}" />
        <title>${report.title}: findings on stated numbers</title>
        <style>
          ${style}
        </style>
      </head>
      <body>
        ${body}
      </body>
    </html>`.markup
  }\n`;
}

function claimPart(claim: ReportClaim, report: Report): Html {
  const { id } = claim.claim;
  return html`<article class="${isDraft(claim) ? 'claim of-draft' : 'claim'}" aria-labelledby="claim-${id}">
    <section class="page first" aria-label="Finding on claim ${id}">${firstPage(claim, report)}</section>
    <section class="page" aria-label="The check of claim ${id} in full">
      <p class="kicker">The check in full · claim ${id}</p>
      ${statementPart(claim)} ${arithmeticPart(claim)} ${recomputationPart(claim)} ${estimatorsPart(claim)}
      ${residualsPart(claim)} ${ledgerPart(claim)} ${ladderPart(claim)} ${windowsPart(claim)} ${publishedPart(claim)}
      ${dataPart(claim)} ${resultsPart(claim)} ${notesPart(claim)} ${signaturesPart(claim)}
    </section>
  </article>`;
}
