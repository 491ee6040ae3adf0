import type { Comparison } from './comparison.ts';

/** What a run came to, so that a fast wrong answer does not count. Empty where the two sides do not do the same. */
export type Values = readonly number[];

export interface BenchCase {
  name: string;
  own: () => Values;
  peers: Peer[];
  /** Removes what the case made. */
  end?: () => void;
}

/** What the time is measured against. */
export interface Peer {
  /** In words. */
  name: string;
  /** Here, or a task of numpy-peers.py. */
  work: (() => Values) | { task: string };
  /** The target: own median at most this many times the peer's. None where the ratio is only shown. */
  atMost?: number;
  compare?: Comparison;
}
