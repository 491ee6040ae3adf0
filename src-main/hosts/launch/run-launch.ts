import { errorSentence, isFootingError } from '../../errors.ts';
import { displayProblem } from '../display-problem.ts';
import { electronRuntime } from './electron-runtime.ts';
import { launchArguments, readLaunchOptions } from '../launch-options.ts';
import { startElectron } from './start-electron.ts';

export interface LaunchPlan {
  args: string[];
  /** The folder that holds the application's package.json. */
  application: string;
  /** Takes over when there is no Electron to start. */
  runInBrowser: () => Promise<unknown>;
}

/** Starts the window where it can be shown, and says in one line why not where it cannot. Resolves with the exit status. */
export async function runLaunch({ args, application, runInBrowser }: LaunchPlan): Promise<number | undefined> {
  let options;
  try {
    options = readLaunchOptions(args, process.env['INIT_CWD'] ?? process.cwd());
  } catch (error) {
    if (!isFootingError(error)) throw error;
    console.error(errorSentence(error.fields));
    return 2;
  }
  const program = electronRuntime();
  let reason = program === null ? 'its runtime is not installed' : (displayProblem() ?? rootProblem());
  if (program !== null && reason === null) {
    const outcome = await startElectron(program, application, launchArguments(options));
    if (outcome.hasStarted) return outcome.exitCode;
    reason = outcome.reason;
  }
  console.log(`Electron does not start here (${reason}); Footing runs in the browser instead.`);
  await runInBrowser();
  return undefined;
}

/** Chromium runs as root only without its sandbox, and Footing does not run without it. */
function rootProblem(): string | null {
  return process.platform === 'linux' && process.getuid?.() === 0 ? 'it must not run as root' : null;
}
