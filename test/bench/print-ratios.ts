import { Bench } from 'tinybench';
import type { BenchCase, Peer, Values } from './bench-case.ts';
import { outcome, type Measured } from './outcome.ts';
import { PeerMissing, pythonTask } from './python-peer.ts';

/**
 * Runs each case beside its peers and prints the ratio of the medians. A peer that is not installed is said and passed
 * over.
 *
 * @returns  whether every target was met and all values agreed
 */
export async function printRatios(cases: (() => BenchCase)[]): Promise<boolean> {
  console.log('case | peer | own median | peer median | ratio | target | values');
  let isAllWell = true;
  for (const make of cases) {
    const made = unlessMissing(make);
    if (made instanceof PeerMissing) {
      console.log(`a case is left out, for want of what both sides fit: ${made.message}`);
      continue;
    }
    const { name, own, peers, end } = made;
    const ownMeasured = await measured(own);
    for (const peer of peers) {
      const other = await measuredPeer(peer);
      if (other instanceof PeerMissing) {
        console.log(`${name} | ${peer.name} | left out: ${other.message}`);
        continue;
      }
      const { line, isMet, agrees } = outcome(name, peer, ownMeasured, other);
      console.log(line);
      isAllWell &&= isMet && agrees;
    }
    end?.();
  }
  return isAllWell;
}

async function measuredPeer({ work }: Peer): Promise<Measured | PeerMissing> {
  return typeof work === 'function' ? measured(work) : unlessMissing(() => pythonTask(work.task));
}

async function measured(work: () => Values): Promise<Measured> {
  const values = work();
  const bench = new Bench({ time: 1500, warmupTime: 300, iterations: 5, warmupIterations: 1, throws: true });
  bench.add('work', () => void work());
  const [task] = await bench.run();
  if (task?.result.state !== 'completed') throw new Error('a run did not finish');
  return { medianMs: task.result.latency.p50, values };
}

function unlessMissing<Answer>(ask: () => Answer): Answer | PeerMissing {
  try {
    return ask();
  } catch (problem) {
    if (problem instanceof PeerMissing) return problem;
    throw problem;
  }
}
