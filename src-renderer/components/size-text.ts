/** "12 345 bytes", "1.2 MB": the exact count where it can be read at a glance. */
export function sizeText(bytes: number): string {
  if (bytes < 100_000) return `${bytes.toLocaleString('en-GB').replaceAll(',', '\u202f')} bytes`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}
