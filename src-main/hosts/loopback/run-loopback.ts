import { errorSentence, isFootingError, type ErrorFields } from '../../errors.ts';
import type { Core } from '../../handlers/handle.ts';
import { readLaunchOptions } from '../launch-options.ts';
import { startLoopbackServer } from './loopback-server.ts';
import { onStopSignal } from './on-stop-signal.ts';
import { openBrowser } from './open-browser.ts';
import { openFirstProject } from '../open-first-project.ts';

export interface LoopbackOptions {
  createCore: () => Core;
  rendererDirectory: string;
  args: string[];
}

/** Footing in a browser of this machine. Resolves with the exit status; 0 while it goes on serving. */
export async function runLoopback({ createCore, rendererDirectory, args }: LoopbackOptions): Promise<number> {
  let options;
  try {
    // npm starts scripts in the package's folder and says here where the user is.
    options = readLaunchOptions(args, process.env['INIT_CWD'] ?? process.cwd());
  } catch (error) {
    if (isFootingError(error)) return fail(error.fields, 2);
    throw error;
  }
  const core = createCore();
  const problem = await openFirstProject(core, options);
  if (problem) {
    await core.close();
    return fail(problem, problem.kind === 'ProjectError' ? 3 : 2);
  }
  const server = await startLoopbackServer({ core, rendererDirectory });
  onStopSignal(async () => {
    await server.close();
    await core.close();
  });
  console.log(`Footing is at ${server.firstAddress} (for one browser, once; Ctrl-C ends it)`);
  if (options.isBrowserWanted) openBrowser(server.firstAddress);
  return 0;
}

function fail(fields: ErrorFields, exitStatus: number): number {
  console.error(errorSentence(fields));
  return exitStatus;
}
