import type { Claim } from '../contract/claim.ts';
import type { ClaimView } from '../contract/project.ts';
import type { ResultMethod } from '../contract/result.ts';
import { checkSignatures } from '../project/check-signatures.ts';
import type { Project } from '../project/project.ts';
import { catalogueEntries } from '../assumptions/catalogue.ts';
import { statedValue } from '../quantities/stated-number.ts';
import { statementQuestions } from '../quantities/statement-questions.ts';
import { defaultMinYears } from '../robustness/claim-sweep.ts';
import { fitFigure, residualsFigure, sweepFigure } from './claim-figures.ts';
import { obstacles, requestDigest, requestFor } from './claim-request.ts';
import { fillIns } from './fill-ins.ts';
import { publishedBudget } from '../quantities/published-budget.ts';
import { procedureSeries } from './procedure-series.ts';
import { publishedForClaim } from './published-for-claim.ts';
import { residualFigures } from './residual-figures.ts';
import { sectionStates } from './section-states.ts';
import { stemOf } from './stem-of.ts';
import { latestAnswer } from './stored-results.ts';

/** Everything that the sheet of one claim shows. */
export function claimView(project: Project, claimId: number): ClaimView {
  const claim = project.get('claim', claimId);
  const own = <Row extends { claimId: number }>(rows: Row[]) => rows.filter((row) => row.claimId === claimId);
  const blocked = obstacles(project, claim);
  const stored = <Method extends ResultMethod>(method: Method) =>
    storedWithState(project, claim, method, blocked.length > 0);

  const results = {
    derivation: stored('derivation'),
    recomputation: stored('recomputation'),
    assumptions: stored('assumptions'),
    sweep: stored('claim-sweep'),
    estimators: stored('estimators'),
  };
  const findings = own(project.list('finding'));
  const marks = own(project.list('mark'));
  const digests = digestsOf(project, claim);
  const recomputation = results.recomputation?.answer ?? null;
  const sweep = results.sweep?.answer ?? null;
  const published = publishedForClaim(claim, findings.at(-1)?.publishedValueIds);
  const view = {
    claim,
    questions: statementQuestions(claim.statement, claim.answers),
    statedValue: statedValue(claim.statement.value),
    ...results,
    obstacles: blocked,
    procedureSeriesIds: Object.values(procedureSeries(claim.procedure)),
    marks,
    notes: own(project.list('note')),
    findings,
    signatures: own(project.list('signature')),
    signatureChecks: own(checkSignatures(project)),
    stem: stemOf(claim, recomputation, results.assumptions?.answer ?? null, published, digests),
    figures: {
      fit: recomputation && fitFigure(claim, recomputation, digests),
      residuals: recomputation && residualsFigure(claim, recomputation, digests),
      ...residualFigures(claim, recomputation, digests),
      sweep: sweep && sweepFigure(claim, sweep, digests),
    },
    catalogue: [...catalogueEntries],
    published,
    publishedBudget,
    fillIns: fillIns(claim, {
      recomputation,
      assumptions: results.assumptions?.answer ?? null,
      sweep,
      estimators: results.estimators?.answer ?? null,
    }),
    trail: project.trailLines({ claimId, limit: 40 }),
    isFrozen: findings.at(-1)?.isSigned ?? false,
  };
  return { ...view, sections: sectionStates(view) };
}

function storedWithState<Method extends ResultMethod>(
  project: Project,
  claim: Claim,
  method: Method,
  isBlocked: boolean,
) {
  const latest = latestAnswer(project, claim.id, method);
  if (!latest) return null;
  if (method !== 'derivation' && isBlocked) return { ...latest, isStale: true };
  const minYears = latest.result.request['minYears'];
  const current = requestFor(project, claim, method, typeof minYears === 'number' ? minYears : defaultMinYears);
  return { ...latest, isStale: requestDigest(current) !== latest.result.requestDigest };
}

/** Digests of the series that the claim's procedure uses. */
function digestsOf(project: Project, { procedure }: Claim): string[] {
  const ids = Object.values(procedureSeries(procedure));
  return project
    .list('series')
    .filter((series) => ids.includes(series.id))
    .map((series) => series.valuesDigest);
}
