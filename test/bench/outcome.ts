import type { Peer, Values } from './bench-case.ts';

/** Median time and what came out. */
export interface Measured {
  medianMs: number;
  values: Values;
}

export interface Outcome {
  ratio: number;
  isMet: boolean;
  agrees: boolean;
  /** One line for the reader. */
  line: string;
}

/** Our run beside a peer's: the ratio of medians, whether it meets the target, and whether both came to the same. */
export function outcome(name: string, peer: Omit<Peer, 'work'>, own: Measured, other: Measured): Outcome {
  const ratio = own.medianMs / other.medianMs;
  const isMet = peer.atMost === undefined || ratio <= peer.atMost;
  const agreement = peer.compare?.(own.values, other.values);
  const agrees = agreement?.agrees ?? true;
  const target = peer.atMost === undefined ? 'no target' : `at most ${peer.atMost}: ${isMet ? 'met' : 'MISSED'}`;
  const values = agreement ? `values ${agreement.agrees ? 'agree' : 'DIFFER'}: ${agreement.inWords}` : 'not compared';
  const cells = [
    name,
    peer.name,
    milliseconds(own),
    milliseconds(other),
    `ratio ${ratio.toPrecision(2)}`,
    target,
    values,
  ];
  return { ratio, isMet, agrees, line: cells.join(' | ') };
}

function milliseconds({ medianMs }: Measured): string {
  return `${Number(medianMs.toPrecision(3))} ms`;
}
