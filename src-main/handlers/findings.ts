import type { Finding } from '../contract/finding.ts';
import { resultMethod } from '../contract/result.ts';
import type { Project } from '../project/project.ts';
import { signFinding } from '../project/sign-finding.ts';
import { checkPublishedValues } from './claim-draft.ts';
import { refuseFrozen } from './claims.ts';
import { claimView } from './claim-view.ts';
import type { HandlerContext, Handlers } from './context.ts';
import { notReady, refuseUnready } from './ready-to-sign.ts';
import { latestAnswer } from './stored-results.ts';

export const findingHandlers: Handlers<'finding.save' | 'finding.sign' | 'finding.revise'> = {
  'finding.save'({ claimId, ...words }, { workspace }) {
    const project = workspace.open();
    refuseFrozen(project, claimId);
    checkPublishedValues('finding.publishedValueIds', words.publishedValueIds);
    const earlier = latestFinding(project, claimId);
    const revision = earlier?.revision ?? 1;
    workspace.change('write finding', `claim ${claimId} · revision ${revision}`, (change) => {
      const record = {
        claimId,
        revision,
        ...words,
        resultIds: currentResults(project, claimId),
        reason: earlier?.reason ?? '',
        isSigned: false,
      };
      return earlier ? change.put('finding', { ...record, id: earlier.id }) : change.add('finding', record);
    });
    return claimView(project, claimId);
  },

  'finding.sign'({ claimId, passphrase, meaning, remark }, context) {
    const { workspace } = context;
    const project = workspace.open();
    const finding = latestFinding(project, claimId);
    if (!finding) throw notReady(claimId, 'a finding', 'none yet');
    // Whatever can be refused is refused before anything is written.
    const isFirst = !finding.isSigned && meaning === 'sign-off';
    if (isFirst) refuseUnready(claimView(project, claimId), finding);
    const signer = workspace.identity.unlock(passphrase);
    if (isFirst) citeNewestResults(context, finding);
    signFinding(project, { ...workspace.signed(), findingId: finding.id, meaning, remark, signer });
    return claimView(project, claimId);
  },

  'finding.revise'({ claimId, reason }, { workspace }) {
    const project = workspace.open();
    const finding = latestFinding(project, claimId);
    if (!finding?.isSigned)
      throw notReady(claimId, 'a signed finding to revise', finding ? 'an unsigned one' : 'none yet');
    const { id: _id, ...signed } = finding;
    workspace.change('revise finding', `claim ${claimId} · revision ${finding.revision + 1}`, (change) =>
      change.add('finding', { ...signed, revision: finding.revision + 1, reason, isSigned: false }),
    );
    return claimView(project, claimId);
  },
};

export function latestFinding(project: Project, claimId: number): Finding | undefined {
  return project
    .list('finding')
    .filter((row) => row.claimId === claimId)
    .at(-1);
}

/** The results that a finding written now stands on: the newest of each method. */
function currentResults(project: Project, claimId: number): number[] {
  return resultMethod.options.flatMap((method) => latestAnswer(project, claimId, method)?.result.id ?? []);
}

/** What a signature covers is what the sheet shows: the newest result of each method. */
function citeNewestResults({ workspace }: HandlerContext, finding: Finding): void {
  const resultIds = currentResults(workspace.open(), finding.claimId);
  if (resultIds.join() === finding.resultIds.join()) return;
  workspace.change('cite newest results', `claim ${finding.claimId} · revision ${finding.revision}`, (change) =>
    change.put('finding', { ...finding, resultIds }),
  );
}
