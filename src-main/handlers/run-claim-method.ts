import type { ResultMethod } from '../contract/result.ts';
import { ProjectError } from '../errors.ts';
import { engineVersion } from '../engine-version.ts';
import { canonicalJson } from '../project/canonical-json.ts';
import { defaultMinYears } from '../robustness/claim-sweep.ts';
import type { HandlerContext } from './context.ts';
import { requestDigest, requestFor, resolveRequest } from './claim-request.ts';
import { latestAnswer } from './stored-results.ts';

const labels: Record<ResultMethod, { running: string; done: string }> = {
  derivation: { running: 'Checking the arithmetic', done: 'check arithmetic' },
  recomputation: { running: 'Recomputing', done: 'recompute' },
  assumptions: { running: 'Testing the assumptions', done: 'test assumptions' },
  estimators: { running: 'Comparing the estimators', done: 'compare estimators' },
  'claim-sweep': { running: 'Sweeping the windows', done: 'sweep windows' },
};

/** Computes one method of a claim and stores request and answer, unless the very same result is stored already. */
export async function runClaimMethod(
  { workspace, jobs, now }: HandlerContext,
  claimId: number,
  method: ResultMethod,
  { jobId, minYears = defaultMinYears }: { jobId?: string | undefined; minYears?: number },
): Promise<void> {
  const project = workspace.open();
  const claim = project.get('claim', claimId);
  workspace.reviewer();
  const request = requestFor(project, claim, method, minYears);
  const { method: name, input } = resolveRequest(project, request);
  const answer = await jobs.run(name, input, { jobId, label: `${labels[method].running}: claim ${claimId}` });
  if (workspace.project !== project) throw projectGone(claimId);
  const digest = requestDigest(request);
  const answerBytes = Buffer.from(canonicalJson(answer), 'utf8');
  workspace.change(labels[method].done, `claim ${claimId}`, (change) => {
    const answerDigest = change.addContent(answerBytes);
    const latest = latestAnswer(project, claimId, method);
    if (latest?.result.requestDigest === digest && latest.result.answerDigest === answerDigest) return;
    const seed = method === 'assumptions' || method === 'estimators' ? claim.seed : null;
    change.add('result', {
      claimId,
      method,
      request,
      requestDigest: digest,
      answerDigest,
      seed,
      engineVersion,
      computedAt: now(),
    });
  });
}

/** Another project was opened while this one was being computed on: the answer must not end up in that. */
function projectGone(claimId: number): ProjectError {
  return new ProjectError({
    code: 'project-closed',
    where: `Claim ${claimId}`,
    expected: 'the project that the computation was started in',
    received: 'another one, or none',
    hint: 'Nothing was stored. Open the project again and repeat the computation.',
  });
}
