/** Of a procedure begun on the screen: the ends of a 5–95 % range are then known to less than a hundredth of its width. */
export const defaultDraws = 100_000;
