import { spawn } from 'node:child_process';

/** Exit codes above these are not Footing's own: the runtime itself could not start. */
const highestOwnExitCode = 3;
const startTimeMs = 15_000;

export type ElectronOutcome = { hasStarted: true; exitCode: number } | { hasStarted: false; problem: string };

/** Runs Electron on the application and waits for its end. */
export function startElectron(program: string, application: string, args: string[]): Promise<ElectronOutcome> {
  const { ELECTRON_RUN_AS_NODE: _asNode, NODE_OPTIONS: _nodeOptions, ...environment } = process.env;
  const startedAt = performance.now();
  const child = spawn(program, [application, ...args], { stdio: 'inherit', env: environment });
  const stopForwarding = forwardSignals((signal) => child.kill(signal));
  return new Promise((resolve) => {
    child.on('error', ({ message }) => {
      stopForwarding();
      resolve({ hasStarted: false, problem: message });
    });
    child.on('exit', (exitCode, signal) => {
      const wasTold = stopForwarding();
      const isFault = exitCode === null || exitCode > highestOwnExitCode;
      const hasStarted = !isFault || wasTold || performance.now() - startedAt > startTimeMs;
      if (hasStarted) resolve({ hasStarted, exitCode: exitCode ?? 1 });
      else resolve({ hasStarted, problem: `it ended at once with ${signal ?? `exit code ${exitCode}`}` });
    });
  });
}

/** Hands signals on until told to stop; tells then whether there was one. */
function forwardSignals(forward: (signal: NodeJS.Signals) => void): () => boolean {
  const signals = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;
  let wasTold = false;
  const listener = (signal: NodeJS.Signals) => {
    wasTold = true;
    // A terminal has sent Ctrl-C to Electron as well; a second one would cut its good order short.
    if (signal !== 'SIGINT' || !process.stdin.isTTY) forward(signal);
  };
  for (const signal of signals) process.on(signal, listener);
  return () => {
    for (const signal of signals) process.off(signal, listener);
    return wasTold;
  };
}
