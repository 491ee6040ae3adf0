import type { ClaimView } from '../contract/project.ts';

type Sections = ClaimView['sections'];
type State = Sections['statement'];

/** How far each section of a sheet has come, read from what is there. */
export function sectionStates(view: Omit<ClaimView, 'sections'>): Sections {
  const { claim, questions, derivation, recomputation, estimators, assumptions, sweep, marks, findings } = view;
  const computed = (stored: { isStale: boolean } | null): State =>
    !stored ? 'untouched' : stored.isStale ? 'in progress' : 'done';
  const marked = new Set(marks.map((mark) => mark.assumptionId));
  const isEveryWeightyOneMarked = (assumptions?.answer.outcomes ?? []).every(
    (outcome) => outcome.weight === null || outcome.weight === 'negligible' || marked.has(outcome.id),
  );
  const finding = findings.at(-1);
  return {
    statement: questions.every((question) => question.answer !== null) ? 'done' : 'in progress',
    arithmetic:
      claim.derivation.length === 0 ? 'untouched' : derivation && !derivation.isStale ? 'done' : 'in progress',
    data: view.obstacles.length === 0 ? 'done' : claim.procedure ? 'in progress' : 'untouched',
    recomputation: estimators?.isStale && recomputation ? 'in progress' : computed(recomputation),
    assumptions: computed(assumptions) === 'done' && !isEveryWeightyOneMarked ? 'in progress' : computed(assumptions),
    robustness: computed(sweep),
    finding: finding?.isSigned ? 'done' : finding ? 'in progress' : 'untouched',
  };
}
