import type { ClaimView } from '../../contract/project.ts';
import { decimalsFor, formatNumber, formatP } from '../../quantities/notation.ts';
import { textTable } from './text-table.ts';

/** The number under each estimator with the stated one above, its convention below, and the tests of the residuals. */
export function estimatorsLines({ claim, estimators }: ClaimView): string[] {
  if (!estimators) return ['Not compared.'];
  const { unit, nObs, window, stated, estimates, notComputed, gaps, residualTests, testsMissing, caveats } =
    estimators.answer;
  const { bound, value: printed } = claim.statement;
  // The smallest error decides how many digits all rows show.
  const decimals = Math.max(
    1,
    ...estimates.map(({ standardError }) => (standardError ? decimalsFor(standardError) : 0)),
  );
  const rows = estimates.map(({ label, value, standardError, interval95, isOwn }) => {
    const number = (figure: number | null, withSign = false) =>
      figure === null ? 'unbounded' : formatNumber(figure, { decimals, withSign });
    return [
      isOwn ? `${label} (own)` : label,
      number(value),
      standardError === null ? '–' : number(standardError),
      interval95 ? `${number(interval95.low)} to ${number(interval95.high)}` : '–',
      number(value - stated.value, true),
    ];
  });
  const conventions = estimates.flatMap(({ label, convention, parameters, caveats: doubts }) => [
    `  ${label}: ${[convention, ...parameters.map(({ symbol, value }) => `${symbol} = ${formatNumber(value)}`)].join('; ')}`,
    ...doubts.map(({ detail }) => `    note: ${detail}`),
  ]);
  const tests = residualTests.flatMap(({ label, statistic, df, p, convention, caveats: doubts }) => [
    `  ${label} ${formatNumber(statistic, { decimals: 2 })}${df === null ? '' : `, ${df} df`}${p === null ? '' : `, ${formatP(p)}`}: ${convention}`,
    ...doubts.map(({ detail }) => `    note: ${detail}`),
  ]);
  return [
    `claim ${claim.id}  ${claim.title}`,
    `stated ${bound === 'equals' ? '' : `${bound} `}${printed}; ${nObs} years, ${window.start}–${window.end}; in ${unit}`,
    ...textTable([['estimator', 'number', '± 1 s.e.', '95 %', 'minus stated'], ...rows]),
    '',
    gaps.sentence,
    ...caveats.map(({ detail }) => `note: ${detail}`),
    ...notComputed.map(({ labels, reason }) => `no number by ${labels.join(' and ')}: ${reason}`),
    'Conventions:',
    ...conventions,
    testsMissing ? `The residuals have not been tested. ${testsMissing}` : 'Tests of the residuals:',
    ...tests,
  ];
}
