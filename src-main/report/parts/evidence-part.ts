import type { UncertainInput } from '../../contract/claim.ts';
import type { ReportClaim } from '../../contract/project.ts';
import { formatWithUncertainty } from '../../quantities/notation.ts';
import { facts, html, type Html } from '../html.ts';

/** What the reviewer supplied so that assumptions could be tested. */
export function evidencePart({ claim, series, published }: ReportClaim): Html {
  const { energyBudget: budget, doublingWm2, comparedWith, totalForcingSeriesId, co2ForcingSeriesId } = claim.evidence;
  const seriesName = (id: number | null) =>
    id === null ? 'none given' : (series.find((one) => one.id === id)?.name ?? `series ${id}`);
  const compared = published.find(({ id }) => id === comparedWith)?.label ?? comparedWith;
  return html`<h3>Evidence supplied</h3>
    ${facts([
      ['Warming', inputText(budget?.warmingK, 'K')],
      ['Forcing change', inputText(budget?.forcingWm2, 'W/m²')],
      ['Heat uptake', inputText(budget?.uptakeWm2, 'W/m²')],
      ['CO₂ doubling', inputText(budget?.doublingWm2, 'W/m²')],
      ['… for slopes', inputText(doublingWm2, 'W/m²')],
      ['Total forcing', seriesName(totalForcingSeriesId)],
      ['CO₂ forcing', seriesName(co2ForcingSeriesId)],
      ['Compared with', compared ?? 'the source names no published range'],
    ])}`;
}

function inputText(input: UncertainInput | null | undefined, unit: string): string {
  if (!input) return 'none given';
  const source = input.source === '' ? 'no source given' : input.source;
  return `${formatWithUncertainty(input.mean, input.halfWidth90, unit)} (5–95 %); ${source}`;
}
