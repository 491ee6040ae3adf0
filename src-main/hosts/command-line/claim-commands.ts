import { claimDraft } from '../../contract/claim.ts';
import type { ClaimView } from '../../contract/project.ts';
import type { ErrorAnswer } from '../../contract/requests.ts';
import { assumptionId, markValue } from '../../contract/result.ts';
import { errorSentence } from '../../errors.ts';
import { checkInput } from '../../handlers/check-input.ts';
import { ledgerLines, recomputationLines, sweepLines } from './claim-text.ts';
import { badUsage, claimNumber, claimOption, CommandFailure, wholeNumber } from './command.ts';
import type { Command, CommandTools } from './command.ts';
import { estimatorsLines } from './estimators-text.ts';

export const claimCommands: Command[] = [
  {
    name: 'claim',
    usage: 'FILE CLAIM.json',
    summary: 'adds a claim with its procedure; the form is what footing schema claim prints',
    examples: ['claim review.footing claim.json', 'schema claim'],
    nPositionals: { min: 2, max: 2 },
    options: {},
    async run({ positionals: [path = '', file = ''] }, tools) {
      const draft = checkInput(file === '-' ? 'claim' : file, claimDraft, await tools.readJson(file));
      await tools.ask('project.open', { path });
      const view = await tools.ask('claim.create', draft);
      return { json: view.claim, lines: [`claim ${view.claim.id}  ${view.claim.title}`] };
    },
  },
  {
    name: 'recompute',
    usage: 'FILE',
    summary: 'runs the procedures: the stated number from data, with its diagnostics',
    examples: ['recompute review.footing', 'recompute review.footing --claim 2 --json'],
    nPositionals: { min: 1, max: 1 },
    options: { claim: { value: 'N', help: 'number of the claim; every claim unless given' } },
    async run(args, tools) {
      const { claims } = await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      if (args.has('claim')) {
        const view = await recompute(tools, await claimNumber(args, tools));
        return { json: recomputationJson(view), lines: recomputationLines(view) };
      }
      if (claims.length === 0) return { json: [], lines: ['No claims yet. footing claim FILE CLAIM.json adds one.'] };
      const done = [];
      for (const { id, title } of claims) done.push({ id, title, ...(await attempt(() => recompute(tools, id))) });
      return {
        json: done.map(({ id, view, error }) => (view ? recomputationJson(view) : { claimId: id, error })),
        lines: done.flatMap(({ id, title, view, error }) =>
          view ? recomputationLines(view) : [`claim ${id}  ${title}`, ...(error ? [`  ${errorSentence(error)}`] : [])],
        ),
        status: done.every(({ view }) => view) ? 0 : 2,
      };
    },
  },
  {
    name: 'assumptions',
    usage: 'FILE',
    summary: 'runs every applicable test; prints the ledger and the ladder',
    examples: ['assumptions review.footing --claim 2'],
    nPositionals: { min: 1, max: 1 },
    options: claimOption,
    async run(args, tools) {
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const view = await tools.ask('claim.testAssumptions', { claimId: await claimNumber(args, tools) });
      return { json: view.assumptions?.answer ?? null, lines: ledgerLines(view) };
    },
  },
  {
    name: 'sweep',
    usage: 'FILE',
    summary: 'recomputes the number over every window',
    examples: ['sweep review.footing --claim 2 --min-years 30'],
    nPositionals: { min: 1, max: 1 },
    options: { ...claimOption, 'min-years': { value: 'N', help: 'shortest window; 20 unless given' } },
    async run(args, tools) {
      const minYears = wholeNumber(args, 'min-years', { atLeast: 3, atMost: 1000 }) ?? 20;
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const view = await tools.ask('claim.sweep', { claimId: await claimNumber(args, tools), minYears });
      return { json: view.sweep?.answer ?? null, lines: sweepLines(view) };
    },
  },
  {
    name: 'estimators',
    usage: 'FILE',
    summary: 'the number under other estimators, each with its convention, and tests of the residuals',
    examples: ['estimators review.footing --claim 2', 'estimators review.footing --claim 2 --json'],
    nPositionals: { min: 1, max: 1 },
    options: claimOption,
    async run(args, tools) {
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const view = await tools.ask('claim.compareEstimators', { claimId: await claimNumber(args, tools) });
      return { json: view.estimators?.answer ?? null, lines: estimatorsLines(view) };
    },
  },
  {
    name: 'mark',
    usage: 'FILE ASSUMPTION MARK',
    summary: 'records the reviewer’s mark on an assumption: met, "not met" or untested',
    examples: ['mark review.footing zero-intercept "not met" --claim 1 --note "t = −4.2"'],
    nPositionals: { min: 3, max: 3 },
    options: { ...claimOption, note: { value: 'TEXT', help: 'why' } },
    async run(args, tools) {
      const [path = '', assumption = '', mark = ''] = args.positionals;
      const id = assumptionId.safeParse(assumption);
      const value = markValue.safeParse(mark);
      if (!id.success) throw badUsage('ASSUMPTION', `one of ${assumptionId.options.join(', ')}`, assumption);
      if (!value.success) throw badUsage('MARK', `one of ${markValue.options.join(', ')}`, mark);
      await tools.ask('project.open', { path });
      const claimId = await claimNumber(args, tools);
      const note = args.option('note') ?? '';
      const view = await tools.ask('claim.mark', { claimId, assumptionId: id.data, mark: value.data, note });
      return { json: view.marks, lines: [`claim ${claimId} · ${id.data}: ${value.data}`] };
    },
  },
  {
    name: 'note',
    usage: 'FILE TEXT',
    summary: 'writes a note in the margin of a claim',
    examples: ['note review.footing "The caption names another year than the talk." --claim 1'],
    nPositionals: { min: 2, max: 2 },
    options: claimOption,
    async run(args, tools) {
      const [path = '', text = ''] = args.positionals;
      await tools.ask('project.open', { path });
      const claimId = await claimNumber(args, tools);
      const note = (await tools.ask('note.add', { claimId, text })).notes.at(-1);
      return { json: note, lines: [`claim ${claimId}, note ${note?.id ?? ''}`] };
    },
  },
];

async function recompute(tools: CommandTools, claimId: number): Promise<ClaimView> {
  const { claim } = await tools.ask('claim.view', { claimId });
  if (claim.derivation.length > 0) await tools.ask('claim.derive', { claimId });
  return tools.ask('claim.recompute', { claimId });
}

/** One claim that cannot be recomputed leaves the others their turn. */
async function attempt(work: () => Promise<ClaimView>): Promise<{ view?: ClaimView; error?: ErrorAnswer }> {
  try {
    return { view: await work() };
  } catch (failure) {
    const goesOn = failure instanceof CommandFailure && !['ProjectError', 'Cancelled'].includes(failure.error.kind);
    if (goesOn) return { error: failure.error };
    throw failure;
  }
}

function recomputationJson({ claim, recomputation, derivation }: ClaimView) {
  return {
    claimId: claim.id,
    result: recomputation?.result ?? null,
    recomputation: recomputation?.answer ?? null,
    derivation: derivation?.answer ?? null,
  };
}
