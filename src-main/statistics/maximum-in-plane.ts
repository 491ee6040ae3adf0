export interface PlanePoint {
  at: readonly [number, number];
  height: number;
  slope: readonly [number, number];
}

export interface Climb {
  top: PlanePoint;
  /** Level there; or still rising at a bound, level along it; or still moving after all steps. */
  end: 'top' | 'edge' | 'unsettled';
}

const MOST_STEPS = 200;
/** A Newton step this short, in the coordinates of the plane, is below what the slopes can tell. */
const STANDSTILL = 1e-10;
/** For difference quotients of the slopes: their rounding and their curvature cost about equally much. */
const PROBE = 2 ** -17;
const LONGEST_STEP = 1;
/** A step this short may lead down by rounding alone. */
const ROUNDED_STEP = 1e-6;

/**
 * Climbs from a start to a local maximum of a smooth function of two variables, on its slopes: near a maximum the height
 * is flat and the slopes are not, so the place is found to many more digits than by comparing heights.
 *
 * Newton steps with the curvature from differences of the slopes, turned uphill where the surface is not a hill, halved
 * until they do not lead down; at a bound that the slope pushes against, along the bound.
 *
 * @param surface  height and slopes at a point, also a little beyond the bounds
 * @param start    a point within the bounds
 * @param bounds   largest magnitude of each coordinate
 *
 * Source   Nocedal & Wright 2006, Numerical Optimization, §3.4 (modified Newton, by eigenvalues), §16.7 (projection)
 * Checked  test/unit/statistics/maximum-in-plane.test.ts (C: hills, ridges and saddles with known tops)
 */
export function maximumInPlane(
  surface: (at: readonly [number, number]) => PlanePoint,
  start: PlanePoint,
  bounds: readonly [number, number],
): Climb {
  let here = start;
  for (let nSteps = 0; nSteps < MOST_STEPS; nSteps++) {
    const isHeld = [0, 1].map((i) => Math.abs(here.at[i]!) >= bounds[i]! && here.at[i]! * here.slope[i]! > 0);
    const step = stepFrom(surface, here, isHeld);
    const length = Math.hypot(...step);
    const next = length <= STANDSTILL ? null : firstNotLower(surface, here, step, bounds);
    if (!next) return { top: here, end: length > ROUNDED_STEP ? 'unsettled' : isHeld.includes(true) ? 'edge' : 'top' };
    here = next;
  }
  return { top: here, end: 'unsettled' };
}

function stepFrom(
  surface: (at: readonly [number, number]) => PlanePoint,
  { at, slope }: PlanePoint,
  [isHeldA, isHeldB]: boolean[],
): [number, number] {
  const { aa, ab, bb } = curvature(surface, at);
  let step: [number, number];
  if (isHeldA || isHeldB) step = [isHeldA ? 0 : slope[0] / Math.abs(aa), isHeldB ? 0 : slope[1] / Math.abs(bb)];
  else step = uphill(slope, { aa, ab, bb });
  const tooLong = Math.max(1, Math.hypot(...step) / LONGEST_STEP);
  return [step[0] / tooLong, step[1] / tooLong];
}

function moved([a, b]: readonly [number, number], [da, db]: readonly [number, number], share: number) {
  return [a + share * da, b + share * db] as const;
}

function curvature(surface: (at: readonly [number, number]) => PlanePoint, at: readonly [number, number]) {
  const by = (direction: readonly [number, number]) => {
    const [ahead, behind] = [surface(moved(at, direction, PROBE)).slope, surface(moved(at, direction, -PROBE)).slope];
    return [(ahead[0] - behind[0]) / (2 * PROBE), (ahead[1] - behind[1]) / (2 * PROBE)] as const;
  };
  const [aa, ab] = by([1, 0]);
  const [ba, bb] = by([0, 1]);
  return { aa, ab: (ab + ba) / 2, bb };
}

/** −H⁻¹·slope, with every eigenvalue of H taken as negative: along a valley's axis the step still leads up. */
function uphill(slope: readonly [number, number], { aa, ab, bb }: { aa: number; ab: number; bb: number }) {
  const middle = (aa + bb) / 2;
  const radius = Math.hypot((aa - bb) / 2, ab);
  const angle = 0.5 * Math.atan2(2 * ab, aa - bb);
  const flattest = 1e-8 * (Math.abs(middle) + radius) + 1e-30;
  const axes = [
    { value: middle + radius, axis: [Math.cos(angle), Math.sin(angle)] },
    { value: middle - radius, axis: [-Math.sin(angle), Math.cos(angle)] },
  ] as const;
  const step: [number, number] = [0, 0];
  for (const { value, axis } of axes) {
    const along = (slope[0] * axis[0] + slope[1] * axis[1]) / Math.max(Math.abs(value), flattest);
    step[0] += along * axis[0];
    step[1] += along * axis[1];
  }
  return step;
}

function firstNotLower(
  surface: (at: readonly [number, number]) => PlanePoint,
  here: PlanePoint,
  step: readonly [number, number],
  bounds: readonly [number, number],
): PlanePoint | null {
  // Beside the top, heights differ by rounding only.
  const rounding = 1e-13 * Math.abs(here.height);
  const within = (value: number, bound: number) => Math.max(-bound, Math.min(bound, value));
  for (let share = 1; share > 1e-9; share /= 2) {
    const [a, b] = moved(here.at, step, share);
    const next = surface([within(a, bounds[0]), within(b, bounds[1])]);
    if (next.height >= here.height - rounding) return next;
  }
  return null;
}
