import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { z } from 'zod';
import type { Measured } from './outcome.ts';

/** A peer that this machine does not have: said in a line, not a failure. */
export class PeerMissing extends Error {}

const skipped = z.strictObject({ skipped: z.string() });
export const timedAnswer = z.strictObject({ medianS: z.number().positive(), values: z.array(z.number()).min(1) });
const record = z.strictObject({ co2Ppm: z.array(z.number()), temperatureK: z.array(z.number()) });
export type PeerRecord = z.infer<typeof record>;

/** A task of numpy-peers.py, timed there, in one process with one thread. @throws PeerMissing */
export function pythonTask(task: string): Measured {
  const { medianS, values } = firstAnswer(['time', task], (line) => readAnswer(line, timedAnswer));
  return { medianMs: 1000 * medianS, values };
}

/** A record that numpy-peers.py makes for both sides. @throws PeerMissing */
export function pythonRecord(name: 'annual' | 'monthly'): PeerRecord {
  return firstAnswer(['record', name], (line) => readAnswer(line, record));
}

/** What the script printed, checked. @throws PeerMissing where a library is; Error where the line is none of its answers */
export function readAnswer<Answer>(line: string, schema: z.ZodType<Answer>): Answer {
  const parsed: unknown = JSON.parse(line);
  const without = skipped.safeParse(parsed);
  if (without.success) throw new PeerMissing(without.data.skipped);
  return schema.parse(parsed);
}

/** The Python on the path need not be the one for which the system installed its libraries. */
const interpreters = ['python3', '/usr/bin/python3'];
const oneThread = { OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1', MKL_NUM_THREADS: '1' };

/** Of the first interpreter that has what is asked. */
function firstAnswer<Answer>(words: string[], read: (line: string) => Answer): Answer {
  const reasons = new Set<string>();
  for (const interpreter of interpreters) {
    const { status, stdout, stderr, error } = spawnSync(
      interpreter,
      [join(import.meta.dirname, 'numpy-peers.py'), ...words],
      { encoding: 'utf8', env: { ...process.env, ...oneThread } },
    );
    if (error) {
      reasons.add(`no ${interpreter}`);
      continue;
    }
    if (status !== 0) throw new Error(`numpy-peers.py ${words.join(' ')} failed:\n${stderr}`);
    try {
      return read(stdout);
    } catch (problem) {
      if (!(problem instanceof PeerMissing)) throw problem;
      reasons.add(problem.message);
    }
  }
  throw new PeerMissing(`${words.join(' ')}: ${[...reasons].join('; ')}`);
}
