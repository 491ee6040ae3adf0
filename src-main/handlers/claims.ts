import type { Claim, ClaimDraft } from '../contract/claim.ts';
import { InputError } from '../errors.ts';
import type { Project } from '../project/project.ts';
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
      checkSeries(context.workspace.open(), changed);
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
    workspace.change('remove note', `claim ${claimId}`, (change) => change.remove('note', noteId));
    return claimView(workspace.open(), claimId);
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

/** A draft with its defaults filled in and its series found by name. */
function completeDraft(project: Project, draft: ClaimDraft): Omit<Claim, 'id'> {
  const find = (reference: number | string, field: string) => findSeries(project, reference, field);
  const findOrNull = (reference: number | string | null | undefined, field: string) =>
    reference === null || reference === undefined ? null : find(reference, field);
  const record: Omit<Claim, 'id'> = {
    title: draft.title,
    statement: {
      sourceId: null,
      locator: '',
      bound: 'equals',
      definition: '',
      presentedAs: null,
      statedRSquared: null,
      ...withoutUndefined(draft.statement),
    },
    answers: draft.answers ?? {},
    derivation: draft.derivation ?? [],
    procedure: completeProcedure(draft.procedure, find),
    evidence: {
      energyBudget: draft.evidence?.energyBudget ?? null,
      comparedWith: draft.evidence?.comparedWith ?? null,
      doublingWm2: draft.evidence?.doublingWm2 ?? null,
      totalForcingSeriesId: findOrNull(draft.evidence?.totalForcingSeriesId, 'evidence.totalForcingSeriesId'),
      co2ForcingSeriesId: findOrNull(draft.evidence?.co2ForcingSeriesId, 'evidence.co2ForcingSeriesId'),
    },
    tolerance: draft.tolerance ?? { notableShare: 0.1, decisiveShare: 0.25 },
    seed: draft.seed ?? 20_261,
  };
  checkSeries(project, record);
  return record;
}

function completeProcedure(
  procedure: ClaimDraft['procedure'],
  find: (reference: number | string, field: string) => number,
): Claim['procedure'] {
  if (!procedure) return null;
  switch (procedure.kind) {
    case 'log-regression':
      return {
        minMonths: 12,
        window: null,
        anchor: { kind: 'first-year' },
        intercept: false,
        covariance: { kind: 'classical' },
        conversion: 'per-doubling',
        ...withoutUndefined(procedure),
        temperatureSeriesId: find(procedure.temperatureSeriesId, 'procedure.temperatureSeriesId'),
        co2SeriesId: find(procedure.co2SeriesId, 'procedure.co2SeriesId'),
      };
    case 'trend':
      return {
        minMonths: 12,
        window: null,
        covariance: { kind: 'classical' },
        per: 'decade',
        ...withoutUndefined(procedure),
        seriesId: find(procedure.seriesId, 'procedure.seriesId'),
      };
    case 'ratio':
      return procedure;
  }
}

function findSeries(project: Project, reference: number | string, field: string): number {
  const all = project.list('series');
  const found = all.find((series) => series.id === reference || series.name === reference);
  if (found) return found.id;
  throw new InputError({
    code: 'unknown-series',
    where: field,
    expected: `a series of this project (${all.map((series) => series.name).join(', ') || 'there is none yet'})`,
    received: String(reference),
    hint: 'Import it first, or correct the name.',
  });
}

function checkSeries(project: Project, { procedure, evidence }: Pick<Claim, 'procedure' | 'evidence'>): void {
  if (procedure?.kind === 'log-regression') {
    findSeries(project, procedure.temperatureSeriesId, 'procedure.temperatureSeriesId');
    findSeries(project, procedure.co2SeriesId, 'procedure.co2SeriesId');
  }
  if (procedure?.kind === 'trend') findSeries(project, procedure.seriesId, 'procedure.seriesId');
  for (const field of ['totalForcingSeriesId', 'co2ForcingSeriesId'] as const) {
    const id = evidence[field];
    if (id !== null) findSeries(project, id, `evidence.${field}`);
  }
}

function withoutUndefined<Value extends object>(
  value: Value,
): { [Key in keyof Value]: Exclude<Value[Key], undefined> } {
  return Object.fromEntries(Object.entries(value).filter(([, entry]) => entry !== undefined)) as {
    [Key in keyof Value]: Exclude<Value[Key], undefined>;
  };
}
