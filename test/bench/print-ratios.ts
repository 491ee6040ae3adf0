import { Bench } from 'tinybench';
import type { BenchCase } from './bench-case.ts';

/** Runs each case beside its peer and prints the ratio of the medians. */
export async function printRatios(cases: (() => BenchCase | Promise<BenchCase>)[]): Promise<void> {
  console.log('case | peer | ratio (own median / peer median) | spread of own (p75 / median)');
  for (const make of cases) {
    const { name, peerName, own, peer, end } = await make();
    const bench = new Bench({ time: 1500, warmupTime: 300 });
    bench.add('own', own).add('peer', peer);
    await bench.run();
    end();
    const [ownMedian, peerMedian] = [medianOf(bench, 'own'), medianOf(bench, 'peer')];
    console.log(
      `${name} | ${peerName} | ${(ownMedian.p50 / peerMedian.p50).toFixed(2)} | ${(ownMedian.p75 / ownMedian.p50).toFixed(2)}`,
    );
  }
}

function medianOf(bench: Bench, name: string): { p50: number; p75: number } {
  const result = bench.getTask(name)?.result;
  if (result && 'latency' in result) return { p50: result.latency.p50, p75: result.latency.p75 };
  throw new Error(`${name} did not finish`);
}
