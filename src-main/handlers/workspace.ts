import type { Reviewer } from '../contract/finding.ts';
import { engineVersion } from '../engine-version.ts';
import { InputError, ProjectError } from '../errors.ts';
import type { IdentityStore } from '../project/identity.ts';
import type { Change } from '../project/change-set.ts';
import type { Project } from '../project/project.ts';

/** A name and role for the trail where nobody has said who is reviewing. */
export interface StandIn {
  name: string;
  role: string;
}

/** The project that is open, and who is working on it. */
export interface Workspace {
  /** The open project, or null. */
  readonly project: Project | null;
  readonly identity: IdentityStore;
  /** The open project; refuses when there is none. */
  open(): Project;
  /** Puts another project in the open one's place; the stand-in reviews in it while nobody has said who is reviewing. */
  replace(project: Project | null, stand?: { standIn: StandIn }): void;
  /** Who is reviewing, as far as anybody has said. */
  knownReviewer(): Reviewer | null;
  /** Who is reviewing; refuses when nobody has said so. */
  reviewer(): Reviewer;
  /** Runs one command: its changes and its trail entry are stored together or not at all. */
  change<Value>(action: string, subject: string, work: (change: Change) => Value): Value;
  /** Who does what follows, when, and with which engine: what each trail entry carries. */
  signed(): { reviewer: { name: string; role: string }; at: string; engineVersion: string };
}

export function createWorkspace(
  identity: IdentityStore,
  now: () => string,
  reviewerIfUnknown: StandIn | null = null,
): Workspace {
  let project: Project | null = null;
  let standIn = reviewerIfUnknown;
  const workspace: Workspace = {
    identity,
    get project() {
      return project;
    },
    open() {
      if (project) return project;
      throw new ProjectError({
        code: 'no-project',
        where: 'Project',
        expected: 'an open project',
        received: 'none',
        hint: 'Open or create one first.',
      });
    },
    replace(next, stand) {
      project?.close();
      project = next;
      standIn = stand?.standIn ?? reviewerIfUnknown;
    },
    knownReviewer: () => identity.reviewer() ?? (standIn && { ...standIn, publicKey: null, fingerprint: null }),
    reviewer() {
      const reviewer = workspace.knownReviewer();
      if (reviewer) return reviewer;
      throw new InputError({
        code: 'no-reviewer',
        where: 'Reviewer',
        expected: 'the name of whoever is reviewing, since every entry of the trail carries it',
        received: 'no name yet',
        hint: 'Give your name on the start page, or with --reviewer on the command line.',
      });
    },
    signed() {
      const { name, role } = workspace.reviewer();
      return { reviewer: { name, role }, at: now(), engineVersion };
    },
    change: (action, subject, work) => workspace.open().command({ ...workspace.signed(), action, subject }, work),
  };
  return workspace;
}
