import type { ReportClaim } from '../../contract/project.ts';
import { shortQuantity } from '../../figures/stem-layout.ts';
import { formatInterval, formatNumber, formatP, formatShare, withUnit } from '../../quantities/notation.ts';
import { facts, html, nothing, table, type Html, type HtmlValue } from '../html.ts';
import { capitalised } from '../words.ts';
import { alternativePart } from './alternative-part.ts';
import { caveatsPart } from './caveats-part.ts';
import { evidencePart } from './evidence-part.ts';

type Entry = ReportClaim['ledger'][number];

/** Longer supporting tables are cut here, and say so. */
const mostRows = 12;

/** Every assumption that applies: at a glance, then one by one with its test, its figures and the reviewer's note. */
export function ledgerPart(claim: ReportClaim): Html {
  const { ledger } = claim;
  if (ledger.length === 0) {
    return html`<h2>Assumptions</h2>
      ${nothing('The assumptions have not been tested, or what was computed is out of date.')} ${evidencePart(claim)}`;
  }
  const { notableShare, decisiveShare } = claim.claim.tolerance;
  return html`<h2>Assumptions</h2>
    <p>
      A shift counts as notable from ${formatShare(notableShare)} and as decisive from ${formatShare(decisiveShare)} of
      the stated number, or when it crosses a stated limit. The marks are the reviewer’s.
    </p>
    ${table(
      null,
      [
        { heading: 'The number needs' },
        { heading: 'Moves it to', isNumber: true },
        { heading: 'By', isNumber: true },
        { heading: 'Quantity' },
        { heading: 'Weight' },
        { heading: 'Marked' },
      ],
      ledger.map(({ outcome, title, mark }) => [
        title,
        alternativePart(outcome.alternative),
        outcome.effect === null ? '–' : formatNumber(outcome.effect, { withSign: true, significantDigits: 2 }),
        outcome.alternative ? shortQuantity(outcome.alternative.quantity) : '–',
        outcome.weight ?? 'none',
        mark?.mark ?? 'untested',
      ]),
      'ledger',
    )}
    ${ledger.map(entryPart)} ${evidencePart(claim)}`;
}

function entryPart({ outcome, title, mark }: Entry): Html {
  const { missing, statistic, alternative } = outcome;
  const proposal = `${outcome.proposal.mark}: ${outcome.proposal.reason}`;
  return html`<section>
    <h3>${title}</h3>
    <p>${outcome.sentence}</p>
    ${facts([
      missing
        ? ['Not tested', html`${missing.reason} <span class="quiet">It would need ${missing.wouldNeed}</span>`]
        : ['Test', outcome.test],
      ...(statistic ? [['Figure', statisticText(statistic)] as const] : []),
      ...(alternative
        ? [['Changed', `${alternative.label}: ${withUnit(formatNumber(alternative.value), alternative.unit)}`] as const]
        : []),
      [
        'Marked',
        mark ? capitalised(mark.mark) + (mark.note === '' ? ', without a note' : `. ${mark.note}`) : 'not yet',
      ],
      ...(mark ? [] : [['Proposed', proposal] as const]),
    ])}
    ${caveatsPart(outcome.caveats)} ${supportingTable(outcome.table)}
  </section>`;
}

function statisticText({ label, value, p, interval, convention }: NonNullable<Entry['outcome']['statistic']>): string {
  const figures = [
    `${label} ${formatNumber(value)}`,
    ...(p === null ? [] : [formatP(p)]),
    ...(interval === null ? [] : [`${formatInterval(interval)} (${withUnit(String(interval.levelPercent), '%')})`]),
  ];
  return `${figures.join(', ')}; ${convention}`;
}

function supportingTable(figures: Entry['outcome']['table']): HtmlValue {
  if (figures === null) return null;
  const { columns, rows } = figures;
  const cut = rows.length - mostRows;
  return [
    table(
      null,
      columns.map((heading, at) => ({ heading, isNumber: rows.every((row) => typeof row[at] !== 'string') })),
      rows.slice(0, mostRows).map((row) => row.map(cellText)),
      'small',
    ),
    cut > 0 ? html`<p class="quiet">${cut} more rows are in the data form of this report (report.json).</p>` : null,
  ];
}

function cellText(cell: string | number | null): string {
  if (typeof cell !== 'number') return cell ?? '–';
  // Whole numbers are years or counts, and trailing zeros would claim digits that nobody gave.
  if (Number.isInteger(cell)) return String(cell).replace('-', '−');
  return Math.abs(cell) < 1e-4
    ? formatNumber(cell, { significantDigits: 2 })
    : String(Number(cell.toPrecision(4))).replace('-', '−');
}
