import { spawn } from 'node:child_process';
import { constants, accessSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { displayProblem } from '../display-problem.ts';

/**
 * Opens an address in the system's browser where there is one; otherwise does nothing, the address is printed anyway.
 * Other users of the machine can read a command's arguments; the address is good once, so one who is faster than the
 * browser is noticed at once.
 */
export function openBrowser(address: string): void {
  const opener = openers[process.platform];
  if (!opener || displayProblem() !== null || !isOnPath(opener.program)) return;
  const child = spawn(opener.program, [...opener.args, address], { stdio: 'ignore', detached: true });
  child.on('error', () => undefined);
  child.unref();
}

const openers: Partial<Record<NodeJS.Platform, { program: string; args: string[] }>> = {
  linux: { program: 'xdg-open', args: [] },
  darwin: { program: 'open', args: [] },
  win32: { program: 'rundll32.exe', args: ['url.dll,FileProtocolHandler'] },
};

function isOnPath(program: string): boolean {
  return (process.env['PATH'] ?? '').split(delimiter).some((folder) => {
    try {
      accessSync(join(folder, program), constants.X_OK);
      return folder !== '';
    } catch {
      return false;
    }
  });
}
