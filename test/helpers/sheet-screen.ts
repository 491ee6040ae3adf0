import { defineComponent, h, type Component } from 'vue';
import type { ClaimView, Session } from '../../src-main/contract/project.ts';
import { statementQuestions } from '../../src-main/quantities/statement-questions.ts';
import { provideClaimSheet } from '../../src-renderer/sheet/use-claim-sheet.ts';
import { inventedClaim } from '../unit/report/invented-report.ts';
import type { FakeHost } from './fake-host.ts';
import { inventedProject } from './invented-project.ts';
import { mountScreen, type Screen } from './mount-screen.ts';

/** The sheet of an invented claim: recomputed, tested and swept, with an unsigned finding. */
export function inventedSheet(change: Partial<ClaimView> = {}): ClaimView {
  const { claim, recomputation, derivation, ladder, ledger, sweep, results, published, finding, notes } = inventedClaim;
  const [result] = results;
  const stored = <Answer>(answer: Answer | null) => (answer && result ? { result, answer, isStale: false } : null);
  return {
    claim,
    sections: {
      statement: 'in progress',
      arithmetic: 'done',
      data: 'done',
      recomputation: 'done',
      assumptions: 'in progress',
      robustness: 'done',
      finding: 'untouched',
    },
    questions: statementQuestions(claim.statement, claim.answers),
    statedValue: 1.9,
    derivation: stored(derivation),
    recomputation: stored(recomputation),
    assumptions: stored({ outcomes: ledger.map(({ outcome }) => outcome), ladder }),
    sweep: stored(sweep),
    estimators: null,
    obstacles: [],
    procedureSeriesIds: [1, 2],
    marks: ledger.flatMap(({ mark }) => mark ?? []),
    notes,
    findings: finding ? [{ ...finding, revision: 1, reason: '', isSigned: false }] : [],
    signatures: [],
    signatureChecks: [],
    stem: null,
    figures: { fit: null, residuals: null, lag: null, autocorrelation: null, quantiles: null, sweep: null },
    catalogue: [],
    published,
    publishedBudget: {
      warmingK: { best: 1.01, low: 0.9, high: 1.12, levelPercent: 90, source: 'an invented edition' },
      forcingWm2: { best: 2.02, low: 1.8, high: 2.24, levelPercent: 90, source: 'an invented edition' },
      uptakeWm2: { best: 0.33, low: 0.3, high: 0.36, levelPercent: 90, source: 'an invented edition' },
      doublingWm2: { best: 4.04, low: 3.6, high: 4.48, levelPercent: 90, source: 'an invented edition' },
    },
    fillIns: { recomputed: '1.87 ± 0.07 K per doubling', stated: '1.9 K per doubling' },
    trail: [
      {
        sequence: inventedProject.head.sequence,
        at: '2031-03-03T14:06:00.000Z',
        reviewer: { name: 'I. Okonedo', role: 'reviewer' },
        action: 'recompute',
        subject: 'claim 1',
        engineVersion: '0.1.0',
        undoes: null,
        hash: inventedProject.head.hash,
        claimIds: [1],
        isUndone: false,
        canUndo: true,
      },
    ],
    isFrozen: false,
    ...change,
  };
}

interface SheetOptions {
  view?: ClaimView;
  props?: Record<string, unknown>;
  session?: Partial<Session>;
  prepare?: (host: FakeHost) => void;
}

/** Puts one part of a sheet on the page. Changes of the claim are answered as the core would. */
export function mountOnSheet(part: Component, options: SheetOptions = {}): Promise<Screen> {
  let view = options.view ?? inventedSheet();
  const sheet = defineComponent({
    setup() {
      const { view: shown } = provideClaimSheet(view.claim.id);
      return () => (shown.value ? h(part, options.props) : null);
    },
  });
  return mountScreen(sheet, {
    session: options.session,
    stubs: ['FigurePanel'],
    prepare(host) {
      host.reply('claim.view', () => view);
      host.reply('claim.update', ({ change }) => (view = { ...view, claim: { ...view.claim, ...change } }));
      options.prepare?.(host);
    },
  });
}
