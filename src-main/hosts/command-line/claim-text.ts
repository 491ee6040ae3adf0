import type { Interval } from '../../contract/primitives.ts';
import type { ClaimView } from '../../contract/project.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { textTable } from './text-table.ts';

/** The arithmetic line by line, the recomputed number and what is to be known about it. */
export function recomputationLines({ claim, recomputation, derivation }: ClaimView): string[] {
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
  if (!recomputation) return [...lines, '  not recomputed'];
  const { value, standardError, unit, interval, agreement, fit, working, caveats } = recomputation.answer;
  const error = standardError === null ? '' : ` ± ${formatNumber(standardError, { decimals: 4 })}`;
  const range = interval ? ` (${interval.levelPercent} %: ${intervalText(interval)})` : '';
  lines.push(`  ${formatNumber(value, { decimals: 4 })}${error} ${unit}${range}`, `  ${agreement.sentence}`);
  if (fit) {
    const { diagnostics } = fit;
    lines.push(
      `  R² centred ${formatNumber(diagnostics.rSquaredCentred, { decimals: 3 })}, uncentred ${formatNumber(diagnostics.rSquaredUncentred, { decimals: 3 })} · Durbin–Watson ${formatNumber(diagnostics.durbinWatson, { decimals: 2 })} · effective years ${formatNumber(diagnostics.effectiveSampleSize, { decimals: 1 })} of ${diagnostics.nObs} (Santer et al. 2000)`,
    );
  }
  for (const { caption, columns, rows } of working) {
    const cells = rows.map((row) => row.map((cell) => (typeof cell === 'number' ? formatNumber(cell) : (cell ?? '–'))));
    lines.push(`  ${caption}`, ...textTable([columns, ...cells]).map((line) => `    ${line}`));
  }
  return [...lines, ...caveats.map((caveat) => `  note: ${caveat.detail}`)];
}

/** The ledger with the weightiest assumption first, and the ladder. */
export function ledgerLines({ claim, assumptions }: ClaimView): string[] {
  if (!assumptions) return ['Not tested.'];
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
    ...textTable([['assumption', 'moves it to', 'weight', 'test'], ...rows]),
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
      ...textTable([
        ['as recomputed', formatNumber(value, { decimals: 2 }), intervalText(interval90), quantity],
        ...rungs,
      ]),
    );
  }
  return lines;
}

/** What a sweep over windows comes to. */
export function sweepLines({ sweep }: ClaimView): string[] {
  if (!sweep) return ['Not swept.'];
  const { valueQuantiles: q, windows, stated, unit, minYears, shareAtOrBelowStated } = sweep.answer;
  const number = (value: number) => formatNumber(value, { decimals: 2 });
  return [
    `${windows.length} windows of at least ${minYears} years, in ${unit}:`,
    `  lowest ${number(q.min)} · 5 % ${number(q.q05)} · middle ${number(q.q50)} · 95 % ${number(q.q95)} · highest ${number(q.max)}`,
    `  the stated window ${stated.window.start}–${stated.window.end} gives ${number(stated.value)}, percentile ${formatNumber(stated.percentile, { decimals: 0 })}`,
    `  ${formatNumber(100 * shareAtOrBelowStated, { decimals: 0 })} % of the windows lie at or below the stated number`,
  ];
}

function intervalText({ low, high }: Interval): string {
  return `${low === null ? 'unbounded' : formatNumber(low, { decimals: 2 })} to ${high === null ? 'unbounded' : formatNumber(high, { decimals: 2 })}`;
}
