import { InputError } from '../errors.ts';
import type { Finding } from '../contract/finding.ts';
import { resultMethod } from '../contract/result.ts';
import type { Project } from '../project/project.ts';
import { signFinding } from '../project/sign-finding.ts';
import { publishedValues } from '../quantities/published-values.ts';
import { refuseFrozen } from './claims.ts';
import { claimView } from './claim-view.ts';
import type { Handlers } from './context.ts';
import { fillIn } from './fill-in.ts';
import { latestAnswer } from './stored-results.ts';

export const findingHandlers: Handlers<'finding.save' | 'finding.sign' | 'finding.revise'> = {
  'finding.save'({ claimId, ...words }, { workspace }) {
    const project = workspace.open();
    refuseFrozen(project, claimId);
    refuseUnknownValues(words.publishedValueIds);
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
    if (!finding) throw unfinished(claimId, 'a finding', 'none yet');
    if (meaning === 'sign-off') refuseUnfinished(project, finding);
    signFinding(project, {
      ...workspace.signed(),
      findingId: finding.id,
      meaning,
      remark,
      signer: workspace.identity.unlock(passphrase),
    });
    return claimView(project, claimId);
  },

  'finding.revise'({ claimId, reason }, { workspace }) {
    const project = workspace.open();
    const finding = latestFinding(project, claimId);
    if (!finding?.isSigned)
      throw unfinished(claimId, 'a signed finding to revise', finding ? 'an unsigned one' : 'none yet');
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

/** A finding is signed when it concludes something, in words whose figures are there, on results that are current. */
function refuseUnfinished(project: Project, finding: Finding): void {
  const view = claimView(project, finding.claimId);
  if (!finding.conclusion) throw unfinished(finding.claimId, 'a conclusion', 'none chosen');
  if (finding.text.trim() === '') throw unfinished(finding.claimId, 'the finding in words', 'an empty text');
  if (finding.conclusion === 'supported on stated conditions' && finding.conditions.trim() === '') {
    throw unfinished(finding.claimId, 'the conditions on which the number is supported', 'none stated');
  }
  const { unknown } = fillIn(finding.text, view.fillIns);
  if (unknown.length > 0) {
    throw unfinished(
      finding.claimId,
      `figures that exist (${Object.keys(view.fillIns).join(', ')})`,
      `{${unknown.join('}, {')}}`,
    );
  }
  const stale = [view.derivation, view.recomputation, view.assumptions, view.sweep].filter((stored) => stored?.isStale);
  if (stale.length > 0) {
    throw unfinished(
      finding.claimId,
      'results that belong to the claim as it is now',
      `${stale.length} from before a change`,
    );
  }
  const current = currentResults(project, finding.claimId);
  if (current.join() !== finding.resultIds.join()) {
    throw unfinished(
      finding.claimId,
      'a finding written on the newest results',
      'results that came after it; save it again',
    );
  }
  const unmarked = (view.assumptions?.answer.outcomes ?? []).filter(
    (outcome) => outcome.weight === 'decisive' && !view.marks.some((mark) => mark.assumptionId === outcome.id),
  );
  if (unmarked.length > 0) {
    throw unfinished(
      finding.claimId,
      'your mark on every decisive assumption',
      `none on ${unmarked.map((outcome) => outcome.id).join(', ')}`,
    );
  }
}

function refuseUnknownValues(ids: readonly string[]): void {
  const known = new Set(publishedValues.map((value) => value.id));
  const unknown = ids.find((id) => !known.has(id));
  if (unknown === undefined) return;
  throw new InputError({
    code: 'unknown-published-value',
    where: 'finding.publishedValueIds',
    expected: 'the id of a published value of this version',
    received: unknown,
    hint: `Known: ${[...known].join(', ')}.`,
  });
}

function unfinished(claimId: number, expected: string, received: string): InputError {
  return new InputError({ code: 'not-ready-to-sign', where: `Finding on claim ${claimId}`, expected, received });
}
