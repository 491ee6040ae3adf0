import type { RequestAnswer, RequestInput } from '../contract/requests.ts';
import type { RequestName } from '../contract/request-names.ts';
import type { JobRunner } from '../jobs/job.ts';
import type { Workspace } from './workspace.ts';

/** Where things are on this machine. */
export interface Places {
  /** The reviewer's identity and settings; outside every project. */
  home: string;
  /** Where new projects go unless another folder is named. */
  projects: string;
  /** The worked examples that come with the application. */
  demoProjects: string;
}

/** What every handler is given. */
export interface HandlerContext {
  host: 'electron' | 'loopback' | 'command line';
  places: Places;
  jobs: JobRunner;
  workspace: Workspace;
  /** UTC, to the millisecond. */
  now(): string;
}

export type Handler<Name extends RequestName> = (
  input: RequestInput<Name>,
  context: HandlerContext,
) => RequestAnswer<Name> | Promise<RequestAnswer<Name>>;

export type Handlers<Names extends RequestName = RequestName> = { [Name in Names]: Handler<Name> };
