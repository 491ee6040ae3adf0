/** Words as a name for commands: lower case, letters, digits and hyphens, short enough for the name of a series. */
export function nameOf(words: string): string {
  return words
    .replaceAll('₂', '2')
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 110);
}

/** The name of a file without its last extension. */
export function stemOf(fileName: string): string {
  const base = fileName.replace(/^.*[\\/]/, '');
  return base.replace(/\.[^.]{1,5}$/, '') || base;
}
