import { type ChildProcessByStdio, spawn } from 'node:child_process';
import type { Readable } from 'node:stream';
import { onTestFinished } from 'vitest';

export interface Child {
  /** Lines of JSON told so far. */
  told: unknown[];
  /** When it has told this many lines, or ended. */
  hasTold(nLines: number): Promise<void>;
  kill(): void;
  ended: Promise<{ code: number | null; signal: string | null; errors: string }>;
}

/** Runs a TypeScript file in a process of its own, which is stopped at the end of the test at the latest. */
export function startChild(file: string, args: string[], { prefix = [] as string[] } = {}): Child {
  const [command = '', ...rest] = [...prefix, process.execPath, file, ...args];
  const child: ChildProcessByStdio<null, Readable, Readable> = spawn(command, rest, {
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  onTestFinished(() => void child.kill('SIGKILL'));
  const told: unknown[] = [];
  let text = '';
  let errors = '';
  let listeners: (() => void)[] = [];
  const notify = () => listeners.splice(0).forEach((listener) => listener());
  child.stdout.setEncoding('utf8').on('data', (chunk: string) => {
    text += chunk;
    const lines = text.split('\n');
    text = lines.pop() ?? '';
    told.push(...lines.map((line) => JSON.parse(line) as unknown));
    notify();
  });
  child.stderr.setEncoding('utf8').on('data', (chunk: string) => (errors += chunk));
  let isOver = false;
  const ended = new Promise<{ code: number | null; signal: string | null; errors: string }>((resolve) => {
    child.on('close', (code, signal) => {
      isOver = true;
      notify();
      resolve({ code, signal, errors });
    });
  });
  return {
    told,
    ended,
    kill: () => void child.kill('SIGKILL'),
    async hasTold(nLines) {
      while (told.length < nLines && !isOver) await new Promise<void>((resolve) => listeners.push(resolve));
      listeners = [];
    },
  };
}
