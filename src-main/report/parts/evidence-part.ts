import type { ReportClaim } from '../../contract/project.ts';
import type { UncertainInput } from '../../contract/uncertain-input.ts';
import { inputText } from '../../quantities/input-text.ts';
import { quotedRangeText } from '../../quantities/quoted-range-text.ts';
import { facts, html, type Html } from '../html.ts';

/** What the reviewer supplied so that assumptions could be tested. */
export function evidencePart({ claim, series, published }: ReportClaim): Html {
  const { energyBudget: budget, doublingWm2, comparedWith, quotedRange } = claim.evidence;
  const { totalForcingSeriesId, co2ForcingSeriesId } = claim.evidence;
  const seriesName = (id: number | null) =>
    id === null ? 'none given' : (series.find((one) => one.id === id)?.name ?? `series ${id}`);
  const compared = published.find(({ id }) => id === comparedWith)?.label ?? comparedWith;
  return html`<h3>Evidence supplied</h3>
    ${facts([
      ['Warming', givenText(budget?.warmingK, 'K')],
      ['Forcing change', givenText(budget?.forcingWm2, 'W/m²')],
      ['Heat uptake', givenText(budget?.uptakeWm2, 'W/m²')],
      ['CO₂ doubling', givenText(budget?.doublingWm2, 'W/m²')],
      ['… for slopes', givenText(doublingWm2, 'W/m²')],
      ['Total forcing', seriesName(totalForcingSeriesId)],
      ['CO₂ forcing', seriesName(co2ForcingSeriesId)],
      ['Compared with', compared ?? 'the source names no published range'],
      ['Range quoted', quotedRange ? quotedRangeText(quotedRange) : 'the source quotes none'],
    ])}`;
}

function givenText(input: UncertainInput | null | undefined, unit: string): string {
  if (!input) return 'none given';
  return `${inputText(input, unit)}; ${input.source === '' ? 'no source given' : input.source}`;
}
