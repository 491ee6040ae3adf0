import fc from 'fast-check';
import { describe, expect, it, onTestFinished } from 'vitest';
import { rmSync } from 'node:fs';
import { isFootingError } from '../../src-main/errors.ts';
import type { RecordKind } from '../../src-main/contract/trail.ts';
import { checkSignatures } from '../../src-main/project/check-signatures.ts';
import { openProject } from '../../src-main/project/open-project.ts';
import type { Project } from '../../src-main/project/project.ts';
import { signFinding } from '../../src-main/project/sign-finding.ts';
import { verifyProject } from '../../src-main/project/verify-project.ts';
import {
  addClaim,
  addFinding,
  addResult,
  doing,
  emptyProject,
  holder,
  importSample,
  sampleSigner,
} from '../helpers/sample-project.ts';

const kinds = [
  'project',
  'source',
  'dataset',
  'series',
  'claim',
  'result',
  'mark',
  'note',
  'finding',
  'signature',
] as const satisfies RecordKind[];
type State = Record<string, unknown[]>;

function stateOf(project: Project): State {
  return Object.fromEntries(kinds.map((kind) => [kind, project.list(kind)]));
}

/** What a project should do about undo and redo: the states before and after each ordinary step, and nothing else. */
interface Model {
  undoable: { before: State; after: State }[];
  redoable: { before: State; after: State }[];
  hasSigned: boolean;
}
interface Real {
  project: Project;
}

class Step implements fc.Command<Model, Real> {
  readonly name: string;
  readonly pick: number;

  constructor(name: string, pick: number) {
    this.name = name;
    this.pick = pick;
  }

  check(): boolean {
    return true;
  }

  run(model: Model, real: Real): void {
    const before = stateOf(real.project);
    const head = real.project.head();
    if (this.name === 'undo' || this.name === 'redo') this.goBackOrForth(this.name, model, real, before);
    else {
      const isDone = this.attempt(real);
      const after = stateOf(real.project);
      if (!isDone || real.project.head().sequence === head.sequence) expect(after).toEqual(before);
      else if (this.name === 'sign') {
        model.hasSigned = true;
        model.redoable = [];
      } else {
        model.undoable.push({ before, after });
        model.redoable = [];
      }
    }
    expect(checkSignatures(real.project).every(({ isValid }) => isValid)).toBe(true);
  }

  /** Undo restores the state before the last step and redo the one after it, except across a signature. */
  goBackOrForth(name: 'undo' | 'redo', model: Model, { project }: Real, before: State): void {
    const [from, to] = name === 'undo' ? [model.undoable, model.redoable] : [model.redoable, model.undoable];
    const step = from.at(-1);
    const offered = project.undoState()[name];
    try {
      project[name](doing);
    } catch (error) {
      expect(isFootingError(error)).toBe(true);
      expect(offered).toBeNull();
      expect(step === undefined || model.hasSigned).toBe(true);
      expect(stateOf(project)).toEqual(before);
      return;
    }
    expect(offered).not.toBeNull();
    if (step === undefined) throw new Error(`${name} with nothing to ${name}`);
    from.pop();
    to.push(step);
    if (!model.hasSigned) expect(stateOf(project)).toEqual(name === 'undo' ? step.before : step.after);
  }

  /** Does it, or is refused for a stated reason. */
  attempt({ project }: Real): boolean {
    const claims = project.list('claim');
    const claimId = claims[this.pick % Math.max(1, claims.length)]?.id;
    const info = { ...doing, action: this.name, subject: String(claimId) };
    try {
      if (this.name === 'import') importSample(project, `file ${this.pick}`, Buffer.from(`bytes ${this.pick % 5}`));
      else if (this.name === 'add claim') addClaim(project, { seed: this.pick });
      else if (claimId === undefined) return false;
      else if (this.name === 'change claim') {
        project.command(info, (change) =>
          change.put('claim', { ...project.get('claim', claimId), seed: this.pick % 3 }),
        );
      } else if (this.name === 'remove claim') project.command(info, (change) => change.remove('claim', claimId));
      else if (this.name === 'recompute') project.command(info, (change) => addResult(change, claimId));
      else if (this.name === 'note') {
        project.command(info, (change) => {
          const note = change.add('note', { claimId, text: String(this.pick), author: '', writtenAt: doing.at });
          if (this.pick % 4 === 0) change.remove('note', note.id);
        });
      } else if (this.name === 'conclude') addFinding(project, claimId);
      else if (this.name === 'sign') {
        const finding = project.list('finding').find((row) => row.claimId === claimId);
        if (!finding) return false;
        signFinding(project, {
          ...doing,
          findingId: finding.id,
          meaning: 'sign-off',
          remark: '',
          signer: sampleSigner(1),
        });
      }
      return true;
    } catch (error) {
      if (!isFootingError(error)) throw error;
      return false;
    }
  }

  toString(): string {
    return `${this.name} ${this.pick}`;
  }
}

class Reopen extends Step {
  constructor(pick: number) {
    super('reopen', pick);
  }

  override run(_: Model, real: Real): void {
    const before = { state: stateOf(real.project), head: real.project.head(), undo: real.project.undoState() };
    const { path } = real.project;
    real.project.close();
    real.project = openProject(path, { holder });
    expect({ state: stateOf(real.project), head: real.project.head(), undo: real.project.undoState() }).toEqual(before);
  }
}

const names = [
  'import',
  'add claim',
  'change claim',
  'remove claim',
  'recompute',
  'note',
  'conclude',
  'sign',
  'undo',
  'undo',
  'undo',
  'redo',
  'redo',
];
const steps = (allowed: string[]) => [
  fc.tuple(fc.constantFrom(...allowed), fc.nat(50)).map(([name, pick]) => new Step(name, pick)),
  fc.nat(50).map((pick) => new Reopen(pick)),
];

describe('a project under any sequence of commands', () => {
  it.each([
    ['with signatures', names],
    ['without', names.filter((name) => name !== 'sign')],
  ])(
    '%s goes back and forth through its states, and its trail replays to its tables',
    (_, allowed) => {
      let last: Real | undefined;
      onTestFinished(() => last?.project.close());
      fc.assert(
        fc.property(fc.commands(steps(allowed), { maxCommands: 40 }), (commands) => {
          const real: Real = { project: emptyProject() };
          last = real;
          fc.modelRun(() => ({ model: { undoable: [], redoable: [], hasSigned: false }, real }), commands);
          const report = verifyProject(real.project.path);
          expect(report.problems).toEqual([]);
          expect(report.nEntries).toBe(real.project.head().sequence);
          real.project.close();
          rmSync(real.project.path);
        }),
        { seed: 20260102, numRuns: 25 },
      );
    },
    180_000,
  );
});
