import { spawn } from 'node:child_process';

/** Exit codes above these are not Footing's own: the runtime itself could not start. */
const highestOwnExitCode = 3;
const startTimeMs = 15_000;

export type ElectronOutcome = { hasStarted: true; exitCode: number } | { hasStarted: false; reason: string };

/** Runs Electron on the application and waits for its end. */
export function startElectron(program: string, application: string, args: string[]): Promise<ElectronOutcome> {
  const { ELECTRON_RUN_AS_NODE: _asNode, NODE_OPTIONS: _nodeOptions, ...environment } = process.env;
  const startedAt = performance.now();
  const child = spawn(program, [application, ...args], { stdio: 'inherit', env: environment });
  const stopForwarding = forwardSignals((signal) => child.kill(signal));
  return new Promise((resolve) => {
    child.on('error', ({ message }) => {
      stopForwarding();
      resolve({ hasStarted: false, reason: message });
    });
    child.on('exit', (exitCode, signal) => {
      const isFault = exitCode === null || exitCode > highestOwnExitCode;
      const hasStarted = !isFault || stopForwarding() || performance.now() - startedAt > startTimeMs;
      if (hasStarted) resolve({ hasStarted, exitCode: exitCode ?? 1 });
      else resolve({ hasStarted, reason: `it ended at once with ${signal ?? `exit code ${exitCode}`}` });
    });
  });
}

/** Hands signals on until told to stop; tells then whether there was one. */
function forwardSignals(forward: (signal: NodeJS.Signals) => void): () => boolean {
  const signals = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;
  let hasForwarded = false;
  const listener = (signal: NodeJS.Signals) => {
    hasForwarded = true;
    forward(signal);
  };
  for (const signal of signals) process.on(signal, listener);
  return () => {
    for (const signal of signals) process.off(signal, listener);
    return hasForwarded;
  };
}
