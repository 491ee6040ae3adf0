import type { RecheckReport } from '../contract/trail.ts';
import { canonicalJson } from '../project/canonical-json.ts';
import { firstDifference } from '../project/first-difference.ts';
import { resolveRequest } from './claim-request.ts';
import type { HandlerContext } from './context.ts';
import { readAnswer } from './stored-results.ts';

/** Computes every stored result again and lists what comes out otherwise, to the last digit. */
export async function recheck({ workspace, jobs }: HandlerContext, jobId: string | undefined): Promise<RecheckReport> {
  const project = workspace.open();
  const results = project.list('result');
  const differences: RecheckReport['differences'] = [];
  for (const result of results) {
    const { method, input } = resolveRequest(project, result.request);
    const label = `Rechecking result ${result.id} of ${results.length}`;
    const answer: unknown = await jobs.run(method, input, { jobId, label });
    const difference = firstDifference(readAnswer(project, result), JSON.parse(canonicalJson(answer)));
    if (difference) {
      const { path, one: stored, other: recomputed } = difference;
      differences.push({
        resultId: result.id,
        claimId: result.claimId,
        method: result.method,
        path,
        stored,
        recomputed,
      });
    }
  }
  return {
    nResults: results.length,
    isIdentical: differences.length === 0,
    differences,
    engineVersions: [...new Set(results.map((result) => result.engineVersion))],
  };
}
