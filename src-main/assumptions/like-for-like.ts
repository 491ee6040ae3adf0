import type { Interval, PublishedQuantityId, QuantityId } from '../contract/primitives.ts';
import type { PublishedValue } from '../contract/finding.ts';
import type { AssumptionOutcome } from '../contract/result.ts';
import { formatInterval, formatNumber } from '../quantities/notation.ts';
import { publishedFor } from '../quantities/published-values.ts';
import { publishedQuantityNames, sensitivities } from '../quantities/quantity-names.ts';
import { interval90 } from '../robustness/ladder.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { comparedValue } from './compared-value.ts';
import { footingOf, numberOnFooting } from './footing.ts';
import { heatUptakeRatio } from './heat-uptake-ratio.ts';
import { isEquilibrium, ownQuantity, presentedQuantity } from './presented-quantity.ts';
import type { TestContext } from './test-context.ts';
import { weightWords } from './weigh.ts';

/**
 * The number is compared with the same quantity. Between a number for a planet taking up heat and one for a planet
 * that has stopped, the energy budget converts both ways by ΔF/(ΔF − ΔN). Between effective and equilibrium
 * sensitivity lies the pattern effect, and between an apparent sensitivity and TCR lie the other forcings: no factor
 * stands for those here.
 */
export const likeForLike: Assumption = {
  id: 'like-for-like',
  group: 'What the slope stands for',
  title: 'The number is compared with the same quantity',
  shortTitle: 'Like with like',
  explanation:
    'Transient response, effective and equilibrium sensitivity, and the slope of a record are four different numbers for one and the same planet. Holding one against the range of another proves nothing.',
  method:
    'Names the quantity that the procedure gives, the one it is presented as and the one it is held against, lists the published ranges of each, and converts both ways where the energy budget allows.',
  formula: 'effective = transient · ΔF/(ΔF − ΔN); transient = effective · (ΔF − ΔN)/ΔF',
  needs:
    'What the number is presented as, or the published range it is held against; an energy budget for the conversion.',
  source: 'AR6 WG1 glossary and §7.5 for the quantities; Gregory et al. 2002 for the conversion',

  applies: () => true,

  test(context) {
    const { computation, recomputation } = context;
    const own = ownQuantity(computation, recomputation);
    const presented = presentedQuantity(computation, recomputation);
    const compared = comparedValue(computation);
    if (presented === null && compared === null) {
      return untestable(likeForLike, {
        reason: 'The statement does not say what kind of number this is, nor what it is held against.',
        wouldNeed:
          'Under Statement, say what it is presented as; or under Assumptions, choose the published range it is compared with.',
      });
    }
    const others = [...new Set([presented, compared?.quantity ?? null])].filter((q) => q !== null && q !== own);
    const [target] = others.filter((quantity) => quantity !== null);
    const ownLabel = publishedQuantityNames[own].label;
    const table = publishedTable([own, ...(presented ? [presented] : []), ...(compared ? [compared.quantity] : [])]);
    const comparedText = compared
      ? ` It is held against ${compared.label} (${publishedQuantityNames[compared.quantity].label}).`
      : '';
    if (target === undefined) {
      const reason = `The number is ${withArticle(ownLabel)} and is ${presented ? 'presented as' : 'held against'} one.`;
      return outcome('like-for-like', {
        test: `${ownLabel}, like with like`,
        reading: reason + comparedText,
        proposal: { mark: 'met', reason },
        sentence: reason + comparedText,
        table,
      });
    }
    const targetLabel = publishedQuantityNames[target].label;
    const role = presented === target ? 'presented as' : 'held against';
    const mismatch = `The number is ${withArticle(ownLabel)} and is ${role} ${withArticle(targetLabel)}.`;
    const conversion = converted(context, own, target);
    const published = publishedText(context, compared ?? best(target), conversion?.ratio ?? null);
    const effect = conversion ? conversion.value - recomputation.value : null;
    const weight = conversion ? context.weigh(conversion.value) : null;
    const conversionText = conversion
      ? ` Converted by the energy budget (× ${formatNumber(conversion.factor, { decimals: 2 })}) it is ${context.showWithUnit(conversion.value)}${conversion.interval ? ` (${formatInterval(conversion.interval)}, 5–95 %)` : ''} as ${conversion.label}${weight ? `, ${weightWords[weight]}` : ''}.`
      : ` ${whyNotConverted(own, target)}`;
    return outcome('like-for-like', {
      test: `${ownLabel} ${role} ${targetLabel}`,
      alternative: conversion && {
        value: conversion.value,
        interval: conversion.interval,
        quantity: conversion.quantity,
        unit: recomputation.unit,
        label: `converted to ${conversion.label}`,
      },
      effect,
      weight,
      reading: mismatch + comparedText + conversionText + published + remainder(conversion?.quantity ?? null, target),
      proposal:
        weight === 'negligible'
          ? { mark: 'met', reason: `${mismatch} The conversion between them is negligible here.` }
          : { mark: 'not met', reason: `${mismatch} They are different quantities.` },
      sentence: mismatch + conversionText + published,
      table,
    });
  },
};

/** The first entry of a quantity is its current assessment. */
function best(quantity: PublishedQuantityId): PublishedValue | null {
  return publishedFor(quantity)[0] ?? null;
}

interface Conversion {
  value: number;
  interval: Interval | null;
  factor: number;
  /** ΔF/(ΔF − ΔN). */
  ratio: number;
  quantity: QuantityId;
  label: string;
}

/** The number as the other kind of quantity, as far as heat uptake makes the difference; null where nothing converts. */
function converted(context: TestContext, own: QuantityId, target: PublishedQuantityId): Conversion | null {
  const { computation, recomputation, draws } = context;
  const { evidence, procedure } = computation;
  if (!evidence.energyBudget || !sensitivities.includes(own) || !sensitivities.includes(target)) return null;
  if (isEquilibrium(own) === isEquilibrium(target)) return null;
  const ratio = heatUptakeRatio(evidence, draws);
  if (!Number.isFinite(ratio.value)) return null;
  const isRising = isEquilibrium(target);
  const factor = isRising ? ratio.value : 1 / ratio.value;
  const quantity: QuantityId = isRising ? 'effective-climate-sensitivity' : 'transient-climate-response';
  const drawn =
    procedure.kind === 'log-regression'
      ? numberOnFooting(context, { ...footingOf(procedure), countsHeatUptake: true }, draws).draws
      : ratio.draws.map((value) => recomputation.value * (isRising ? value : 1 / value));
  return {
    value: recomputation.value * factor,
    interval: interval90(drawn),
    factor,
    ratio: ratio.value,
    quantity,
    label: publishedQuantityNames[quantity].label,
  };
}

function whyNotConverted(own: QuantityId, target: PublishedQuantityId): string {
  if (isEquilibrium(own) && isEquilibrium(target)) {
    return 'Between the two lies the change of feedback with the pattern of warming; no conversion is made.';
  }
  if (!sensitivities.includes(own) || !sensitivities.includes(target)) return 'There is no conversion between them.';
  if (isEquilibrium(own) === isEquilibrium(target)) {
    return 'Between the two lie the forcings other than CO₂; see that assumption for the number on all forcings.';
  }
  return 'With an energy budget the number could be converted.';
}

/** The published range beside the number, and converted back to the number's own kind. */
function publishedText({ recomputation }: TestContext, value: PublishedValue | null, ratio: number | null): string {
  const range = value?.ranges.at(-1);
  if (!value || !range) return '';
  const { low, high } = range.interval;
  const text = ` Published in ${value.edition}: ${value.label}, ${range.words}, ${formatInterval(range.interval, value.unit)}`;
  if (ratio === null || recomputation.unit !== value.unit) return `${text}.`;
  const factor = isEquilibrium(value.quantity) ? 1 / ratio : ratio;
  const back = { low: low === null ? null : low * factor, high: high === null ? null : high * factor };
  const kind = isEquilibrium(value.quantity) ? 'a transient number' : 'an effective sensitivity';
  return `${text}; as ${kind} by the same budget ${formatInterval(back, value.unit)}.`;
}

function remainder(reached: QuantityId | null, target: PublishedQuantityId): string {
  return reached === 'effective-climate-sensitivity' && target === 'equilibrium-climate-sensitivity'
    ? ' Between effective and equilibrium sensitivity remains the change of feedback with the pattern of warming.'
    : '';
}

function publishedTable(quantities: readonly PublishedQuantityId[]): AssumptionOutcome['table'] {
  const rows = [...new Set(quantities)].flatMap((quantity) => {
    const values = publishedFor(quantity);
    const { label } = publishedQuantityNames[quantity];
    if (values.length === 0) return [[label, 'no published assessment', null, null, null, null]];
    return values.flatMap(({ label: name, best: central, ranges, edition }) =>
      ranges.map(({ interval, words }) => [label, name, edition, central, formatInterval(interval), words]),
    );
  });
  return { columns: ['Quantity', 'Published', 'Edition', 'Best', 'Range', 'Level'], rows };
}

function withArticle(label: string): string {
  return `${/^[aeiou]/.test(label) ? 'an' : 'a'} ${label}`;
}
