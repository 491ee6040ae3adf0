import { catalogueEntries } from '../assumptions/catalogue.ts';
import type { Claim } from '../contract/claim.ts';
import type { StemFigure } from '../contract/figure.ts';
import type { PublishedValue } from '../contract/finding.ts';
import type { QuantityId } from '../contract/primitives.ts';
import type { AssumptionsAnswer, Recomputation } from '../contract/result.ts';
import { quantityNames } from '../quantities/quantity-names.ts';
import { statedInterval, statedValue } from '../quantities/stated-number.ts';

const fahrenheitPerKelvin = 1.8;

/** Assessed ranges that a reader of a stem should have before his eyes. */
const bandQuantities: Readonly<Record<string, QuantityId>> = {
  'ar6-tcr': 'transient-climate-response',
  'ar6-ecs': 'equilibrium-climate-sensitivity',
};

/** The stem of a sheet: what is stated, what comes out, and where each changed assumption moves it. */
export function stemOf(
  claim: Claim,
  recomputation: Recomputation | null,
  assumptions: AssumptionsAnswer | null,
  published: readonly PublishedValue[],
  digests: string[],
): StemFigure {
  const { value, unit, bound } = claim.statement;
  const rows = rowsOf(assumptions, claim);
  return {
    kind: 'stem',
    name: `claim-${claim.id}-stem`,
    title: claim.title,
    caption: captionOf(rows, recomputation),
    digests,
    unit,
    stated: {
      text: bound === 'equals' ? `Stated, ${value}` : `Stated, ${bound} ${value}`,
      value: statedValue(value),
      bound,
      interval: statedInterval(value),
    },
    recomputed: recomputation && { value: recomputation.value, interval: recomputation.interval },
    rows,
    bands: bandsOf(published, unit),
  };
}

function rowsOf(assumptions: AssumptionsAnswer | null, claim: Claim): StemFigure['rows'] {
  if (!assumptions) return [];
  if (assumptions.ladder && assumptions.ladder.rungs.length > 0) {
    return assumptions.ladder.rungs.map(({ label, value, interval90, quantity }) => ({
      label,
      value,
      interval: interval90,
      quantity,
      isCumulative: true,
    }));
  }
  return assumptions.outcomes.flatMap(({ id, alternative }) =>
    alternative && alternative.unit === claim.statement.unit
      ? [
          {
            label: catalogueEntries.find((entry) => entry.id === id)?.shortTitle ?? id,
            value: alternative.value,
            interval: alternative.interval,
            quantity: alternative.quantity,
            isCumulative: false,
          },
        ]
      : [],
  );
}

/** Likely ranges of sensitivities, on axes where they mean something. */
function bandsOf(published: readonly PublishedValue[], unit: Claim['statement']['unit']): StemFigure['bands'] {
  const factor = unit === 'K per doubling' ? 1 : unit === '°F per doubling' ? fahrenheitPerKelvin : null;
  if (factor === null) return [];
  return published.flatMap(({ id, ranges }) => {
    const quantity = bandQuantities[id];
    if (quantity === undefined) return [];
    return ranges
      .filter(({ interval }) => interval.levelPercent === 66 && interval.low !== null && interval.high !== null)
      .map(({ interval }) => ({
        label: `${quantityNames[quantity].symbol}, likely (AR6)`,
        low: (interval.low ?? 0) * factor,
        high: (interval.high ?? 0) * factor,
        quantity,
      }));
  });
}

function captionOf(rows: StemFigure['rows'], recomputation: Recomputation | null): string {
  if (!recomputation) return 'The stated number with its rounding interval. Nothing has been recomputed yet.';
  const level = recomputation.interval && `${recomputation.interval.levelPercent} %`;
  if (rows.length === 0) {
    const range = level ? ` with its ${level} interval` : '';
    return `The stated number with its rounding interval, and the recomputed one${range}.`;
  }
  const order = rows[0]?.isCumulative
    ? 'Each row applies one more change to the row above it'
    : 'Each row changes one assumption';
  const equilibrium = rows.filter((row) => row.quantity === 'effective-climate-sensitivity').length;
  const kinds =
    equilibrium === 0
      ? 'All rows are slopes of the record so far.'
      : `The last ${equilibrium === 1 ? 'row is an effective sensitivity' : `${equilibrium} rows are effective sensitivities`}, to be held against equilibrium ranges; the rows above are slopes of the record so far.`;
  return `${order}; bars are 5–95 %${level ? `, that of the recomputed number ${level}` : ''}. ${kinds}`;
}
