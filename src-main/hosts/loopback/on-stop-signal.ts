const signals = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;

/**
 * Ends the process in good order when it is told to stop. Further signals change nothing: a terminal and the npm
 * that runs in it each send one for a single Ctrl-C.
 */
export function onStopSignal(stop: () => Promise<void>): void {
  let isStopping = false;
  const begin = () => {
    if (isStopping) return;
    isStopping = true;
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        console.error('Footing could not stop in good order:', error);
        process.exit(1);
      },
    );
  };
  for (const signal of signals) process.on(signal, begin);
}
