import type { Finding } from '../contract/finding.ts';
import type { ClaimView } from '../contract/project.ts';
import { InputError } from '../errors.ts';
import { fillIn } from './fill-in.ts';

/**
 * Refuses a sign-off on what is not finished: a finding must conclude something, in words whose figures exist, on
 * results that belong to the claim as it is, with every decisive assumption marked and nothing marked against it.
 */
export function refuseUnready(view: ClaimView, finding: Finding): void {
  const { claimId } = finding;
  const [problem] = [...wordProblems(view, finding), ...resultProblems(view, finding), ...markProblems(view, finding)];
  if (problem) throw notReady(claimId, problem.expected, problem.received, problem.hint);
}

export function notReady(claimId: number, expected: string, received: string, hint = ''): InputError {
  return new InputError({ code: 'not-ready-to-sign', where: `Finding on claim ${claimId}`, expected, received, hint });
}

interface Problem {
  expected: string;
  received: string;
  hint?: string;
}

function* wordProblems({ fillIns }: ClaimView, finding: Finding): Iterable<Problem> {
  if (!finding.conclusion) yield { expected: 'a conclusion', received: 'none chosen' };
  if (finding.text.trim() === '') yield { expected: 'the finding in words', received: 'an empty text' };
  if (finding.conclusion === 'supported on stated conditions' && finding.conditions.trim() === '') {
    yield { expected: 'the conditions on which the number is supported', received: 'none stated' };
  }
  const { unknown } = fillIn(finding.text, fillIns);
  if (unknown.length > 0) {
    yield {
      expected: 'names of figures that exist',
      received: `{${unknown.join('}, {')}}`,
      hint: `There are: ${Object.keys(fillIns).join(', ')}.`,
    };
  }
}

function* resultProblems(view: ClaimView, finding: Finding): Iterable<Problem> {
  const stored = [view.derivation, view.recomputation, view.assumptions, view.sweep, view.estimators];
  const nStale = stored.filter((one) => one?.isStale).length;
  if (nStale > 0) {
    yield {
      expected: 'results of the claim as it is now',
      received: `${nStale} from before its last change`,
      hint: 'Compute them again.',
    };
  }
  // Without data nothing can be computed, and the finding can say just that.
  if (finding.conclusion === 'cannot be determined') return;
  if (!view.recomputation)
    yield { expected: 'a recomputation', received: 'none', hint: 'Or conclude that it cannot be determined.' };
  if (!view.assumptions)
    yield {
      expected: 'the assumptions tested',
      received: 'no test',
      hint: 'Or conclude that it cannot be determined.',
    };
}

function* markProblems({ assumptions, marks }: ClaimView, finding: Finding): Iterable<Problem> {
  const decisive = (assumptions?.answer.outcomes ?? []).filter(({ weight }) => weight === 'decisive');
  const markOf = (id: string) => marks.find(({ assumptionId }) => assumptionId === id)?.mark;
  const unmarked = decisive.filter(({ id }) => markOf(id) === undefined);
  if (unmarked.length > 0) {
    yield {
      expected: 'your mark on every decisive assumption',
      received: `none on ${unmarked.map(({ id }) => id).join(', ')}`,
    };
  }
  const against = decisive.filter(({ id }) => markOf(id) === 'not met');
  if (finding.conclusion === 'supported' && against.length > 0) {
    yield {
      expected: 'a conclusion that agrees with your marks',
      received: `“supported”, with ${against.map(({ id }) => id).join(', ')} decisive and marked not met`,
      hint: 'State the conditions, conclude otherwise, or mark again and say why.',
    };
  }
}
