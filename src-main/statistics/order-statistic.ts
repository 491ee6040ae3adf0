/** In a range longer than this a sample finds the pivot. */
const LONGEST_WITHOUT_SAMPLE = 600;

/**
 * The value that would stand at a place if the values were sorted, found without sorting them all. Afterwards no value
 * before that place is larger, and none behind it smaller: later searches behind it may start there.
 *
 * @param values  finite; **rearranged in place**
 * @param place   from `first` to values.length − 1, counted from 0
 * @param first   values before it are left alone
 *
 * Source   Hoare 1961, Commun. ACM 4, 321–322 (algorithm 65, FIND), pivot the median of first, middle and last; in long
 *          ranges from a sample about the place, Floyd & Rivest 1975, Commun. ACM 18, 173 (algorithm 489, SELECT)
 * Checked  test/unit/statistics/order-statistic.test.ts (C: against a full sort)
 */
export function orderStatistic(values: Float64Array, place: number, first = 0): number {
  select(values, place, first, values.length - 1);
  return values[place]!;
}

function select(values: Float64Array, place: number, from: number, to: number): void {
  let left = from;
  let right = to;
  while (left < right) {
    const pivot = pivotFor(values, place, left, right);
    let i = left;
    let j = right;
    while (i <= j) {
      while (values[i]! < pivot) i++;
      while (values[j]! > pivot) j--;
      if (i > j) break;
      const swapped = values[i]!;
      values[i++] = values[j]!;
      values[j--] = swapped;
    }
    if (place <= j) right = j;
    else if (place >= i) left = i;
    else break;
  }
}

/** Near the value sought, and a little to its farther side, so that most of the range is behind the next partition. */
function pivotFor(values: Float64Array, place: number, left: number, right: number): number {
  const n = right - left + 1;
  if (n <= LONGEST_WITHOUT_SAMPLE) return medianOfThree(values[left]!, values[(left + right) >>> 1]!, values[right]!);
  const share = (place - left + 1) / n;
  const logN = Math.log(n);
  const nSample = 0.5 * Math.exp((2 * logN) / 3);
  const margin = 0.5 * Math.sqrt((logN * nSample * (n - nSample)) / n) * Math.sign(share - 0.5);
  const sampleLeft = Math.max(left, Math.floor(place - share * nSample + margin));
  const sampleRight = Math.min(right, Math.floor(place + (1 - share) * nSample + margin));
  select(values, place, sampleLeft, sampleRight);
  return values[place]!;
}

function medianOfThree(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
