import { runInNewContext } from 'node:vm';

/**
 * Runs work that does not wait for anything, and stops it when it takes longer: also where it goes round in circles
 * inside WebAssembly.
 *
 * @throws Error with the code ERR_SCRIPT_EXECUTION_TIMEOUT when time is up, and what the work throws
 */
export function withinTime<Result>(milliseconds: number, work: () => Result): Result {
  const results: Result[] = [];
  runInNewContext('work()', { work: () => void results.push(work()) }, { timeout: milliseconds });
  const [result] = results;
  return result as Result;
}
