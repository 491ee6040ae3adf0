import { homedir } from 'node:os';
import { join } from 'node:path';
import type { z } from 'zod';
import type { ProgressEvent } from '../contract/events.ts';
import { requestNames, type RequestName } from '../contract/request-names.ts';
import { requests, type Answer, type ErrorAnswer } from '../contract/requests.ts';
import type { JobRunner } from '../jobs/job.ts';
import { identityStore } from '../project/identity.ts';
import { checkInput } from './check-input.ts';
import { claimHandlers } from './claims.ts';
import { computeHandlers } from './compute.ts';
import type { Handler, HandlerContext, Handlers } from './context.ts';
import { dataHandlers } from './data.ts';
import { errorAnswer } from './error-answer.ts';
import { figureHandlers } from './figures.ts';
import { findingHandlers } from './findings.ts';
import { projectHandlers } from './projects.ts';
import { publishedHandlers } from './published.ts';
import { reportHandlers } from './reports.ts';
import { sessionHandlers } from './session.ts';
import { sourceHandlers } from './sources.ts';
import { trailHandlers } from './trail.ts';
import { createWorkspace } from './workspace.ts';

const handlers: Handlers = {
  ...sessionHandlers,
  ...projectHandlers,
  ...sourceHandlers,
  ...dataHandlers,
  ...claimHandlers,
  ...findingHandlers,
  ...publishedHandlers,
  ...trailHandlers,
  ...reportHandlers,
  ...figureHandlers,
  ...computeHandlers,
};

/** Everything that Footing can do, behind one door: a name, an unchecked input, an answer. Never throws. */
export interface Core {
  handle(name: string, input: unknown): Promise<Answer<RequestName>>;
  onProgress(listener: (event: ProgressEvent) => void): () => void;
  close(): Promise<void>;
}

export interface CoreOptions {
  host: HandlerContext['host'];
  jobs: JobRunner;
  /** The folder that holds the application itself, with its worked examples. */
  installation: string;
  /** Identity and projects of this reviewer; FOOTING_HOME or the user's own folder unless given. */
  home?: string;
  /** Stands in while nobody has said who is reviewing: for a host that cannot ask. */
  reviewerIfUnknown?: { name: string; role: string };
  now?: () => string;
}

export function createCore({
  host,
  jobs,
  installation,
  home,
  reviewerIfUnknown,
  now = () => new Date().toISOString(),
}: CoreOptions): Core {
  const root = home ?? process.env['FOOTING_HOME'] ?? join(homedir(), 'Footing');
  const places = { home: join(root, 'reviewer'), projects: root, demoProjects: join(installation, 'demo-projects') };
  const context: HandlerContext = {
    host,
    places,
    jobs,
    workspace: createWorkspace(identityStore(places.home), now, reviewerIfUnknown),
    now,
  };
  // A change is one synchronous step, so most requests need no order. Those that put one project in another's place do:
  // each waits for the one before, a worked example being filled included.
  let turn: Promise<unknown> = Promise.resolve();

  async function answer(name: string, input: unknown): Promise<Answer<RequestName>> {
    if (!isRequestName(name)) return { ok: false, error: unknownRequest(name) };
    const schema: z.ZodType = requests[name].input;
    const handler = handlers[name] as Handler<RequestName>;
    try {
      const checked = checkInput(name, schema, input);
      const run = () => handler(checked as never, context);
      if (!inTurn.has(name)) return { ok: true, value: await run() };
      const mine = turn.then(run);
      turn = mine.catch(() => undefined);
      return { ok: true, value: await mine };
    } catch (error) {
      return { ok: false, error: errorAnswer(error, name) };
    }
  }

  return {
    handle: answer,
    onProgress: (listener) => jobs.onProgress(listener),
    async close() {
      await jobs.close();
      await turn.catch(() => undefined);
      context.workspace.replace(null);
    },
  };
}

const inTurn = new Set<RequestName>(['project.create', 'project.open', 'project.openDemo', 'project.close']);

function isRequestName(name: string): name is RequestName {
  return (requestNames as readonly string[]).includes(name);
}

function unknownRequest(name: string): ErrorAnswer {
  return {
    kind: 'InputError',
    code: 'unknown-request',
    where: 'Request',
    expected: 'the name of a request of this version',
    received: JSON.stringify(name.slice(0, 80)),
    hint: 'footing schema lists all of them.',
  };
}
