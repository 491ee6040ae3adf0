import type { GregoryInput, GregoryLine } from '../contract/climate-response.ts';
import type { Caveat } from '../contract/primitives.ts';

/** Common practice: a line through fewer years rests on the noise of single ones. */
const FEW_YEARS = 20;
/** Differences of slopes that are no more than rounding. */
const ROUNDING = 1e-9;

/**
 * Doubts about a Gregory regression. The bounds are common practice.
 *
 * @returns  feedback-not-distinct; curved when the slopes of both parts differ by more than 1.96 of their combined standard
 *           errors; few-years; part-too-short
 *
 * Checked  test/unit/climate/gregory-caveats.test.ts (C: on and off at each bound)
 */
export function gregoryCaveats({
  line,
  early,
  late,
  split,
}: {
  line: GregoryLine;
  early: GregoryLine | null;
  late: GregoryLine | null;
  split: NonNullable<GregoryInput['split']>;
}): Caveat[] {
  const caveats: Caveat[] = [];
  const add = (isDoubtful: boolean, code: string, detail: string) => {
    if (isDoubtful) caveats.push({ code, detail });
  };
  add(
    line.equilibriumK === null,
    'feedback-not-distinct',
    `The feedback ${line.feedbackWm2PerK.toPrecision(3)} ± ${line.feedbackStandardErrorWm2PerK.toPrecision(2)} W m⁻² K⁻¹ cannot be told from none: the equilibrium is unbounded, so no number is given.`,
  );
  if (early && late) {
    const difference = early.feedbackWm2PerK - late.feedbackWm2PerK;
    const error = Math.hypot(early.feedbackStandardErrorWm2PerK, late.feedbackStandardErrorWm2PerK);
    add(
      Math.abs(difference) > Math.max(1.96 * error, ROUNDING * Math.abs(line.feedbackWm2PerK)),
      'curved',
      `The points bend: feedback ${early.feedbackWm2PerK.toFixed(2)} W m⁻² K⁻¹ in years ${split.early.from}–${split.early.to}, ${late.feedbackWm2PerK.toFixed(2)} in years ${split.late.from}–${split.late.to}. One line through all gives an effective sensitivity, ${difference > 0 ? 'below' : 'above'} the equilibrium.`,
    );
  } else {
    const lacking = [early ? [] : [split.early], late ? [] : [split.late]].flat();
    const spans = lacking.map(({ from, to }) => `${from}–${to}`).join(' and ');
    add(
      true,
      'part-too-short',
      `Too few points in years ${spans} for a line of their own: whether the feedback changes is not tested.`,
    );
  }
  add(
    line.nYears < FEW_YEARS,
    'few-years',
    `${line.nYears} years are few: an effective sensitivity is usually taken from 150.`,
  );
  return caveats;
}
