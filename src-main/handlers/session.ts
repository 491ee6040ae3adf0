import { engineVersion } from '../engine-version.ts';
import type { Handlers } from './context.ts';
import { projectView } from './project-view.ts';

export const sessionHandlers: Handlers<'session.get' | 'reviewer.set' | 'identity.create' | 'job.cancel'> = {
  'session.get': (_, { workspace, places, host }) => ({
    project: workspace.project ? projectView(workspace.project) : null,
    reviewer: workspace.knownReviewer(),
    engineVersion,
    host,
    projectsDirectory: places.projects,
  }),
  'reviewer.set': (input, { workspace }) => workspace.identity.setReviewer(input),
  'identity.create': ({ passphrase }, { workspace }) => workspace.identity.createKey(passphrase),
  'job.cancel': ({ jobId }, { jobs }) => ({ wasRunning: jobs.cancel(jobId) }),
};
