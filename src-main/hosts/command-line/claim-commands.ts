import { claimDraft, type ClaimDraft } from '../../contract/claim.ts';
import type { ClaimView } from '../../contract/project.ts';
import type { Interval } from '../../contract/primitives.ts';
import { assumptionId, markValue } from '../../contract/result.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { badUsage, claimNumber, claimOption, type Command } from './command.ts';
import { textTable } from './text-table.ts';

export const claimCommands: Command[] = [
  {
    name: 'claim',
    usage: 'FILE CLAIM.json',
    summary: 'adds a claim with its procedure; the form is what footing schema claim prints',
    examples: ['claim review.footing claim.json', 'schema claim'],
    nPositionals: { min: 2, max: 2 },
    options: {},
    async run({ positionals: [path = '', file = ''] }, tools) {
      const draft = readDraft(file, tools.readFile(file).toString('utf8'));
      await tools.ask('project.open', { path });
      const view = await tools.ask('claim.create', draft);
      return { json: view.claim, text: `claim ${view.claim.id}  ${view.claim.title}` };
    },
  },
  {
    name: 'recompute',
    usage: 'FILE',
    summary: 'runs the procedures: the stated number from data, with its diagnostics',
    examples: ['recompute review.footing', 'recompute review.footing --claim 2 --json'],
    nPositionals: { min: 1, max: 1 },
    options: claimOption,
    async run(args, tools) {
      const { claims } = await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const ids = args.has('claim') ? [await claimNumber(args, tools)] : claims.map((claim) => claim.id);
      const views: ClaimView[] = [];
      for (const claimId of ids) {
        const draft = await tools.ask('claim.view', { claimId });
        if (draft.claim.derivation.length > 0) await tools.ask('claim.derive', { claimId });
        views.push(await tools.ask('claim.recompute', { claimId }));
      }
      const json = views.map(({ claim, recomputation, derivation }) => ({
        claimId: claim.id,
        result: recomputation?.result ?? null,
        recomputation: recomputation?.answer ?? null,
        derivation: derivation?.answer ?? null,
      }));
      return {
        json: args.has('claim') ? json[0] : json,
        text: views.map(recomputationText).join('\n\n') || 'No claims yet.',
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
      const claimId = await claimNumber(args, tools);
      const view = await tools.ask('claim.testAssumptions', { claimId });
      return { json: view.assumptions?.answer ?? null, text: ledgerText(view) };
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
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const claimId = await claimNumber(args, tools);
      const minYears = Number(args.option('min-years') ?? 20);
      if (!Number.isInteger(minYears))
        throw badUsage('--min-years', 'a whole number of years', args.option('min-years') ?? '');
      const { sweep } = await tools.ask('claim.sweep', { claimId, minYears });
      if (!sweep) return { json: null, text: 'No sweep.' };
      const { valueQuantiles: q, windows, stated, unit, shareAtOrBelowStated } = sweep.answer;
      const text = [
        `${windows.length} windows of at least ${minYears} years, in ${unit}:`,
        `  lowest ${formatNumber(q.min, { decimals: 2 })} · 5 % ${formatNumber(q.q05, { decimals: 2 })} · middle ${formatNumber(q.q50, { decimals: 2 })} · 95 % ${formatNumber(q.q95, { decimals: 2 })} · highest ${formatNumber(q.max, { decimals: 2 })}`,
        `  the stated window ${stated.window.start}–${stated.window.end} gives ${formatNumber(stated.value, { decimals: 2 })}, percentile ${formatNumber(stated.percentile, { decimals: 0 })}`,
        `  ${formatNumber(100 * shareAtOrBelowStated, { decimals: 0 })} % of the windows lie at or below the stated number`,
      ];
      return { json: sweep.answer, text: text.join('\n') };
    },
  },
  {
    name: 'mark',
    usage: 'FILE ASSUMPTION MARK',
    summary: 'records the reviewer’s mark on an assumption: met, "not met" or untested',
    examples: ['mark review.footing zero-intercept "not met" --note "t = −4.2"'],
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
      const view = await tools.ask('claim.mark', {
        claimId,
        assumptionId: id.data,
        mark: value.data,
        note: args.option('note') ?? '',
      });
      return { json: view.marks, text: `claim ${claimId} · ${id.data}: ${value.data}` };
    },
  },
];

function readDraft(file: string, text: string): ClaimDraft {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    throw badUsage(
      file,
      'JSON',
      error instanceof Error ? error.message : String(error),
      'footing schema claim prints the form.',
    );
  }
  const draft = claimDraft.safeParse(value);
  if (draft.success) return draft.data;
  const [issue] = draft.error.issues;
  throw badUsage(
    `${file}, ${issue?.path.join('.') || 'top level'}`,
    'what footing schema claim prints',
    issue?.message ?? 'something else',
  );
}

function recomputationText({ claim, recomputation, derivation }: ClaimView): string {
  const lines = [`claim ${claim.id}  ${claim.title}`];
  for (const line of derivation?.answer.lines ?? []) {
    const verdict =
      line.problem ??
      (line.agrees === null
        ? 'nothing stated to compare with'
        : line.agrees
          ? 'agrees'
          : `does not agree${line.likelySlip ? `: ${line.likelySlip}` : ''}`);
    lines.push(`  ${line.line}   ${verdict}`);
  }
  if (!recomputation) return [...lines, '  not recomputed'].join('\n');
  const { value, standardError, unit, interval95, agreement, fit, caveats } = recomputation.answer;
  lines.push(
    `  ${formatNumber(value, { decimals: 4 })} ± ${standardError === null ? '?' : formatNumber(standardError, { decimals: 4 })} ${unit}${interval95 ? ` (95 %: ${intervalText(interval95)})` : ''}`,
  );
  lines.push(`  ${agreement.sentence}`);
  if (fit) {
    const { diagnostics } = fit;
    lines.push(
      `  R² centred ${formatNumber(diagnostics.rSquaredCentred, { decimals: 3 })}, uncentred ${formatNumber(diagnostics.rSquaredUncentred, { decimals: 3 })} · Durbin–Watson ${formatNumber(diagnostics.durbinWatson, { decimals: 2 })} · effective years ${formatNumber(diagnostics.effectiveSampleSize, { decimals: 1 })} of ${diagnostics.nObs}`,
    );
  }
  return [...lines, ...caveats.map((caveat) => `  note: ${caveat.detail}`)].join('\n');
}

function ledgerText({ claim, assumptions }: ClaimView): string {
  if (!assumptions) return 'Not tested.';
  const { outcomes, ladder } = assumptions.answer;
  const rows = outcomes.map(({ id, test, alternative, weight, proposal, missing }) => [
    id,
    alternative
      ? `${formatNumber(alternative.value, { decimals: 2 })}${alternative.interval ? ` (${intervalText(alternative.interval)})` : ''}`
      : '–',
    weight ?? 'untested',
    missing ? `${missing.reason} ${missing.wouldNeed}` : `${test}; proposed: ${proposal.mark}`,
  ]);
  const lines = [
    `claim ${claim.id}  ${claim.title}`,
    textTable([['assumption', 'moves it to', 'weight', 'test'], ...rows]),
  ];
  if (ladder) {
    const rungs = ladder.rungs.map(({ label, value, interval90, quantity }) => [
      label,
      formatNumber(value, { decimals: 2 }),
      intervalText(interval90),
      quantity,
    ]);
    const { value, interval90, quantity } = ladder.start;
    lines.push('', `The ladder, ${ladder.unit}, 5–95 % (seed ${ladder.random.seed}, ${ladder.random.nDraws} draws)`);
    lines.push(
      textTable([
        ['as recomputed', formatNumber(value, { decimals: 2 }), intervalText(interval90), quantity],
        ...rungs,
      ]),
    );
  }
  return lines.join('\n');
}

function intervalText({ low, high }: Interval): string {
  return `${low === null ? 'unbounded' : formatNumber(low, { decimals: 2 })} to ${high === null ? 'unbounded' : formatNumber(high, { decimals: 2 })}`;
}
