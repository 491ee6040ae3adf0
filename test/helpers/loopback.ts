import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';

export interface LoopbackProcess {
  origin: string;
  /** Leads a browser in, once. */
  firstAddress: string;
  /** Ends it as Ctrl-C does; resolves with its exit status and what it wrote on standard error. */
  stop(): Promise<{ exitStatus: number | null; errors: string }>;
}

const program = fileURLToPath(new URL('../../out/main/loopback.js', import.meta.url));

/** Starts the built loopback host in a process of its own, with its own home. */
export function startLoopback(home: string, args: readonly string[] = []): Promise<LoopbackProcess> {
  const child = spawn(process.execPath, [program, '--no-open', ...args], {
    env: { ...process.env, FOOTING_HOME: home },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  let errors = '';
  child.stderr.setEncoding('utf8').on('data', (text: string) => (errors += text));
  const ended = new Promise<number | null>((resolve) => child.on('close', resolve));

  return new Promise((resolve, reject) => {
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      output += text;
      const address = /http:\/\/127\.0\.0\.1:\d+\/\S+/.exec(output)?.[0];
      if (!address) return;
      resolve({
        origin: new URL(address).origin,
        firstAddress: address,
        stop: async () => {
          child.kill('SIGINT');
          return { exitStatus: await ended, errors };
        },
      });
    });
    void ended.then((exitStatus) =>
      reject(new Error(`the loopback host ended with ${exitStatus} before it had an address: ${output}${errors}`)),
    );
  });
}
