/**
 * The value that would stand at a place if the values were sorted, found without sorting them all. Afterwards no value
 * before that place is larger, and none behind it smaller: later searches behind it may start there.
 *
 * @param values  finite; **rearranged in place**
 * @param place   from `first` to values.length − 1, counted from 0
 * @param first   values before it are left alone
 *
 * Source   Hoare 1961, Commun. ACM 4, 321–322 (algorithm 65, FIND), pivot the median of first, middle and last
 * Checked  test/unit/statistics/order-statistic.test.ts (C: against a full sort)
 */
export function orderStatistic(values: Float64Array, place: number, first = 0): number {
  let left = first;
  let right = values.length - 1;
  while (left < right) {
    const pivot = medianOfThree(values[left]!, values[(left + right) >>> 1]!, values[right]!);
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
  return values[place]!;
}

function medianOfThree(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
