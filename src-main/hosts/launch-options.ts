import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { InputError } from '../errors.ts';

export interface LaunchOptions {
  /** Opens the worked example. */
  isDemo: boolean;
  /** The project file to open, absolute; null for the start screen. */
  projectPath: string | null;
  /** Opens the system's browser where there is one; for the loopback host. */
  isBrowserWanted: boolean;
}

const usage = 'Options: --demo (the worked example), --project FILE, --no-open (do not open a browser).';

/**
 * Reads what follows `npm start --`.
 *
 * @param directory  where a relative FILE starts from
 * @param isLenient  passes over what it does not know: Chromium adds switches of its own
 */
export function readLaunchOptions(args: string[], directory: string, isLenient = false): LaunchOptions {
  const { demo, project, 'no-open': noOpen } = parse(args, isLenient);
  if (demo && project !== undefined) throw wrongOption('either --demo or --project', 'both');
  return {
    isDemo: demo === true,
    projectPath: typeof project === 'string' ? resolve(directory, project) : null,
    isBrowserWanted: noOpen !== true,
  };
}

/** The same options as arguments again, for handing on. */
export function launchArguments({ isDemo, projectPath, isBrowserWanted }: LaunchOptions): string[] {
  return [
    ...(isDemo ? ['--demo'] : []),
    ...(projectPath === null ? [] : [`--project=${projectPath}`]),
    ...(isBrowserWanted ? [] : ['--no-open']),
  ];
}

function parse(args: string[], isLenient: boolean) {
  try {
    const { values } = parseArgs({
      args,
      options: { demo: { type: 'boolean' }, project: { type: 'string' }, 'no-open': { type: 'boolean' } },
      strict: !isLenient,
      allowPositionals: isLenient,
    });
    return values;
  } catch (error) {
    throw wrongOption('options of this program', error instanceof Error ? error.message : String(error));
  }
}

function wrongOption(expected: string, received: string): InputError {
  return new InputError({ code: 'unknown-option', where: 'Start of Footing', expected, received, hint: usage });
}
