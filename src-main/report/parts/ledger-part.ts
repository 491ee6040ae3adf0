import type { ReportClaim } from '../../contract/project.ts';
import { shortQuantity } from '../../figures/stem-layout.ts';
import {
  formatInterval,
  formatNumber,
  formatP,
  formatShare,
  formatWithUncertainty,
} from '../../quantities/notation.ts';
import { facts, html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { caveatsPart } from './caveats-part.ts';

type Entry = ReportClaim['ledger'][number];

/** Longer supporting tables are cut here, and say so. */
const mostRows = 30;

/** Every assumption that applies: its test, where it moves the number, and how the reviewer marked it. */
export function ledgerPart({ ledger, claim }: ReportClaim): Html {
  if (ledger.length === 0) {
    return html`<h2>Assumptions</h2>
      ${nothing('The assumptions have not been tested, or what was computed is out of date.')}${evidencePart(claim)}`;
  }
  const { notableShare, decisiveShare } = claim.tolerance;
  return html`<h2>Assumptions</h2>
    <p>
      A shift counts as notable from ${formatShare(notableShare)} and as decisive from ${formatShare(decisiveShare)} of
      the stated number, or when it crosses a stated limit. The marks are the reviewer’s.
    </p>
    ${table(
      'Ledger of assumptions',
      [
        { heading: 'The number needs' },
        { heading: 'Test' },
        { heading: 'Moves it to', isNumber: true },
        { heading: 'By', isNumber: true },
        { heading: 'Weight and mark' },
      ],
      ledger.map((entry) => ledgerRow(entry)),
      'ledger',
    )}
    ${ledger.map(supportingTable)} ${evidencePart(claim)}`;
}

function ledgerRow({ outcome, title, mark }: Entry): HtmlValue[] {
  const { alternative, missing, effect, statistic } = outcome;
  return [
    html`${title}
      <div class="quiet">${outcome.sentence}</div>
      ${caveatsPart(outcome.caveats)}`,
    missing
      ? html`Not tested: ${missing.reason}
          <div class="quiet">It would need ${missing.wouldNeed}</div>`
      : html`${outcome.test}${statistic ? html`<div class="quiet">${statisticText(statistic)}</div>` : null}`,
    alternative
      ? html`${formatNumber(alternative.value)}${alternative.interval ? html`<div class="quiet">${formatInterval(alternative.interval)}</div>` : null}
          <div class="quiet">${shortQuantity(alternative.quantity)}, ${alternative.unit}</div>`
      : '–',
    effect === null ? '–' : formatNumber(effect, { withSign: true }),
    html`<strong>${outcome.weight ?? 'no weight'}</strong>
      <div>${mark?.mark ?? 'untested'}</div>
      ${
        mark && mark.note !== '' ? html`<div class="quiet">${mark.note}</div>` : null
      }${mark ? null : html`<div class="quiet">not marked; proposed: ${outcome.proposal.mark}. ${outcome.proposal.reason}</div>`}`,
  ];
}

function statisticText({ label, value, p, interval, convention }: NonNullable<Entry['outcome']['statistic']>): string {
  const figures = [
    `${label} ${formatNumber(value)}`,
    ...(p === null ? [] : [formatP(p)]),
    ...(interval === null ? [] : [`${formatInterval(interval)} at ${interval.levelPercent} %`]),
  ];
  return `${figures.join(', ')}; ${convention}`;
}

function supportingTable({ outcome, title }: Entry): HtmlValue {
  if (outcome.table === null) return null;
  const { columns, rows } = outcome.table;
  const isNumber = columns.map((_, at) => rows.every((row) => typeof row[at] !== 'string'));
  const cut = rows.length - mostRows;
  return [
    table(
      `Figures behind “${title}”`,
      columns.map((heading, at) => ({ heading, isNumber: isNumber[at] ?? false })),
      rows
        .slice(0, mostRows)
        .map((row) => row.map((cell) => (typeof cell === 'number' ? numberText(cell) : (cell ?? '–')))),
      'small',
    ),
    cut > 0 ? html`<p class="quiet">${cut} more rows are in the data form of this report (report.json).</p>` : null,
  ];
}

function numberText(value: number): string {
  // Whole numbers are years or counts, and trailing zeros would claim digits that nobody gave.
  return String(Number.isInteger(value) ? value : Number(value.toPrecision(4))).replace('-', '−');
}

/** What the reviewer supplied so that assumptions could be tested. */
function evidencePart({ evidence }: ReportClaim['claim']): Html {
  const { energyBudget, doublingWm2, comparedWith } = evidence;
  const input = ({ mean, halfWidth90, source }: NonNullable<typeof doublingWm2>, unit: string) =>
    `${formatWithUncertainty(mean, halfWidth90, unit)} (5–95 %); ${source === '' ? 'no source given' : source}`;
  return html`<h3>Evidence supplied</h3>
    ${facts([
      ['Warming', energyBudget ? input(energyBudget.warmingK, 'K') : 'none given'],
      ['Forcing change', energyBudget ? input(energyBudget.forcingWm2, 'W/m²') : 'none given'],
      ['Heat uptake change', energyBudget ? input(energyBudget.uptakeWm2, 'W/m²') : 'none given'],
      ['CO₂ doubling', energyBudget ? input(energyBudget.doublingWm2, 'W/m²') : 'none given'],
      ['Doubling for slopes', doublingWm2 ? input(doublingWm2, 'W/m²') : 'none given'],
      ['Range compared with', comparedWith ?? 'the source names none'],
      [
        'Forcing series',
        evidence.totalForcingSeriesId === null ? 'none given' : `series ${evidence.totalForcingSeriesId}`,
      ],
    ])}`;
}
