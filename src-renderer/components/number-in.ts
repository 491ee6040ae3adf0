/** The number that a field holds, with decimal comma or point; NaN when it holds none: an empty field is not zero. */
export function numberIn(text: string): number {
  return text.trim() === '' ? NaN : Number(text.trim().replace(',', '.').replace('−', '-'));
}
