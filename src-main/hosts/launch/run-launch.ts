import { errorSentence, isFootingError } from '../../errors.ts';
import { launchArguments, readLaunchOptions, type LaunchOptions } from '../launch-options.ts';
import { startElectron } from './start-electron.ts';
import { usableElectron } from './usable-electron.ts';

export interface LaunchPlan {
  args: string[];
  /** The folder that holds the application's package.json. */
  application: string;
  /** Takes over when there is no Electron to start. */
  runInBrowser: () => Promise<unknown>;
}

/**
 * Starts the window where it can be shown, and says in one line why not where it cannot. Resolves with the exit
 * status; with undefined when the browser's host has taken over.
 */
export async function runLaunch({ args, application, runInBrowser }: LaunchPlan): Promise<number | undefined> {
  let options: LaunchOptions;
  try {
    // npm starts scripts in the package's folder and says here where the user is.
    options = readLaunchOptions(args, process.env['INIT_CWD'] ?? process.cwd());
  } catch (error) {
    if (!isFootingError(error)) throw error;
    console.error(errorSentence(error.fields));
    return 2;
  }
  const electron = usableElectron();
  const outcome = electron.isUsable
    ? await startElectron(electron.program, application, launchArguments(options))
    : { hasStarted: false as const, problem: electron.problem };
  if (outcome.hasStarted) return outcome.exitCode;
  console.log(`Electron does not start here (${outcome.problem}); Footing runs in the browser instead.`);
  await runInBrowser();
  return undefined;
}
