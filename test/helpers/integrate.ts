/**
 * Solves y′ = f(t, y) from one time to another by the extrapolated midpoint rule: for smooth f good to rounding where the
 * steps are short against the time scales. Shares nothing with a solution by eigenvalues.
 *
 * Source   Gragg 1965, SIAM J. Numer. Anal. 2, 384–403; Bulirsch & Stoer 1966, Numer. Math. 8, 1–13
 */
export function integrate(
  f: (time: number, y: readonly number[]) => number[],
  start: readonly number[],
  { from, to, steps }: { from: number; to: number; steps: number },
): number[] {
  const length = (to - from) / steps;
  let y = [...start];
  for (let step = 0; step < steps; step++) y = extrapolated(f, y, from + step * length, length);
  return y;
}

function extrapolated(
  f: (time: number, y: readonly number[]) => number[],
  y: readonly number[],
  time: number,
  length: number,
): number[] {
  const parts = [2, 4, 6, 8, 10, 12, 14, 16];
  const rows: number[][] = [];
  for (const [j, n] of parts.entries()) {
    let row = midpoint(f, y, time, length, n);
    // Neville's scheme in (length/n)²; rows[i] holds the best value that started from parts[j − 1 − i].
    const next = [row];
    for (let i = 1; i <= j; i++) {
      const before = rows[i - 1]!;
      const share = (n / parts[j - i]!) ** 2 - 1;
      row = row.map((value, component) => value + (value - before[component]!) / share);
      next.push(row);
    }
    rows.splice(0, rows.length, ...next);
  }
  return rows.at(-1)!;
}

function midpoint(
  f: (time: number, y: readonly number[]) => number[],
  start: readonly number[],
  time: number,
  length: number,
  n: number,
): number[] {
  const h = length / n;
  let before = [...start];
  let here = move(start, f(time, start), h);
  for (let i = 1; i < n; i++) [before, here] = [here, move(before, f(time + i * h, here), 2 * h)];
  return move(
    here.map((value, i) => (value + before[i]!) / 2),
    f(time + length, here),
    h / 2,
  );
}

function move(y: readonly number[], slope: readonly number[], by: number): number[] {
  return y.map((value, i) => value + by * slope[i]!);
}
