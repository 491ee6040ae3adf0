import type { Claim } from '../contract/claim.ts';
import { InputError } from '../errors.ts';
import type { Project } from '../project/project.ts';
import { checkClaim, completeDraft } from './claim-draft.ts';
import { claimView } from './claim-view.ts';
import type { HandlerContext, Handlers } from './context.ts';
import { projectView } from './project-view.ts';
import { runClaimMethod } from './run-claim-method.ts';

type Names =
  | 'claim.create'
  | 'claim.update'
  | 'claim.remove'
  | 'claim.view'
  | 'claim.derive'
  | 'claim.recompute'
  | 'claim.testAssumptions'
  | 'claim.sweep'
  | 'claim.compareEstimators'
  | 'claim.mark'
  | 'note.add'
  | 'note.remove';

export const claimHandlers: Handlers<Names> = {
  'claim.create'(draft, context) {
    const project = context.workspace.open();
    const record = completeDraft(project, draft);
    const claim = context.workspace.change('add claim', record.title, (change) => change.add('claim', record));
    return claimView(project, claim.id);
  },
  'claim.update': ({ claimId, change: patch }, context) =>
    changeClaim(context, claimId, 'change claim', (claim) => {
      const changed = { ...claim, ...patch };
      checkClaim(context.workspace.open(), changed);
      return changed;
    }),
  'claim.remove'({ claimId }, { workspace }) {
    const project = workspace.open();
    refuseFrozen(project, claimId);
    workspace.change('remove claim', `claim ${claimId}`, (change) => {
      for (const kind of ['mark', 'note', 'finding', 'result'] as const) {
        for (const row of project.list(kind)) if (row.claimId === claimId) change.remove(kind, row.id);
      }
      change.remove('claim', claimId);
    });
    return projectView(project);
  },
  'claim.view': ({ claimId }, { workspace }) => claimView(workspace.open(), claimId),

  'claim.derive': ({ claimId, jobId }, context) => run(context, claimId, 'derivation', { jobId }),
  'claim.recompute': ({ claimId, jobId }, context) => run(context, claimId, 'recomputation', { jobId }),
  'claim.testAssumptions': ({ claimId, jobId }, context) => run(context, claimId, 'assumptions', { jobId }),
  'claim.sweep': ({ claimId, jobId, minYears }, context) => run(context, claimId, 'claim-sweep', { jobId, minYears }),

  'claim.compareEstimators': ({ claimId, jobId }, context) => run(context, claimId, 'estimators', { jobId }),

  'claim.mark'({ claimId, assumptionId, mark, note }, { workspace }) {
    const project = workspace.open();
    refuseFrozen(project, claimId);
    const earlier = project.list('mark').find((row) => row.claimId === claimId && row.assumptionId === assumptionId);
    const record = { claimId, assumptionId, mark, note };
    workspace.change(`mark ${assumptionId} ${mark}`, `claim ${claimId}`, (change) =>
      earlier ? change.put('mark', { ...record, id: earlier.id }) : change.add('mark', record),
    );
    return claimView(project, claimId);
  },
  'note.add'({ claimId, text }, { workspace, now }) {
    const project = workspace.open();
    project.get('claim', claimId);
    const author = workspace.reviewer().name;
    workspace.change('add note', `claim ${claimId}`, (change) =>
      change.add('note', { claimId, text, author, writtenAt: now() }),
    );
    return claimView(project, claimId);
  },
  'note.remove'({ claimId, noteId }, { workspace }) {
    const project = workspace.open();
    const note = project.get('note', noteId);
    if (note.claimId !== claimId) {
      throw new InputError({
        code: 'note-of-another-claim',
        where: `Note ${noteId}`,
        expected: `a note on claim ${claimId}`,
        received: `one on claim ${note.claimId}`,
        hint: 'Name the claim that the note is on.',
      });
    }
    workspace.change('remove note', `claim ${claimId}`, (change) => change.remove('note', noteId));
    return claimView(project, claimId);
  },
};

async function run(context: HandlerContext, claimId: number, ...rest: Tail<Parameters<typeof runClaimMethod>>) {
  const project = context.workspace.open();
  refuseFrozen(project, claimId);
  await runClaimMethod(context, claimId, ...rest);
  return claimView(project, claimId);
}
type Tail<List extends unknown[]> = List extends [unknown, unknown, ...infer Rest] ? Rest : never;

function changeClaim({ workspace }: HandlerContext, claimId: number, action: string, work: (claim: Claim) => Claim) {
  const project = workspace.open();
  refuseFrozen(project, claimId);
  const changed = work(project.get('claim', claimId));
  workspace.change(action, `claim ${claimId}`, (change) => change.put('claim', changed));
  return claimView(project, claimId);
}

/** A signed finding stands on its claim: the claim waits for a new revision before it changes. */
export function refuseFrozen(project: Project, claimId: number): void {
  project.get('claim', claimId);
  const latest = project
    .list('finding')
    .filter((row) => row.claimId === claimId)
    .at(-1);
  if (!latest?.isSigned) return;
  throw new InputError({
    code: 'signed',
    where: `Claim ${claimId}`,
    expected: 'a finding that is not signed',
    received: `revision ${latest.revision}, which is signed and frozen`,
    hint: 'Start a new revision, saying what changes and why.',
  });
}
